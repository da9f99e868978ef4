import type { Day } from '#shared/day.ts';
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
  return rows.map((row) => new ReadRebuild(row, nameOf));
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

type Text = string | null;
type Whole = number | null;
type RebuildRow = [
  ...[id: string, tag: string, name: string, className: Text, damage: Text, seen: Whole],
  ...[purchase: Whole, asking: Whole, bought: Text, pickedUp: Text, started: Text, roadworthy: Text, title: Text],
  ...[listed: Text, leftOn: Text, kind: ExitKind | null, proceeds: Whole, undated: Whole, unknown: Whole],
  ...[lateCount: Whole, lateCents: Whole, own: Whole, paidSeconds: Whole, xirr: Whole],
  ...[paid: Whole, planning: Whole, surprise: Whole, labor: Whole, estimate: Whole, sums: Text, plan: Text],
  ...[planned: Whole, expectedSale: Whole],
];

const REBUILDS = `
  SELECT r.id, r.tag, ${NAME_SQL}, c.name, d.name, r.is_seen, r.purchase_cents, r.asking_cents, r.bought_on,
    r.picked_up_on, r.started_on, r.roadworthy_on, r.title_issued_on, r.listed_on, coalesce(r.sold_on, r.exit_on),
    CASE WHEN r.sold_on IS NOT NULL THEN 'sold' ELSE r.exit_kind END, coalesce(r.sale_cents, r.exit_cents),
    k.undated_count, k.unknown_foreseen_count, k.late_count, k.late_cents, k.own_seconds, k.paid_seconds, k.xirr,
    k.paid_cents, k.planning_cents, k.surprise_planning_cents, k.paid_labor_cents, k.estimate_cents,
    k.category_sums, k.baseline, e.planned_seconds, e.expected_sale_cents
  FROM rebuilds r
  LEFT JOIN rollup_rebuilds k ON k.shop_id = r.shop_id AND k.rebuild_id = r.id
  LEFT JOIN estimates e ON e.shop_id = r.shop_id AND e.rebuild_id = r.id AND e.is_baseline = 1
  LEFT JOIN vehicle_classes c ON c.shop_id = r.shop_id AND c.id = r.class_id
  LEFT JOIN damage_types d ON d.shop_id = r.shop_id AND d.id = r.damage_id
  WHERE r.shop_id = @shop`;

/**
 * A rebuild as it was read. A class, since thousands are made at once: its categories and estimates are opened when a
 * measure first asks (most ask for their totals only), and a getter on each single object would cost more than the rest.
 */
class ReadRebuild implements ShopRebuild {
  readonly id: string;
  readonly tag: string;
  readonly name: string;
  readonly class: string | null;
  readonly damage: string | null;
  readonly seen: boolean | null;
  readonly boughtOn: Day | null;
  readonly pickedUpOn: Day | null;
  readonly startedOn: Day | null;
  readonly readyOn: Day | null;
  readonly titleIssuedOn: Day | null;
  readonly listedOn: Day | null;
  exit: ShopRebuild['exit'];
  readonly purchaseCents: number | null;
  readonly askingCents: number | null;
  readonly ownSeconds: number | null;
  readonly paidSeconds: number | null;
  readonly plannedSeconds: number | null;
  readonly expectedSaleCents: number | null;
  readonly paidCents: number;
  readonly planningCents: number;
  readonly estimateCents: number;
  readonly paidLaborCents: number;
  readonly hasUnknownForeseen: boolean;
  readonly hasUndated: boolean;
  readonly surprisePlanningCents: number;
  readonly lateCount: number;
  readonly lateCents: number;
  readonly xirr: number | null;
  readonly #row: RebuildRow;
  readonly #nameOf: NameOf;
  #categories: ReadonlyMap<string, CategoryFacts> | undefined;
  #estimates: ReadonlyMap<string, number> | undefined;

  constructor(row: RebuildRow, nameOf: NameOf) {
    this.#row = row;
    this.#nameOf = nameOf;
    this.id = row[0];
    this.tag = row[1];
    this.name = row[2];
    this.class = row[3];
    this.damage = row[4];
    this.seen = row[5] === null ? null : row[5] === 1;
    this.purchaseCents = row[6];
    this.askingCents = row[7];
    this.boughtOn = row[8];
    this.pickedUpOn = row[9];
    this.startedOn = row[10];
    this.readyOn = row[11];
    this.titleIssuedOn = row[12];
    this.listedOn = row[13];
    const [on, kind, proceedsCents] = [row[14], row[15], row[16] ?? 0];
    this.exit = on === null || kind === null ? null : { kind, on, proceedsCents };
    this.hasUndated = (row[17] ?? 0) > 0;
    this.hasUnknownForeseen = (row[18] ?? 0) > 0;
    this.lateCount = row[19] ?? 0;
    this.lateCents = row[20] ?? 0;
    this.ownSeconds = row[21];
    this.paidSeconds = row[22];
    this.xirr = row[23];
    this.paidCents = row[24] ?? 0;
    this.planningCents = row[25] ?? 0;
    this.surprisePlanningCents = row[26] ?? 0;
    this.paidLaborCents = row[27] ?? 0;
    this.estimateCents = row[28] ?? 0;
    this.plannedSeconds = row[31];
    this.expectedSaleCents = row[32];
  }

  get categories(): ReadonlyMap<string, CategoryFacts> {
    this.#categories ??= readSums(this.#row[29] ?? '[]', this.#nameOf);
    return this.#categories;
  }

  get estimates(): ReadonlyMap<string, number> {
    this.#estimates ??= readPlan(this.#row[30] ?? '[]', this.#nameOf);
    return this.#estimates;
  }

  /** The same rebuild as it stood before it left. */
  static notYetLeft(rebuild: ShopRebuild): ShopRebuild {
    if (!(rebuild instanceof ReadRebuild)) return { ...rebuild, exit: null };
    const held = new ReadRebuild(rebuild.#row, rebuild.#nameOf);
    held.exit = null;
    return held;
  }
}

export const { notYetLeft } = ReadRebuild;
