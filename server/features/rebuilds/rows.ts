import type { Knex } from 'knex';
import type { RebuildRow } from '#shared/contracts/rebuilds.ts';
import type { Day } from '#shared/day.ts';
import { NAME_SQL, STAGE_SQL } from '../../books/rebuild-words.ts';
import type { ShopScope } from '../../books/scope.ts';
import { fromRow } from '../../platform/rows.ts';

// Money comes from the kept sums, never from single entries. The locked baseline is the only plan here.
const ROWS = `
  SELECT r.id, r.tag, ${NAME_SQL} AS name, c.name AS class_name, d.name AS damage_name, r.class_id, r.damage_id, r.vin,
    ${STAGE_SQL} AS stage, r.is_seen, r.bought_on, coalesce(r.sold_on, r.exit_on) AS left_on,
    CAST(julianday(coalesce(r.sold_on, r.exit_on, :today)) - julianday(r.bought_on) AS INTEGER) AS days_held,
    r.purchase_cents, r.purchase_cents + coalesce(k.paid_cents, 0) AS cost_cents,
    CASE WHEN r.sold_on IS NULL THEN r.exit_cents ELSE r.sale_cents END AS proceeds_cents,
    CASE WHEN r.sold_on IS NULL THEN r.exit_cents ELSE r.sale_cents END
      - r.purchase_cents - coalesce(k.paid_cents, 0) AS kept_cents, k.own_seconds,
    e.estimate_cents, coalesce(p.planning_cents, 0) AS planning_cents, coalesce(p.surprise_cents, 0) AS surprise_cents
  FROM rebuilds r
  LEFT JOIN vehicle_classes c ON c.shop_id = r.shop_id AND c.id = r.class_id
  LEFT JOIN damage_types d ON d.shop_id = r.shop_id AND d.id = r.damage_id
  LEFT JOIN rollup_rebuilds k ON k.shop_id = r.shop_id AND k.rebuild_id = r.id
  LEFT JOIN (
    SELECT rebuild_id, sum(planning_cents) AS planning_cents, sum(unforeseen_cents) AS surprise_cents
    FROM rollup_categories WHERE shop_id = :shop GROUP BY rebuild_id) p ON p.rebuild_id = r.id
  LEFT JOIN (
    SELECT s.rebuild_id, coalesce(sum(l.cents), 0) AS estimate_cents FROM estimates s
    LEFT JOIN estimate_lines l ON l.shop_id = s.shop_id AND l.estimate_id = s.id
    WHERE s.shop_id = :shop AND s.is_baseline = 1 GROUP BY s.rebuild_id) e ON e.rebuild_id = r.id
  WHERE r.shop_id = :shop`;

/** Every rebuild of the shop as a line of the list, to be filtered and sorted further. */
export function rebuildRows(scope: ShopScope, today: Day): Knex.QueryBuilder {
  const { db, shopId } = scope;
  const whole = `SELECT *, CASE WHEN own_seconds > 0 THEN kept_cents * 3600.0 / own_seconds END AS kept_per_hour_cents,
    CASE WHEN estimate_cents > 0 THEN (planning_cents - estimate_cents) * 1.0 / estimate_cents END AS overrun_rate
    FROM (${ROWS})`;
  return db.from(db.raw(`(${whole}) AS listed`, { shop: shopId, today }));
}

/** The list's line of one rebuild; 404 if this shop has none with that id. */
export async function rebuildRow(scope: ShopScope, today: Day, id: string): Promise<RebuildRow> {
  await scope.get('rebuilds', id);
  return fromRow<RebuildRow>(await rebuildRows(scope, today).where({ id }).first());
}
