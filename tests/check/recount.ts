import { addPackedFlows } from '../../server/books/flows.ts';
import { hasFlows } from '../../server/domain/annual-return.ts';
import { factsFromLines, flowsOf, type Line, type RebuildFrame } from '../../server/domain/facts-from-lines.ts';
import { netFlows } from '../../server/domain/net-flows.ts';
import type { RawDatabase } from '../../server/platform/database.ts';

/** Sums by name: `categories/<rebuild>/<category>` and so on, each a list of figures. */
export type Sums = Map<string, readonly (string | number | null)[]>;

interface EntryRow {
  rebuild_id: string | null;
  category_id: string;
  dated_on: string | null;
  cents: number;
  foreseen: string | null;
  is_extra: number;
  free_value_cents: number | null;
}
interface HoursRow {
  rebuild_id: string;
  worked_on: string | null;
  seconds: number;
  is_paid: number;
}
interface RebuildRow {
  id: string;
  bought_on: string | null;
  purchase_cents: number | null;
  left_on: string | null;
  proceeds_cents: number | null;
}

/** Every sum of a shop counted anew in plain TypeScript from its entries and hours: what the kept ones must equal. */
export function recount(raw: RawDatabase, shopId: string): Sums {
  const entries = raw
    .prepare('SELECT * FROM entries WHERE shop_id = ? AND voided_at IS NULL')
    .all(shopId) as EntryRow[];
  const hours = raw.prepare('SELECT * FROM hours WHERE shop_id = ? AND voided_at IS NULL').all(shopId) as HoursRow[];
  const rebuilds = raw
    .prepare(
      `SELECT id, bought_on, purchase_cents, coalesce(sold_on, exit_on) AS left_on,
       coalesce(sale_cents, exit_cents) AS proceeds_cents FROM rebuilds WHERE shop_id = ?`,
    )
    .all(shopId) as RebuildRow[];
  const entriesOf = grouped(entries);
  const hoursOf = grouped(hours);
  const sums: Sums = new Map();
  for (const rebuild of rebuilds) {
    countRebuild(sums, rebuild, entriesOf.get(rebuild.id) ?? [], hoursOf.get(rebuild.id) ?? []);
  }
  countOverhead(sums, entriesOf.get(null) ?? []);
  return sums;
}

/** The sums as they are kept, under the same names. */
export function kept(raw: RawDatabase, shopId: string): Sums {
  const sums: Sums = new Map();
  const read = (sql: string) => raw.prepare(sql).raw().all(shopId) as [string, ...(string | number | null)[]][];
  const collect = (sql: string) => read(sql).forEach(([name, ...figures]) => sums.set(name, figures));
  collect(`SELECT 'category/' || rebuild_id || '/' || category_id, paid_cents, planning_cents, unforeseen_cents,
    surprise_count, surprise_planning_cents, extra_cents, free_cents, entry_count FROM rollup_categories WHERE shop_id = ?`);
  collect(`SELECT 'month/' || rebuild_id || '/' || month, paid_cents FROM rollup_months WHERE shop_id = ?`);
  collect(`SELECT 'totals/' || rebuild_id, planning_cents, surprise_planning_cents FROM rollup_rebuilds
    WHERE shop_id = ?`);
  collect(`SELECT 'text/' || k.rebuild_id || '/' || (c.value ->> 0), c.value ->> 1, c.value ->> 2, c.value ->> 3,
    c.value ->> 4, c.value ->> 5, c.value ->> 6, c.value ->> 7
    FROM rollup_rebuilds k, json_each(k.category_sums) c WHERE k.shop_id = ?`);
  collect(`SELECT 'rebuild/' || rebuild_id, paid_cents, entry_count, undated_count, unknown_foreseen_count, late_count,
    late_cents, own_seconds, paid_seconds, xirr FROM rollup_rebuilds WHERE shop_id = ?`);
  collect(`SELECT 'overhead/' || dated_on || '/' || category_id, paid_cents, entry_count FROM rollup_overhead
    WHERE shop_id = ?`);
  const packed = raw.prepare('SELECT rebuild_id, flows FROM rollup_rebuilds WHERE shop_id = ? AND flows IS NOT NULL');
  for (const { rebuild_id, flows } of packed.all(shopId) as { rebuild_id: string; flows: Buffer }[]) {
    const net = new Map<number, number>();
    addPackedFlows(net, flows);
    sums.set(`flows/${rebuild_id}`, inOrder(net));
  }
  return sums;
}

