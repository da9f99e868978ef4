import type { Knex } from 'knex';
import { z } from 'zod';
import type { HoursQuery, HoursRow, hoursApi } from '#shared/contracts/hours.ts';
import { NAME_SQL } from '../../books/rebuild-words.ts';
import type { ShopScope } from '../../books/scope.ts';
import { likePattern, readCursor, writeCursor } from '../../platform/cursor.ts';
import { fromRow } from '../../platform/rows.ts';

type Page = z.output<typeof hoursApi.list.response>;
export type FoundHours = HoursRow & {
  readonly place: number;
  readonly createdBy: string | null;
  readonly createdAt: string;
};

const PAGE = 100;
const cursorParts = z.tuple([z.string().nullable(), z.number()]);

/** A page of hours, newest day first, undated ones last; within a day the latest made first. */
export async function listHours(scope: ShopScope, query: HoursQuery): Promise<Page> {
  const after = readCursor(query.cursor, cursorParts);
  const rows = filtered(namedHours(scope), query);
  if (after?.[0] === null) rows.whereNull('hours.worked_on').where('hours.rowid', '<', after[1]);
  else if (after) {
    rows.whereRaw('((hours.worked_on, hours.rowid) < (?, ?) OR hours.worked_on IS NULL)', [after[0], after[1]]);
  }
  const found = await readHours(rows.limit(PAGE + 1));
  const page = found.slice(0, PAGE);
  const last = page.at(-1);
  return {
    rows: page,
    totals: after ? null : await totalsOf(scope, query),
    next: found.length > PAGE && last ? writeCursor([last.workedOn, last.place]) : null,
  };
}

/** One row of hours as lists show it. */
export async function hoursRow(scope: ShopScope, id: string): Promise<FoundHours> {
  await scope.get('hours', id);
  const [row] = await readHours(namedHours(scope).where('hours.id', id));
  return row as FoundHours;
}

/** Hours with the words for their ids, in the order of lists. */
export function namedHours(scope: ShopScope): Knex.QueryBuilder {
  return scope
    .table('hours')
    .join('rebuilds as r', (on) => on.on('r.shop_id', 'hours.shop_id').andOn('r.id', 'hours.rebuild_id'))
    .leftJoin('vehicle_classes as c', (on) => on.on('c.shop_id', 'r.shop_id').andOn('c.id', 'r.class_id'))
    .leftJoin('workers as w', (on) => on.on('w.shop_id', 'hours.shop_id').andOn('w.id', 'hours.worker_id'))
    .select('hours.*', 'r.tag as rebuild_tag', 'w.name as worker_name')
    .select(scope.db.raw(`${NAME_SQL} AS rebuild_name, hours.rowid AS place`))
    .orderByRaw('hours.worked_on DESC, hours.rowid DESC');
}

export async function readHours(rows: Knex.QueryBuilder): Promise<FoundHours[]> {
  const raw: object[] = await rows;
  return raw.map((row) => fromRow<FoundHours>(row));
}

async function totalsOf(scope: ShopScope, query: HoursQuery): Promise<Page['totals']> {
  const sums: object | undefined = await filtered(scope.table('hours'), query)
    .whereNull('hours.voided_at')
    .first(
      scope.db.raw(`count(*) AS count, coalesce(sum(CASE WHEN hours.is_paid THEN 0 ELSE hours.seconds END), 0) AS own_seconds,
        coalesce(sum(CASE WHEN hours.is_paid THEN hours.seconds ELSE 0 END), 0) AS paid_seconds`),
    );
  return fromRow<NonNullable<Page['totals']>>(sums ?? {});
}

function filtered(rows: Knex.QueryBuilder, query: HoursQuery): Knex.QueryBuilder {
  const { rebuild, worker, paid, from, to, dated } = query;
  if (rebuild) rows.where('hours.rebuild_id', rebuild);
  if (worker) rows.where('hours.worker_id', worker === 'none' ? null : worker);
  if (paid) rows.where('hours.is_paid', Number(paid === 'yes'));
  if (from) rows.where('hours.worked_on', '>=', from);
  if (to) rows.where('hours.worked_on', '<=', to);
  if (dated === 'yes') rows.whereNotNull('hours.worked_on');
  if (dated === 'no') rows.whereNull('hours.worked_on');
  if (query.import) rows.where('hours.import_id', query.import);
  if (query.void === 'only') rows.whereNotNull('hours.voided_at');
  else if (query.void !== 'show') rows.whereNull('hours.voided_at');
  if (query.find?.trim()) rows.whereRaw(`hours.task LIKE ? ESCAPE '\\'`, [likePattern(query.find)]);
  return rows;
}
