import type { Knex } from 'knex';
import { z } from 'zod';
import type { RebuildRow, rebuildsApi } from '#shared/contracts/rebuilds.ts';
import type { Day } from '#shared/day.ts';
import type { ShopScope } from '../../books/scope.ts';
import { yearSpan } from '../../domain/years.ts';
import { likePattern, readCursor, writeCursor } from '../../platform/cursor.ts';
import { fromRow } from '../../platform/rows.ts';
import { rebuildRows } from './rows.ts';

type Query = z.output<typeof rebuildsApi.list.query>;
type Page = z.output<typeof rebuildsApi.list.response>;

const PAGE = 100;
const SORT_COLUMNS = {
  bought: 'bought_on',
  left: 'left_on',
  tag: 'tag',
  kept: 'kept_cents',
  hours: 'own_seconds',
  overrun: 'overrun_rate',
} as const;
const cursorParts = z.tuple([z.union([z.string(), z.number(), z.null()]), z.string()]);

/** A page of the list, and what all that the filter matches come to. Rebuilds without the sorted value come last. */
export async function listRebuilds(scope: ShopScope, query: Query, today: Day): Promise<Page> {
  const startMonth = await yearStart(scope);
  const matches = () => filtered(rebuildRows(scope, today), query, startMonth);
  const { sort = 'bought', order = sort === 'tag' ? 'up' : 'down' } = query;
  const column = SORT_COLUMNS[sort];
  const page = matches()
    .orderByRaw(`${column} IS NULL, ${column} ${order === 'up' ? 'ASC' : 'DESC'}, id`)
    .limit(PAGE + 1);
  const after = readCursor(query.cursor, cursorParts);
  if (after) startAfter(page, column, order, after);
  const raw: (Record<string, string | number | null> & { id: string })[] = await page;
  const rows = raw.slice(0, PAGE);
  const last = rows.at(-1);
  return {
    rows: rows.map((row) => fromRow<RebuildRow>(row)),
    summary: await summaryOf(matches()),
    next: raw.length > PAGE && last ? writeCursor([last[column] ?? null, last.id]) : null,
  };
}

function startAfter(page: Knex.QueryBuilder, column: string, order: 'up' | 'down', after: [unknown, string]): void {
  const [value, id] = after as [string | number | null, string];
  if (value === null) {
    page.whereNull(column).where('id', '>', id);
    return;
  }
  const beyond = order === 'up' ? '>' : '<';
  page.whereRaw(`(${column} ${beyond} ? OR (${column} = ? AND id > ?) OR ${column} IS NULL)`, [value, value, id]);
}

function filtered(rows: Knex.QueryBuilder, query: Query, startMonth: number): Knex.QueryBuilder {
  if (query.stage) rows.where({ stage: query.stage });
  if (query.class) rows.where({ class_id: query.class });
  if (query.damage) rows.where({ damage_id: query.damage });
  if (query.seen) rows.where({ is_seen: query.seen === 'unknown' ? null : Number(query.seen === 'yes') });
  if (query.year !== undefined) {
    const { from, to } = yearSpan(query.year, startMonth);
    rows.whereBetween('left_on', [from, to]);
  }
  if (query.find?.trim()) {
    const pattern = likePattern(query.find);
    rows.whereRaw(`(tag LIKE ? ESCAPE '\\' OR name LIKE ? ESCAPE '\\' OR vin LIKE ? ESCAPE '\\')`, [
      pattern,
      pattern,
      pattern,
    ]);
  }
  return rows;
}

async function summaryOf(matches: Knex.QueryBuilder): Promise<Page['summary']> {
  const sums = matches.select(
    matches.client.raw(`count(*) AS total, count(left_on) AS left_count, coalesce(sum(kept_cents < 0), 0) AS loss_count,
      coalesce(sum(left_on IS NOT NULL AND purchase_cents IS NULL), 0) AS no_purchase_count,
      coalesce(sum(kept_cents), 0) AS kept_cents, coalesce(sum(left_on IS NULL), 0) AS open_count,
      coalesce(sum(CASE WHEN left_on IS NULL THEN cost_cents END), 0) AS open_cost_cents`),
  );
  return fromRow<Page['summary']>(await sums.first());
}

async function yearStart(scope: ShopScope): Promise<number> {
  const shop = await scope.db('shops').where({ id: scope.shopId }).first<{ year_start_month: number }>();
  return shop.year_start_month;
}
