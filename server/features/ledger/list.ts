import type { Knex } from 'knex';
import { z } from 'zod';
import type { EntryRow, LedgerQuery, ledgerApi } from '#shared/contracts/ledger.ts';
import type { ShopScope } from '../../books/scope.ts';
import { likePattern, readCursor, writeCursor } from '../../platform/cursor.ts';
import { fromRow } from '../../platform/rows.ts';

type Page = z.output<typeof ledgerApi.list.response>;
type Found = EntryRow & { readonly place: number };

const PAGE = 100;
const cursorParts = z.tuple([z.string().nullable(), z.number()]);

/**
 * A page of entries, newest day first, undated ones last; within a day the latest made first. Dated and undated
 * ones are two queries, so that each walks its index from where the last page ended.
 */
export async function listEntries(scope: ShopScope, query: LedgerQuery): Promise<Page> {
  const after = readCursor(query.cursor, cursorParts);
  const dated = after?.[0] === null ? [] : await datedEntries(scope, query, after);
  const missing = PAGE + 1 - dated.length;
  const undated = missing > 0 ? await undatedEntries(scope, query, after, missing) : [];
  const found = [...dated, ...undated];
  const rows = found.slice(0, PAGE);
  const last = rows.at(-1);
  return {
    rows,
    totals: after ? null : await totalsOf(scope, query),
    next: found.length > PAGE && last ? writeCursor([last.datedOn, last.place]) : null,
  };
}

/** One entry as lists show it. */
export async function entryRow(scope: ShopScope, id: string): Promise<EntryRow> {
  await scope.get('entries', id);
  const [row] = await read(named(scope).where('entries.id', id));
  return row as EntryRow;
}

/** Entries with the words for their ids, in the order given by the caller. */
export function named(scope: ShopScope): Knex.QueryBuilder {
  return scope
    .table('entries')
    .leftJoin('rebuilds as r', (on) => on.on('r.shop_id', 'entries.shop_id').andOn('r.id', 'entries.rebuild_id'))
    .join('categories as c', (on) => on.on('c.shop_id', 'entries.shop_id').andOn('c.id', 'entries.category_id'))
    .select('entries.*', 'r.tag as rebuild_tag', 'c.name as category_name', scope.db.raw('entries.rowid AS place'));
}

export async function read(rows: Knex.QueryBuilder): Promise<Found[]> {
  const raw: object[] = await rows;
  return raw.map((row) => fromRow<Found>(row));
}

async function datedEntries(scope: ShopScope, query: LedgerQuery, after: [string | null, number] | null) {
  // A plus keeps SQLite from walking all days in search of one rebuild's few entries.
  const dated = query.rebuild ? '+entries.dated_on' : 'entries.dated_on';
  const rows = filtered(named(scope), query).whereRaw(`${dated} IS NOT NULL`);
  if (after) rows.whereRaw(`(${dated}, entries.rowid) < (?, ?)`, [after[0] ?? '', after[1]]);
  return read(rows.orderByRaw(`${dated} DESC, entries.rowid DESC`).limit(PAGE + 1));
}

async function undatedEntries(
  scope: ShopScope,
  query: LedgerQuery,
  after: [string | null, number] | null,
  most: number,
) {
  const rows = filtered(named(scope), query).whereNull('entries.dated_on');
  if (after?.[0] === null) rows.where('entries.rowid', '<', after[1]);
  return read(rows.orderByRaw('+entries.rowid DESC').limit(most));
}

async function totalsOf(scope: ShopScope, query: LedgerQuery): Promise<Page['totals']> {
  const sums: object | undefined = await filtered(scope.table('entries'), query)
    .whereNull('entries.voided_at')
    .first(
      scope.db.raw(`count(*) AS count, coalesce(sum(entries.cents), 0) AS cents,
        coalesce(sum(entries.free_value_cents), 0) AS free_value_cents`),
    );
  return fromRow<NonNullable<Page['totals']>>(sums ?? {});
}

function filtered(rows: Knex.QueryBuilder, query: LedgerQuery): Knex.QueryBuilder {
  const { rebuild, category, from, to, dated } = query;
  if (rebuild) rows.where('entries.rebuild_id', rebuild === 'none' ? null : rebuild);
  if (category) rows.where('entries.category_id', category);
  if (from) rows.where('entries.dated_on', '>=', from);
  if (to) rows.where('entries.dated_on', '<=', to);
  if (dated === 'yes') rows.whereNotNull('entries.dated_on');
  if (dated === 'no') rows.whereNull('entries.dated_on');
  if (query.import) rows.where('entries.import_id', query.import);
  if (query.void === 'only') rows.whereNotNull('entries.voided_at');
  else if (query.void !== 'show') rows.whereNull('entries.voided_at');
  if (query.kind) ofKind(rows, query.kind);
  if (query.find?.trim()) {
    const pattern = likePattern(query.find);
    rows.whereRaw(`(entries.vendor LIKE ? ESCAPE '\\' OR entries.what LIKE ? ESCAPE '\\')`, [pattern, pattern]);
  }
  return rows;
}

function ofKind(rows: Knex.QueryBuilder, kind: NonNullable<LedgerQuery['kind']>): void {
  if (kind === 'chosen extra') rows.where('entries.is_extra', 1);
  else rows.where({ 'entries.is_extra': 0, 'entries.foreseen': kind === 'not said' ? null : kind });
}
