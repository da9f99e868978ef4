import { dayNumber } from '#shared/day.ts';
import { annualReturn } from '../domain/annual-return.ts';
import type { RawDatabase } from '../platform/database.ts';
import { packFlows } from './flows.ts';

/**
 * Sums kept beside the books so that no answer reads single entries (decisions: per rebuild and category, per
 * rebuild and month, overhead per day, and each rebuild's annual return). Refreshed in the transaction of the
 * write that makes them stale. Works on the raw handle, since imports refresh thousands at once.
 */
export function refreshRollup(raw: RawDatabase, shopId: string, rebuildIds: readonly string[]): void {
  for (let i = 0; i < rebuildIds.length; i += AT_ONCE) refreshSome(raw, shopId, rebuildIds.slice(i, i + AT_ONCE));
}

/** Rebuilds whose cash flows are in memory at the same time. */
const AT_ONCE = 200;

function refreshSome(raw: RawDatabase, shopId: string, rebuildIds: readonly string[]): void {
  const scope = { shop: shopId, ids: JSON.stringify(rebuildIds) };
  for (const table of ['rollup_categories', 'rollup_months', 'rollup_rebuilds']) {
    raw
      .prepare(`DELETE FROM ${table} WHERE shop_id = @shop AND rebuild_id IN (SELECT value FROM json_each(@ids))`)
      .run(scope);
  }
  raw.prepare(CATEGORIES).run(scope);
  raw.prepare(MONTHS).run(scope);
  raw.prepare(REBUILDS).run(scope);
  keepReturns(raw, shopId, scope);
}

const OF_THESE = `shop_id = @shop AND rebuild_id IN (SELECT value FROM json_each(@ids))`;

const CATEGORIES = `
  INSERT INTO rollup_categories
  SELECT shop_id, rebuild_id, category_id, sum(cents),
    sum(CASE WHEN is_extra THEN 0 ELSE coalesce(free_value_cents, cents) END),
    sum(CASE WHEN foreseen = 'surprise' AND NOT is_extra THEN cents ELSE 0 END),
    sum(coalesce(foreseen, '') = 'surprise' AND NOT is_extra AND cents > 0),
    sum(CASE WHEN foreseen = 'surprise' AND NOT is_extra THEN max(0, coalesce(free_value_cents, cents)) ELSE 0 END),
    sum(CASE WHEN is_extra THEN cents ELSE 0 END), sum(coalesce(free_value_cents, 0)), count(*)
  FROM entries WHERE ${OF_THESE} AND voided_at IS NULL
  GROUP BY rebuild_id, category_id`;

const MONTHS = `
  INSERT INTO rollup_months
  SELECT shop_id, rebuild_id, coalesce(substr(dated_on, 1, 7), ''), sum(cents)
  FROM entries WHERE ${OF_THESE} AND voided_at IS NULL
  GROUP BY rebuild_id, coalesce(substr(dated_on, 1, 7), '')`;

// Hours: a rebuild with any dated hours keeps a log, in which a kind that is absent is a true 0. A rebuild with
// only a total from an old sheet leaves the other kind unknown.
const HOURS = `
  SELECT rebuild_id, sum(NOT is_paid) AS own_count, sum(is_paid) AS paid_count, count(worked_on) AS dated_count,
    sum(CASE WHEN is_paid THEN 0 ELSE seconds END) AS own, sum(CASE WHEN is_paid THEN seconds ELSE 0 END) AS paid
  FROM hours WHERE ${OF_THESE} AND voided_at IS NULL GROUP BY rebuild_id`;

const CATEGORY_SUMS = `
  SELECT rebuild_id, sum(planning_cents) AS planning, sum(surprise_planning_cents) AS surprise,
    sum(CASE WHEN category_id IN (SELECT id FROM categories WHERE shop_id = @shop AND is_paid_labor) THEN paid_cents END)
      AS labor,
    json_group_array(json_array(category_id, paid_cents, planning_cents, unforeseen_cents, surprise_count, extra_cents,
      free_cents, entry_count)) AS sums
  FROM rollup_categories WHERE ${OF_THESE} GROUP BY rebuild_id`;

const BASELINES = `
  SELECT e.rebuild_id, sum(l.cents) AS cents, json_group_array(json_array(l.category_id, l.cents)) AS plan
  FROM estimates e JOIN estimate_lines l ON l.shop_id = e.shop_id AND l.estimate_id = e.id
  WHERE e.shop_id = @shop AND e.rebuild_id IN (SELECT value FROM json_each(@ids)) AND e.is_baseline = 1
  GROUP BY e.rebuild_id`;

