import type { Day } from '#shared/day.ts';
import type { RebuildFacts } from '../domain/facts.ts';
import type { Overhead } from '../domain/years.ts';
import type { RawDatabase } from '../platform/database.ts';
import { readRebuilds } from './shop-facts-rows.ts';

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
  /** Sale expected when the estimate was locked, cents. null = not said. */
  readonly expectedSaleCents: number | null;
}

export interface Named {
  readonly id: string;
  readonly name: string;
}

export interface NamedCategory extends Named {
  readonly isPaidLabor: boolean;
}

/** Everything of a shop that the answers are worked out from. Names stand in the facts; their ids stand here. */
export interface ShopFacts {
  readonly shopId: string;
  readonly booksVersion: number;
  readonly startMonth: number;
  readonly wantedCentsPerHour: number | null;
  readonly classes: readonly Named[];
  readonly damages: readonly Named[];
  readonly categories: readonly NamedCategory[];
  readonly rebuilds: readonly ShopRebuild[];
  readonly overhead: readonly Overhead[];
}

/**
 * Reads a shop's facts from the kept sums, never from entries, all at one moment: call it inside a read transaction.
 * With the facts of an earlier version, only the rebuilds whose sums were refreshed since are read again.
 */
export function readShopFacts(raw: RawDatabase, shopId: string, earlier?: ShopFacts): ShopFacts {
  const [booksVersion, startMonth, wantedCentsPerHour] = raw.prepare(SHOP).raw().get(shopId) as ShopRow;
  const named = (table: string) =>
    raw.prepare(`SELECT id, name FROM ${table} WHERE shop_id = ? ORDER BY position, name`).all(shopId) as Named[];
  const categories = raw.prepare(CATEGORY_LIST).all(shopId) as (Named & { isPaidLabor: number })[];
  const lists = {
    classes: named('vehicle_classes'),
    damages: named('damage_types'),
    categories: categories.map((one) => ({ ...one, isPaidLabor: one.isPaidLabor === 1 })),
  };
  return {
    shopId,
    booksVersion,
    startMonth,
    wantedCentsPerHour,
    ...lists,
    rebuilds: (earlier && refreshed(raw, earlier, lists)) ?? readRebuilds(raw, shopId, lists.categories),
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
const CHANGED = `SELECT rebuild_id FROM rollup_rebuilds WHERE shop_id = ? AND refreshed_version > ?`;

/** With more than this to read again, reading everything is no slower. */
const MOST_PATCHED = 500;

type Lists = Pick<ShopFacts, 'classes' | 'damages' | 'categories'>;

/** The earlier rebuilds with the changed ones read anew. null = a name of a list changed, or a rebuild is gone: read all. */
function refreshed(raw: RawDatabase, earlier: ShopFacts, lists: Lists): readonly ShopRebuild[] | null {
  const { shopId, classes, damages, categories } = earlier;
  if (JSON.stringify(lists) !== JSON.stringify({ classes, damages, categories })) return null;
  const changed = raw.prepare(CHANGED).pluck().all(shopId, earlier.booksVersion) as string[];
  if (changed.length > MOST_PATCHED) return null;
  const news = changed.length > 0 ? readRebuilds(raw, shopId, categories, changed) : [];
  const byId = new Map(news.map((one) => [one.id, one]));
  const rebuilds = earlier.rebuilds.map((one) => {
    const anew = byId.get(one.id);
    byId.delete(one.id);
    return anew ?? one;
  });
  const count = raw.prepare('SELECT count(*) FROM rebuilds WHERE shop_id = ?').pluck().get(shopId);
  return rebuilds.length + byId.size === count ? [...rebuilds, ...byId.values()] : null;
}
