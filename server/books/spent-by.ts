import { addDays, type Day } from '#shared/day.ts';
import type { RebuildFacts } from '../domain/facts.ts';
import type { TiedUp } from '../domain/years.ts';
import type { RawDatabase } from '../platform/database.ts';

const MONTHS = `
  SELECT rebuild_id, sum(paid_cents) FROM rollup_months
  WHERE shop_id = @shop AND rebuild_id IN (SELECT value FROM json_each(@ids)) AND month < @month GROUP BY rebuild_id`;
const DAYS = `
  SELECT rebuild_id, sum(cents) FROM entries INDEXED BY entries_by_day
  WHERE shop_id = @shop AND dated_on BETWEEN @first AND @on AND voided_at IS NULL
    AND rebuild_id IN (SELECT value FROM json_each(@ids)) GROUP BY rebuild_id`;

/**
 * Cents paid on each of these rebuilds up to and including a day, undated entries too. Whole months come from the kept
 * sums; only a day inside a month looks at that month's entries.
 */
export function spentBy(raw: RawDatabase, shopId: string, ids: readonly string[], on: Day): Map<string, number> {
  const isMonthEnd = addDays(on, 1).endsWith('-01');
  const scope = { shop: shopId, ids: JSON.stringify(ids) };
  // A month without a name holds the undated entries, and comes before every other.
  const month = (isMonthEnd ? addDays(on, 1) : on).slice(0, 7);
  const rows = raw
    .prepare(MONTHS)
    .raw()
    .all({ ...scope, month }) as [string, number][];
  const spent = new Map(rows);
  if (isMonthEnd) return spent;
  const days = raw
    .prepare(DAYS)
    .raw()
    .all({ ...scope, first: `${month}-01`, on }) as [string, number][];
  for (const [id, cents] of days) spent.set(id, (spent.get(id) ?? 0) + cents);
  return spent;
}

/** Rebuilds that the shop holds on a day: bought by then, and not gone on or before it (definitions §18.6). */
export function heldOn<T extends RebuildFacts>(rebuilds: readonly T[], on: Day): T[] {
  return rebuilds.filter(
    ({ boughtOn, exit }) => boughtOn !== null && boughtOn <= on && (exit === null || exit.on > on),
  );
}

/** Money tied up on a day (definitions §18.6): in the rebuilds held, purchase and what was paid by then. */
export function tiedUpOn(raw: RawDatabase, shopId: string, rebuilds: readonly RebuildFacts[], on: Day): TiedUp {
  const held = heldOn(rebuilds, on);
  let cents = 0;
  for (const { purchaseCents } of held) cents += purchaseCents ?? 0;
  for (const paid of spentBy(
    raw,
    shopId,
    held.map(({ id }) => id),
    on,
  ).values())
    cents += paid;
  return { on, rebuildCount: held.length, cents };
}
