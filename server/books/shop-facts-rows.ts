import type { ExitKind } from '#shared/vocabulary.ts';
import type { CategoryFacts } from '../domain/facts.ts';
import type { RawDatabase } from '../platform/database.ts';
import { NAME_SQL } from './rebuild-words.ts';
import type { NamedCategory, ShopRebuild } from './shop-facts.ts';

/**
 * Reads rebuilds with their sums and locked estimates; `ids` = only these. Three queries for however many, rows as
 * plain arrays: an answer after a change waits for this.
 */
export function readRebuilds(
  raw: RawDatabase,
  shopId: string,
  categories: readonly NamedCategory[],
  ids?: readonly string[],
): ShopRebuild[] {
  const nameOf = new Map(categories.map(({ id, name }) => [id, name]));
  const wages = categories.filter(({ isPaidLabor }) => isPaidLabor).map(({ name }) => name);
  const read: Read = (sql, idColumn, rest = '') => {
    const among = ids ? `AND ${idColumn} IN (SELECT value FROM json_each(@ids))` : '';
    const scope = ids ? { shop: shopId, ids: JSON.stringify(ids) } : { shop: shopId };
    return raw.prepare(`${sql} ${among} ${rest}`).raw().all(scope);
  };
  const sums = readSums(read, nameOf);
  const estimates = readEstimates(read, nameOf);
  return (read(REBUILDS, 'r.id') as RebuildRow[]).map((row) =>
    shopRebuild(row, sums.get(row[0]) ?? NO_SUMS, estimates.get(row[0]) ?? NO_ESTIMATE, wages),
  );
}

/** Runs a query over the shop's rows, or those of some rebuilds; `rest` follows its conditions. */
type Read = (sql: string, idColumn: string, rest?: string) => unknown[];

interface Sums {
  readonly categories: Map<string, CategoryFacts>;
  surprisePlanningCents: number;
}
const NO_SUMS: Sums = { categories: new Map(), surprisePlanningCents: 0 };
const NO_ESTIMATE: ReadonlyMap<string, number> = new Map();

// One row per rebuild, its categories as JSON: SQLite writes and the engine reads that three times faster than single rows.
const SUMS = `
  SELECT rebuild_id, json_group_array(json_array(category_id, paid_cents, planning_cents, unforeseen_cents,
    surprise_count, surprise_planning_cents, extra_cents, free_cents, entry_count))
  FROM rollup_categories WHERE shop_id = @shop`;
type SumRow = [string, number, number, number, number, number, number, number, number];

function readSums(read: Read, nameOf: ReadonlyMap<string, string>): Map<string, Sums> {
  const all = new Map<string, Sums>();
  for (const [rebuildId, json] of read(SUMS, 'rebuild_id', 'GROUP BY rebuild_id') as [string, string][]) {
    const sums: Sums = { categories: new Map(), surprisePlanningCents: 0 };
    for (const row of JSON.parse(json) as SumRow[]) {
      sums.surprisePlanningCents += row[5];
      sums.categories.set(nameOf.get(row[0]) ?? row[0], {
        paidCents: row[1],
        planningCents: row[2],
        unforeseenCents: row[3],
        surpriseCount: row[4],
        extraCents: row[6],
        freeCents: row[7],
        entryCount: row[8],
      });
    }
    all.set(rebuildId, sums);
  }
  return all;
}

const ESTIMATES = `
  SELECT rebuild_id, (SELECT json_group_array(json_array(category_id, cents)) FROM estimate_lines l
    WHERE l.shop_id = e.shop_id AND l.estimate_id = e.id)
  FROM estimates e WHERE shop_id = @shop AND is_baseline = 1`;

function readEstimates(read: Read, nameOf: ReadonlyMap<string, string>): Map<string, ReadonlyMap<string, number>> {
  const all = new Map<string, ReadonlyMap<string, number>>();
  for (const [rebuildId, json] of read(ESTIMATES, 'rebuild_id') as [string, string][]) {
    const lines = JSON.parse(json) as [string, number][];
    all.set(rebuildId, new Map(lines.map(([id, cents]) => [nameOf.get(id) ?? id, cents])));
  }
  return all;
}

type Text = string | null;
type Whole = number | null;
type RebuildRow = [
  ...[id: string, tag: string, name: string, className: Text, damage: Text, seen: Whole],
  ...[purchase: Whole, asking: Whole, bought: Text, pickedUp: Text, started: Text, roadworthy: Text, title: Text],
  ...[listed: Text, leftOn: Text, kind: ExitKind | null, proceeds: Whole, undated: Whole, unknown: Whole],
  ...[lateCount: Whole, lateCents: Whole, own: Whole, paid: Whole, xirr: Whole, flows: Buffer | null, planned: Whole],
];

const REBUILDS = `
  SELECT r.id, r.tag, ${NAME_SQL}, c.name, d.name, r.is_seen, r.purchase_cents, r.asking_cents, r.bought_on,
    r.picked_up_on, r.started_on, r.roadworthy_on, r.title_issued_on, r.listed_on, coalesce(r.sold_on, r.exit_on),
    CASE WHEN r.sold_on IS NOT NULL THEN 'sold' ELSE r.exit_kind END, coalesce(r.sale_cents, r.exit_cents),
    k.undated_count, k.unknown_foreseen_count, k.late_count, k.late_cents, k.own_seconds, k.paid_seconds, k.xirr, k.flows,
    e.planned_seconds
  FROM rebuilds r
  LEFT JOIN rollup_rebuilds k ON k.shop_id = r.shop_id AND k.rebuild_id = r.id
  LEFT JOIN estimates e ON e.shop_id = r.shop_id AND e.rebuild_id = r.id AND e.is_baseline = 1
  LEFT JOIN vehicle_classes c ON c.shop_id = r.shop_id AND c.id = r.class_id
  LEFT JOIN damage_types d ON d.shop_id = r.shop_id AND d.id = r.damage_id
  WHERE r.shop_id = @shop`;

function shopRebuild(
  row: RebuildRow,
  { categories, surprisePlanningCents }: Sums,
  estimates: ReadonlyMap<string, number>,
  wages: readonly string[],
): ShopRebuild {
  const [id, tag, name, className, damage, seen, purchaseCents, askingCents, ...rest] = row;
  const [boughtOn, pickedUpOn, startedOn, readyOn, titleIssuedOn, listedOn, leftOn, kind, proceeds, ...sums] = rest;
  const [undated, unknown, lateCount, lateCents, ownSeconds, paidSeconds, xirr, flows, plannedSeconds] = sums;
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
    estimates,
    categories,
    paidLaborCents: wages.reduce((total, name) => total + (categories.get(name)?.paidCents ?? 0), 0),
    hasUnknownForeseen: (unknown ?? 0) > 0,
    hasUndated: (undated ?? 0) > 0,
    surprisePlanningCents,
    lateCount: lateCount ?? 0,
    lateCents: lateCents ?? 0,
    xirr,
    flows,
  };
}
