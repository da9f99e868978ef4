import type { Day } from '#shared/day.ts';
import type { ExitKind } from '#shared/vocabulary.ts';
import type { CategoryFacts, RebuildFacts } from '../domain/facts.ts';
import type { Overhead } from '../domain/years.ts';
import type { RawDatabase } from '../platform/database.ts';
import { NAME_SQL } from './rebuild-words.ts';

/** A rebuild as the answers see it: its facts for the measures, and what a page says of it. */
export interface ShopRebuild extends RebuildFacts {
  readonly tag: string;
  /** Year, make and model, else its class; may be empty. */
  readonly name: string;
  readonly pickedUpOn: Day | null;
  readonly startedOn: Day | null;
  readonly titleIssuedOn: Day | null;
  readonly askingCents: number | null;
  /** Hours of the locked estimate, in seconds. null = none planned. */
  readonly plannedSeconds: number | null;
  /** Packed cash flows by day (see `flows.ts`); null = it has no annual return. */
  readonly flows: Buffer | null;
}

export interface Named {
  readonly id: string;
  readonly name: string;
}

/** Everything of a shop that the answers are worked out from. Names stand in the facts; their ids stand here. */
export interface ShopFacts {
  readonly shopId: string;
  readonly booksVersion: number;
  readonly startMonth: number;
  readonly wantedCentsPerHour: number | null;
  readonly classes: readonly Named[];
  readonly damages: readonly Named[];
  readonly categories: readonly Named[];
  readonly rebuilds: readonly ShopRebuild[];
  readonly overhead: readonly Overhead[];
}

/**
 * Reads a shop's facts from the kept sums, never from entries, all at one moment: call it inside a read transaction.
 * Rows come as plain arrays and each list once, since an answer after a change waits for this.
 */
export function readShopFacts(raw: RawDatabase, shopId: string): ShopFacts {
  const [booksVersion, startMonth, wantedCentsPerHour] = raw.prepare(SHOP).raw().get(shopId) as ShopRow;
  const named = (table: string) =>
    raw.prepare(`SELECT id, name FROM ${table} WHERE shop_id = ? ORDER BY position, name`).all(shopId) as Named[];
  const categories = raw.prepare(CATEGORY_LIST).all(shopId) as (Named & { isPaidLabor: number })[];
  const nameOf = new Map(categories.map(({ id, name }) => [id, name]));
  const wages = categories.filter(({ isPaidLabor }) => isPaidLabor === 1).map(({ name }) => name);
  const sums = readSums(raw, shopId, nameOf);
  const estimates = readEstimates(raw, shopId, nameOf);
  const rows = raw.prepare(REBUILDS).raw().all(shopId) as RebuildRow[];
  return {
    shopId,
    booksVersion,
    startMonth,
    wantedCentsPerHour,
    classes: named('vehicle_classes'),
    damages: named('damage_types'),
    categories,
    rebuilds: rows.map((row) =>
      shopRebuild(row, sums.get(row[0]) ?? NO_SUMS, estimates.get(row[0]) ?? NO_ESTIMATE, wages),
    ),
    overhead: raw.prepare(OVERHEAD).all(shopId) as Overhead[],
  };
}

type ShopRow = [number, number, number | null];
const SHOP = `SELECT books_version, year_start_month, wanted_cents_per_hour FROM shops WHERE id = ?`;
const CATEGORY_LIST = `
  SELECT id, name, is_paid_labor AS isPaidLabor FROM categories WHERE shop_id = ? ORDER BY position, name`;
const OVERHEAD = `
  SELECT dated_on AS "on", sum(paid_cents) AS cents FROM rollup_overhead WHERE shop_id = ?
  GROUP BY dated_on ORDER BY dated_on`;

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
  FROM rollup_categories WHERE shop_id = ? GROUP BY rebuild_id`;
type SumRow = [string, number, number, number, number, number, number, number, number];

function readSums(raw: RawDatabase, shopId: string, nameOf: ReadonlyMap<string, string>): Map<string, Sums> {
  const all = new Map<string, Sums>();
  for (const [rebuildId, json] of raw.prepare(SUMS).raw().all(shopId) as [string, string][]) {
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
  FROM estimates e WHERE shop_id = ? AND is_baseline = 1`;

function readEstimates(
  raw: RawDatabase,
  shopId: string,
  nameOf: ReadonlyMap<string, string>,
): Map<string, ReadonlyMap<string, number>> {
  const all = new Map<string, ReadonlyMap<string, number>>();
  for (const [rebuildId, json] of raw.prepare(ESTIMATES).raw().all(shopId) as [string, string][]) {
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
  WHERE r.shop_id = ?`;

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
