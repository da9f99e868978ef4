import { z } from 'zod';
import type { BidRow, bidsApi } from '#shared/contracts/bids.ts';
import type { ShopScope } from '../../books/scope.ts';
import { readCursor, writeCursor } from '../../platform/cursor.ts';
import { fromRow } from '../../platform/rows.ts';

type Query = z.output<typeof bidsApi.list.query>;
type Page = z.output<typeof bidsApi.list.response>;

const PAGE = 100;
const cursorParts = z.tuple([z.string(), z.string()]);

/** A page of the kept sheets, the latest first, and how many the filter matches. */
export async function listBids(scope: ShopScope, query: Query): Promise<Page> {
  const matches = () => {
    const sheets = scope.table('bid_sheets');
    return query.state ? sheets.where('bid_sheets.state', query.state) : sheets;
  };
  const page = rowsOf(scope, matches()).limit(PAGE + 1);
  const after = readCursor(query.cursor, cursorParts);
  if (after) page.whereRaw('(bid_sheets.created_at, bid_sheets.id) < (?, ?)', after);
  const raw: { id: string; created_at: string }[] = await page;
  const rows = raw.slice(0, PAGE);
  const last = rows.at(-1);
  const [{ total }] = (await matches().count('* as total')) as [{ total: number }];
  return {
    rows: rows.map((row) => fromRow<BidRow>(row)),
    total,
    next: raw.length > PAGE && last ? writeCursor([last.created_at, last.id]) : null,
  };
}

function rowsOf({ db }: ShopScope, sheets: ReturnType<ShopScope['table']>) {
  const ofShop = (table: string, id: string) => ({ [`${table}.shop_id`]: 'bid_sheets.shop_id', [`${table}.id`]: id });
  return sheets
    .leftJoin('vehicle_classes', ofShop('vehicle_classes', 'bid_sheets.class_id'))
    .leftJoin('damage_types', ofShop('damage_types', 'bid_sheets.damage_id'))
    .leftJoin('rebuilds', ofShop('rebuilds', 'bid_sheets.rebuild_id'))
    .join('users', 'users.id', 'bid_sheets.made_by')
    .select('bid_sheets.*', 'vehicle_classes.name as class_name', 'damage_types.name as damage_name')
    .select('rebuilds.tag as rebuild_tag', 'users.name as made_by_name')
    .select(db.raw(`figures ->> 'planCents' AS plan_cents, figures ->> 'bidCents' AS bid_cents`))
    .orderBy([
      { column: 'bid_sheets.created_at', order: 'desc' },
      { column: 'bid_sheets.id', order: 'desc' },
    ]);
}
