import type { ExitKind } from '#shared/vocabulary.ts';
import type { CategoryFacts } from '../domain/facts.ts';
import type { RawDatabase } from '../platform/database.ts';
import { NAME_SQL } from './rebuild-words.ts';
import type { NamedCategory, ShopRebuild } from './shop-facts.ts';

/**
 * Reads rebuilds with their sums and locked estimates; `ids` = only these. One query for however many, rows as plain
 * arrays: an answer after a change waits for this.
 */
export function readRebuilds(
  raw: RawDatabase,
  shopId: string,
  categories: readonly NamedCategory[],
  ids?: readonly string[],
): ShopRebuild[] {
  const nameOf = new Map(categories.map(({ id, name }) => [id, name]));
  const among = ids ? 'AND r.id IN (SELECT value FROM json_each(@ids))' : '';
  const scope = ids ? { shop: shopId, ids: JSON.stringify(ids) } : { shop: shopId };
  const rows = raw.prepare(`${REBUILDS} ${among}`).raw().all(scope) as RebuildRow[];
  return rows.map((row) => shopRebuild(row, nameOf));
}

type NameOf = ReadonlyMap<string, string>;
type SumRow = [string, number, number, number, number, number, number, number];

/** The sums per category, by name, from the text that `rollup.ts` keeps. */
function readSums(text: string, nameOf: NameOf): ReadonlyMap<string, CategoryFacts> {
  return new Map(
    (JSON.parse(text) as SumRow[]).map(([id, paid, planning, unforeseen, surprises, extra, free, count]) => [
      nameOf.get(id) ?? id,
      {
        paidCents: paid,
        planningCents: planning,
        unforeseenCents: unforeseen,
        surpriseCount: surprises,
        extraCents: extra,
        freeCents: free,
        entryCount: count,
      },
    ]),
  );
}

function readPlan(text: string, nameOf: NameOf): ReadonlyMap<string, number> {
  return new Map((JSON.parse(text) as [string, number][]).map(([id, cents]) => [nameOf.get(id) ?? id, cents]));
}

/** A rebuild's categories are opened when a measure first asks: most ask for their totals only. */
class Opened {
  readonly #sums: string;
  readonly #plan: string;
  readonly #nameOf: NameOf;
  #categories: ReadonlyMap<string, CategoryFacts> | undefined;
  #estimates: ReadonlyMap<string, number> | undefined;

  constructor(sums: string, plan: string, nameOf: NameOf) {
    this.#sums = sums;
    this.#plan = plan;
    this.#nameOf = nameOf;
  }
  get categories(): ReadonlyMap<string, CategoryFacts> {
    this.#categories ??= readSums(this.#sums, this.#nameOf);
    return this.#categories;
  }
  get estimates(): ReadonlyMap<string, number> {
    this.#estimates ??= readPlan(this.#plan, this.#nameOf);
    return this.#estimates;
  }
}

type Text = string | null;
type Whole = number | null;
type RebuildRow = [
  ...[id: string, tag: string, name: string, className: Text, damage: Text, seen: Whole],
  ...[purchase: Whole, asking: Whole, bought: Text, pickedUp: Text, started: Text, roadworthy: Text, title: Text],
  ...[listed: Text, leftOn: Text, kind: ExitKind | null, proceeds: Whole, undated: Whole, unknown: Whole],
  ...[lateCount: Whole, lateCents: Whole, own: Whole, paidSeconds: Whole, xirr: Whole],
  ...[paid: Whole, planning: Whole, surprise: Whole, labor: Whole, estimate: Whole, sums: Text, plan: Text],
  planned: Whole,
];

const REBUILDS = `
  SELECT r.id, r.tag, ${NAME_SQL}, c.name, d.name, r.is_seen, r.purchase_cents, r.asking_cents, r.bought_on,
    r.picked_up_on, r.started_on, r.roadworthy_on, r.title_issued_on, r.listed_on, coalesce(r.sold_on, r.exit_on),
    CASE WHEN r.sold_on IS NOT NULL THEN 'sold' ELSE r.exit_kind END, coalesce(r.sale_cents, r.exit_cents),
    k.undated_count, k.unknown_foreseen_count, k.late_count, k.late_cents, k.own_seconds, k.paid_seconds, k.xirr,
    k.paid_cents, k.planning_cents, k.surprise_planning_cents, k.paid_labor_cents, k.estimate_cents,
    k.category_sums, k.baseline, e.planned_seconds
  FROM rebuilds r
  LEFT JOIN rollup_rebuilds k ON k.shop_id = r.shop_id AND k.rebuild_id = r.id
  LEFT JOIN estimates e ON e.shop_id = r.shop_id AND e.rebuild_id = r.id AND e.is_baseline = 1
  LEFT JOIN vehicle_classes c ON c.shop_id = r.shop_id AND c.id = r.class_id
  LEFT JOIN damage_types d ON d.shop_id = r.shop_id AND d.id = r.damage_id
  WHERE r.shop_id = @shop`;

function shopRebuild(row: RebuildRow, nameOf: NameOf): ShopRebuild {
  const [id, tag, name, className, damage, seen, purchaseCents, askingCents, ...dates] = row;
  const [boughtOn, pickedUpOn, startedOn, readyOn, titleIssuedOn, listedOn, leftOn, kind, proceeds, ...kept] = dates;
  const [undated, unknown, lateCount, lateCents, ownSeconds, paidSeconds, xirr, ...totals] = kept;
  const [paid, planning, surprise, labor, estimate, sums, plan, plannedSeconds] = totals;
  const opened = new Opened(sums ?? '[]', plan ?? '[]', nameOf);
  return {
    id,
    tag,
    name,
    class: className,
    damage,
    seen: seen === null ? null : seen === 1,
    boughtOn,
    pickedUpOn,
    startedOn,
    readyOn,
    titleIssuedOn,
    listedOn,
    exit: leftOn === null || kind === null ? null : { kind, on: leftOn, proceedsCents: proceeds ?? 0 },
    purchaseCents,
    askingCents,
    ownSeconds,
    paidSeconds,
    plannedSeconds,
    get estimates() {
      return opened.estimates;
    },
    get categories() {
      return opened.categories;
    },
    paidCents: paid ?? 0,
    planningCents: planning ?? 0,
    estimateCents: estimate ?? 0,
    paidLaborCents: labor ?? 0,
    hasUnknownForeseen: (unknown ?? 0) > 0,
    hasUndated: (undated ?? 0) > 0,
    surprisePlanningCents: surprise ?? 0,
    lateCount: lateCount ?? 0,
    lateCents: lateCents ?? 0,
    xirr,
  };
}
