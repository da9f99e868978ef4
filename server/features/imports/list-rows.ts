import { z } from 'zod';
import type { ImportRow, importsApi } from '#shared/contracts/imports.ts';
import { type ShopScope, shopScope } from '../../books/scope.ts';
import { readCursor, writeCursor } from '../../platform/cursor.ts';
import type { Context } from '../../platform/http.ts';
import { filesAt } from './background.ts';
import { bookedLines } from './booked-lines.ts';
import type { RowsWanted } from './read/row-window.ts';
import { runJob } from './run-job.ts';
import { importStore, settingsOf } from './store.ts';

const PAGE = 100;

/** Rows of a file in its order: as they were booked, or, before that, as they would be. */
export async function listRows({ services, actor, params, query }: Context<typeof importsApi.rows>) {
  const scope = shopScope(services.database.reader, actor.shopId);
  const record = await importStore(scope).get(params.importId);
  const [sheet, row] = readCursor(query.cursor, z.tuple([z.int(), z.int()])) ?? [query.sheet ?? 1, query.row ?? 1];
  const wanted = { sheet, row, outcome: query.outcome ?? null, most: PAGE + 1 };
  if (record.state === 'discarded') return { rows: [], next: null };
  if (record.state === 'committed' || record.state === 'undone')
    return pageOf(await keptRows(scope, record.id, wanted));
  const asker = { services, shopId: actor.shopId };
  const done = await runJob({
    kind: 'rows',
    databaseFile: services.database.file,
    shopId: actor.shopId,
    importId: record.id,
    now: services.now(),
    files: await filesAt(asker, record.id),
    settings: settingsOf(record),
    wanted,
  });
  const rows = done.kind === 'rows' ? done.rows : [];
  return pageOf(rows.map((found) => ({ ...found, lines: found.lines.map((line) => ({ ...line, entryId: null })) })));
}

/** One row more than a page is asked for: where it is there, the next page starts with it. */
function pageOf(rows: readonly ImportRow[]): { rows: ImportRow[]; next: string | null } {
  const next = rows[PAGE];
  return { rows: rows.slice(0, PAGE), next: next ? writeCursor([next.sheet, next.row]) : null };
}

async function keptRows(scope: ShopScope, importId: string, wanted: RowsWanted): Promise<ImportRow[]> {
  const query = scope
    .table('import_rows')
    .where({ import_id: importId })
    .whereRaw('(sheet, row) >= (?, ?)', [wanted.sheet, wanted.row])
    .orderBy(['sheet', 'row'])
    .select('sheet', 'row', 'cells', 'outcome', 'reason');
  if (wanted.outcome) query.where({ outcome: wanted.outcome });
  const rows: (Omit<ImportRow, 'cells' | 'lines'> & { cells: string })[] = await query.limit(wanted.most);
  const [first, last] = [rows[0], rows.at(-1)];
  const lines = first && last ? await bookedLines(scope, importId, [first, last]) : [];
  return rows.map((row) => ({
    ...row,
    cells: JSON.parse(row.cells) as string[],
    lines: lines.filter((line) => line.sheet === row.sheet && line.row === row.row),
  }));
}
