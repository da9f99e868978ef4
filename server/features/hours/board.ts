import type { BoardRow } from '#shared/contracts/hours.ts';
import { NAME_SQL, OPEN_SQL, STAGE_SQL } from '../../books/rebuild-words.ts';
import type { ShopScope } from '../../books/scope.ts';
import { fromRow } from '../../platform/rows.ts';

const BOARD = `
  SELECT r.id, r.tag, ${NAME_SQL} AS name, d.name AS damage_name, ${STAGE_SQL} AS stage,
    coalesce(k.own_seconds, 0) + coalesce(k.paid_seconds, 0) AS logged_seconds,
    (SELECT s.planned_seconds FROM estimates s WHERE s.shop_id = r.shop_id AND s.rebuild_id = r.id
      ORDER BY s.is_baseline DESC, s.revision LIMIT 1) AS planned_seconds
  FROM rebuilds r
  LEFT JOIN vehicle_classes c ON c.shop_id = r.shop_id AND c.id = r.class_id
  LEFT JOIN damage_types d ON d.shop_id = r.shop_id AND d.id = r.damage_id
  LEFT JOIN rollup_rebuilds k ON k.shop_id = r.shop_id AND k.rebuild_id = r.id
  WHERE r.shop_id = ? AND ${OPEN_SQL}
  ORDER BY r.started_on IS NULL, r.started_on DESC, r.bought_on DESC, r.tag`;

/** Open rebuilds, those being worked on first, with their hours and no money. */
export async function openBoard({ db, shopId }: ShopScope): Promise<BoardRow[]> {
  const rows: object[] = await db.raw(BOARD, [shopId]);
  return rows.map((row) => fromRow<BoardRow>(row));
}
