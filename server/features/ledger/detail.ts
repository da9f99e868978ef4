import { z } from 'zod';
import type { EntryRow, entryDetailSchema } from '#shared/contracts/ledger.ts';
import type { ShopScope } from '../../books/scope.ts';
import { entryRow, named, read } from './list.ts';

type Detail = z.input<typeof entryDetailSchema>;

/** One entry with the row of the file that it came from, and the other shares of its bill. */
export async function entryDetail(scope: ShopScope, id: string): Promise<Detail> {
  const entry = await entryRow(scope, id);
  return { ...entry, source: await sourceOf(scope, entry), shares: await sharesOf(scope, entry) };
}

async function sharesOf(scope: ShopScope, entry: EntryRow): Promise<Detail['shares']> {
  if (!entry.splitId) return [];
  return read(named(scope).where('entries.split_id', entry.splitId).orderByRaw('entries.rowid'));
}

async function sourceOf(scope: ShopScope, entry: EntryRow): Promise<Detail['source']> {
  const { importId, importSheet: sheet, importRow: row, importCol: col } = entry;
  if (!importId) return null;
  const file = await scope.get<{ fileName: string }>('imports', importId);
  return { importId, fileName: file.fileName, sheet, row, col, cells: await cellsOf(scope, entry) };
}

async function cellsOf(scope: ShopScope, { importId, importSheet, importRow }: EntryRow): Promise<string[] | null> {
  const kept: { cells: string } | undefined = await scope
    .table('import_rows')
    .where({ import_id: importId, sheet: importSheet ?? 0, row: importRow })
    .first('cells');
  if (!kept) return null;
  const cells = z.array(z.unknown()).safeParse(JSON.parse(kept.cells));
  return cells.success ? cells.data.map((cell) => (cell == null ? '' : String(cell))) : null;
}