/** Names whose figures differ, with both; nothing if all agree. */
export function differences(expected: Sums, actual: Sums): string[] {
  const names = [...new Set([...expected.keys(), ...actual.keys()])].sort();
  return names.flatMap((name) => {
    const [counted, found] = [JSON.stringify(expected.get(name)), JSON.stringify(actual.get(name))];
    return counted === found ? [] : [`${name}: counted ${counted}, kept ${found}`];
  });
}

function countRebuild(sums: Sums, rebuild: RebuildRow, entries: readonly EntryRow[], hours: readonly HoursRow[]): void {
  const lines = entries.map(asLine);
  const facts = factsFromLines(frameOf(rebuild), lines, null);
  for (const [category, one] of facts.categories) {
    const of = entries.filter((entry) => entry.category_id === category).map(asLine);
    const found = of.filter((line) => line.isForeseen === false && !line.isExtra);
    const expected = found.reduce((total, line) => total + Math.max(0, line.freeCents ?? line.cents), 0);
    sums.set(`category/${rebuild.id}/${category}`, [
      one.paidCents,
      one.planningCents,
      one.unforeseenCents,
      one.surpriseCount,
      expected,
      one.extraCents,
      one.freeCents,
      one.entryCount,
    ]);
    const { paidCents, planningCents, unforeseenCents, surpriseCount, extraCents, freeCents, entryCount } = one;
    const figures = [paidCents, planningCents, unforeseenCents, surpriseCount, extraCents, freeCents, entryCount];
    sums.set(`text/${rebuild.id}/${category}`, figures);
  }
  sums.set(`totals/${rebuild.id}`, [facts.planningCents, facts.surprisePlanningCents]);
  for (const line of lines) add(sums, `month/${rebuild.id}/${line.on?.slice(0, 7) ?? ''}`, [line.cents]);
  const paid = lines.reduce((total, line) => total + line.cents, 0);
  const unknown = lines.filter((line) => line.isForeseen === null).length;
  const undated = lines.filter((line) => line.on === null).length;
  const { lateCount, lateCents, xirr } = facts;
  const [own, paidSeconds] = [secondsOf(hours, 0), secondsOf(hours, 1)];
  sums.set(`rebuild/${rebuild.id}`, [
    paid,
    lines.length,
    undated,
    unknown,
    lateCount,
    lateCents,
    own,
    paidSeconds,
    xirr,
  ]);
  if (hasFlows(facts)) sums.set(`flows/${rebuild.id}`, inOrder(netFlows(flowsOf(facts, lines))));
}

/** Seconds of one kind: null where an undated total of the other kind is all that is known. */
function secondsOf(hours: readonly HoursRow[], isPaid: number): number | null {
  const of = hours.filter((row) => row.is_paid === isPaid);
  const isLogged = hours.some((row) => row.worked_on !== null);
  return of.length > 0 || isLogged ? of.reduce((total, row) => total + row.seconds, 0) : null;
}

/** Net flows as day, cents, day, cents … by day; days without any are left out. */
function inOrder(net: ReadonlyMap<number, number>): number[] {
  return [...net]
    .filter(([, cents]) => cents !== 0)
    .sort(([a], [b]) => a - b)
    .flat();
}

function countOverhead(sums: Sums, entries: readonly EntryRow[]): void {
  for (const { dated_on, category_id, cents } of entries) add(sums, `overhead/${dated_on}/${category_id}`, [cents, 1]);
}

function add(sums: Sums, name: string, figures: readonly number[]): void {
  const before = sums.get(name);
  sums.set(
    name,
    figures.map((figure, i) => figure + Number(before?.[i] ?? 0)),
  );
}

const asLine = (entry: EntryRow): Line => ({
  on: entry.dated_on,
  category: entry.category_id,
  cents: entry.cents,
  isForeseen: entry.foreseen === null ? null : entry.foreseen === 'foreseen',
  isExtra: entry.is_extra === 1,
  freeCents: entry.free_value_cents,
});

const frameOf = (rebuild: RebuildRow): RebuildFrame => ({
  id: rebuild.id,
  class: null,
  damage: null,
  seen: null,
  boughtOn: rebuild.bought_on,
  readyOn: null,
  listedOn: null,
  exit:
    rebuild.left_on === null || rebuild.proceeds_cents === null
      ? null
      : { kind: 'sold', on: rebuild.left_on, proceedsCents: rebuild.proceeds_cents },
  purchaseCents: rebuild.purchase_cents,
  ownSeconds: null,
  paidSeconds: null,
  estimates: new Map(),
});

function grouped<T extends { rebuild_id: string | null }>(rows: readonly T[]): Map<string | null, T[]> {
  const groups = new Map<string | null, T[]>();
  for (const row of rows) {
    const group = groups.get(row.rebuild_id);
    if (group) group.push(row);
    else groups.set(row.rebuild_id, [row]);
  }
  return groups;
}
