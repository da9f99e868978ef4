import type { Day } from '#shared/day.ts';
import { dayInZone } from '#shared/day.ts';
import type { RawDatabase } from '../../platform/database.ts';
import { pastSheets } from './earlier/past-sheets.ts';
import type { ExistingRebuild, ShopBooks } from './books.ts';

interface ShopRow {
  readonly currency: string;
  readonly locale: string;
  readonly time_zone: string;
  readonly fixed_today: Day | null;
}

const REBUILDS = `
  SELECT r.id, r.tag, r.year, r.make, r.model, r.purchase_cents IS NOT NULL AS has_purchase,
    r.sale_cents IS NOT NULL OR r.exit_kind IS NOT NULL AS has_left,
    EXISTS (SELECT 1 FROM estimates e WHERE e.shop_id = r.shop_id AND e.rebuild_id = r.id) AS has_baseline,
    EXISTS (SELECT 1 FROM entries e WHERE e.shop_id = r.shop_id AND e.rebuild_id = r.id) AS has_entries
  FROM rebuilds r WHERE r.shop_id = ? ORDER BY r.created_at, r.id`;

type RebuildRow = Pick<ExistingRebuild, 'id' | 'tag' | 'year' | 'make' | 'model'> &
  Record<'has_purchase' | 'has_left' | 'has_baseline' | 'has_entries', number>;

/** What understanding a file needs to know of a shop, as its books stand now. */
export function shopBooks(raw: RawDatabase, shopId: string, now: Date): ShopBooks {
  const shop = raw
    .prepare('SELECT currency, locale, time_zone, fixed_today FROM shops WHERE id = ?')
    .get(shopId) as ShopRow;
  const names = (table: string, isRetired = 0) =>
    raw
      .prepare(`SELECT name FROM ${table} WHERE shop_id = ? AND is_retired = ? ORDER BY position`)
      .pluck()
      .all(shopId, isRetired) as string[];
  const rebuilds = raw.prepare(REBUILDS).all(shopId) as RebuildRow[];
  return {
    currency: shop.currency,
    locale: shop.locale,
    today: shop.fixed_today ?? dayInZone(now, shop.time_zone),
    categories: names('categories'),
    retiredCategories: names('categories', 1),
    classes: names('vehicle_classes'),
    damages: names('damage_types'),
    past: pastSheets(raw, shopId),
    rebuilds: rebuilds.map(({ has_purchase, has_left, has_baseline, has_entries, ...rebuild }) => ({
      ...rebuild,
      hasPurchase: has_purchase === 1,
      hasLeft: has_left === 1,
      hasBaseline: has_baseline === 1,
      hasEntries: has_entries === 1,
    })),
  };
}

/** Ids of the shop's words by their names, in any case: retired ones too, so that none is made twice. */
export function wordIds(
  raw: RawDatabase,
  shopId: string,
  table: 'categories' | 'vehicle_classes' | 'damage_types' | 'workers',
): Map<string, string> {
  const rows = raw.prepare(`SELECT name, id FROM ${table} WHERE shop_id = ?`).raw().all(shopId) as [string, string][];
  return new Map(rows.map(([name, id]) => [name.toLowerCase(), id]));
}
