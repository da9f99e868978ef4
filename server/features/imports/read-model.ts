import { z } from 'zod';
import type { Import, ImportSummary } from '#shared/contracts/imports.ts';
import type { ShopScope } from '../../books/scope.ts';
import { readCursor, writeCursor } from '../../platform/cursor.ts';
import { fromRow } from '../../platform/rows.ts';
import { progressOf } from './progress.ts';
import { importFiles } from './import-files.ts';
import { importStore, readingOf, settingsOf } from './store.ts';

const PAGE = 100;

const SUMMARY = [
  'imports.id',
  'imports.file_name',
  'imports.byte_size',
  'imports.state',
  'imports.shape',
  'imports.refusal',
  'users.name as created_by',
  'imports.created_at',
  'imports.committed_at',
  'imports.undone_at',
  'imports.version',
];

/** The files brought in, newest first; dropped ones are not shown. */
export async function listImports(
  scope: ShopScope,
  cursor: string | undefined,
): Promise<{ rows: ImportSummary[]; next: string | null }> {
  const after = readCursor(cursor, z.tuple([z.string(), z.string()]));
  const query = summaries(scope)
    .whereNot('imports.state', 'discarded')
    .orderBy([
      { column: 'imports.created_at', order: 'desc' },
      { column: 'imports.id', order: 'desc' },
    ]);
  if (after) query.whereRaw('(imports.created_at, imports.id) < (?, ?)', after);
  const rows: object[] = await query.limit(PAGE + 1);
  const page = rows.slice(0, PAGE).map((row) => fromRow<ImportSummary>(row));
  const last = page.at(-1);
  return { rows: page, next: rows.length > PAGE && last ? writeCursor([last.createdAt, last.id]) : null };
}

function summaries(scope: ShopScope) {
  return scope
    .table('imports')
    .join('users', 'users.id', 'imports.created_by')
    .select(SUMMARY)
    .select(scope.db.raw(`json_extract(imports.reading, '$.control.taken') AS rows_taken`))
    .select(scope.db.raw(`json_extract(imports.reading, '$.control.putAside') AS rows_put_aside`));
}

/** One import with how it was understood. Another shop's id and an unknown one answer the same 404. */
export async function showImport(scope: ShopScope, id: string): Promise<Import> {
  const store = importStore(scope);
  const record = await store.get(id);
  const files = await importFiles(scope).list(id);
  const row: object = await summaries(scope).where('imports.id', id).first();
  return {
    ...fromRow<ImportSummary>(row),
    progress: progressOf(id),
    reading: readingOf(record),
    files,
    settings: settingsOf(record),
  };
}