// The version is the one that the write at hand will raise the books to.
const REBUILDS = `
  INSERT INTO rollup_rebuilds (shop_id, rebuild_id, paid_cents, entry_count, undated_count, unknown_foreseen_count,
    late_count, late_cents, own_seconds, paid_seconds, planning_cents, surprise_planning_cents, paid_labor_cents,
    estimate_cents, category_sums, baseline, refreshed_version)
  SELECT r.shop_id, r.id, coalesce(sum(e.cents), 0), count(e.id), sum(e.id IS NOT NULL AND e.dated_on IS NULL),
    sum(e.id IS NOT NULL AND e.foreseen IS NULL),
    sum(coalesce(e.cents <> 0 AND e.dated_on > coalesce(r.sold_on, r.exit_on), 0)),
    sum(CASE WHEN e.dated_on > coalesce(r.sold_on, r.exit_on) THEN e.cents ELSE 0 END),
    CASE WHEN h.own_count > 0 OR h.dated_count > 0 THEN h.own END,
    CASE WHEN h.paid_count > 0 OR h.dated_count > 0 THEN h.paid END,
    coalesce(c.planning, 0), coalesce(c.surprise, 0), coalesce(c.labor, 0), coalesce(b.cents, 0),
    coalesce(c.sums, '[]'), coalesce(b.plan, '[]'), (SELECT books_version + 1 FROM shops WHERE id = @shop)
  FROM rebuilds r
  LEFT JOIN entries e ON e.shop_id = r.shop_id AND e.rebuild_id = r.id AND e.voided_at IS NULL
  LEFT JOIN (${HOURS}) h ON h.rebuild_id = r.id
  LEFT JOIN (${CATEGORY_SUMS}) c ON c.rebuild_id = r.id
  LEFT JOIN (${BASELINES}) b ON b.rebuild_id = r.id
  WHERE r.shop_id = @shop AND r.id IN (SELECT value FROM json_each(@ids))
  GROUP BY r.id`;

// Grouping by day tempts the planner to walk the whole shop's entries by day for each rebuild: name the index.
const FLOWS = `
  SELECT r.id, r.bought_on, r.purchase_cents, coalesce(r.sold_on, r.exit_on), coalesce(r.sale_cents, r.exit_cents),
    e.dated_on, sum(e.cents)
  FROM rebuilds r
  JOIN rollup_rebuilds k ON k.shop_id = r.shop_id AND k.rebuild_id = r.id AND k.undated_count = 0
  LEFT JOIN entries e INDEXED BY entries_by_rebuild
    ON e.shop_id = r.shop_id AND e.rebuild_id = r.id AND e.voided_at IS NULL
  WHERE r.shop_id = @shop AND r.id IN (SELECT value FROM json_each(@ids))
    AND r.bought_on IS NOT NULL AND r.purchase_cents IS NOT NULL
    AND coalesce(r.sold_on, r.exit_on) IS NOT NULL
  GROUP BY r.id, e.dated_on ORDER BY r.id`;

type FlowRow = [string, string, number, string, number, string | null, number | null];

/** Keeps the day-by-day cash flow and annual return of each rebuild that left and whose entries are all dated. */
function keepReturns(raw: RawDatabase, shopId: string, scope: { shop: string; ids: string }): void {
  const rows = raw.prepare(FLOWS).raw().all(scope) as FlowRow[];
  const keep = raw.prepare('UPDATE rollup_rebuilds SET xirr = ?, flows = ? WHERE shop_id = ? AND rebuild_id = ?');
  for (let i = 0; i < rows.length; ) {
    const [id, boughtOn, purchase, leftOn, proceeds] = rows[i] as FlowRow;
    const net = new Map<number, number>();
    const add = (day: string, cents: number) => net.set(dayNumber(day), (net.get(dayNumber(day)) ?? 0) + cents);
    add(boughtOn, -purchase);
    add(leftOn, proceeds);
    for (; i < rows.length && rows[i]?.[0] === id; i += 1) {
      const [, , , , , day, cents] = rows[i] as FlowRow;
      if (day !== null && cents !== null) add(day, -cents);
    }
    keep.run(annualReturn(net), packFlows(net), shopId, id);
  }
}

/** Overhead per day and category, anew. */
export function refreshOverhead(raw: RawDatabase, shopId: string): void {
  raw.prepare('DELETE FROM rollup_overhead WHERE shop_id = ?').run(shopId);
  raw
    .prepare(
      `INSERT INTO rollup_overhead
       SELECT shop_id, dated_on, category_id, sum(cents), count(*) FROM entries
       WHERE shop_id = ? AND rebuild_id IS NULL AND voided_at IS NULL GROUP BY dated_on, category_id`,
    )
    .run(shopId);
}

/** Every sum of a shop anew: after a restore, and to prove that the kept ones are right. */
export function rebuildRollup(raw: RawDatabase, shopId: string): void {
  for (const table of ['rollup_categories', 'rollup_months', 'rollup_rebuilds']) {
    raw.prepare(`DELETE FROM ${table} WHERE shop_id = ?`).run(shopId);
  }
  const ids = raw.prepare('SELECT id FROM rebuilds WHERE shop_id = ?').pluck().all(shopId) as string[];
  refreshRollup(raw, shopId, ids);
  refreshOverhead(raw, shopId);
}
