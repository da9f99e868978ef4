import type { ShopScope } from '../../books/scope.ts';
import { fromRow } from '../../platform/rows.ts';
import type { ImportRecord, NewFile } from './store.ts';

/** What is known of the files of imports, by their content. */
export function importFiles(scope: ShopScope) {
  const importsWith = (sha256: string) => scope.table('import_files').where({ sha256 }).select('import_id');
  return {
    /** An import of the same file whose rows stand in the books; null = none. */
    async findCommitted(sha256: string): Promise<ImportRecord | null> {
      const row: object | undefined = await scope
        .table('imports')
        .whereIn('id', importsWith(sha256))
        .where({ state: 'committed' })
        .first();
      return row ? fromRow<ImportRecord>(row) : null;
    },
    /** The files of an import, in their order. */
    async list(id: string): Promise<NewFile[]> {
      const rows: object[] = await scope
        .table('import_files')
        .where({ import_id: id })
        .orderBy('number')
        .select('number', 'name', 'sha256', 'byte_size');
      return rows.map((row) => fromRow<NewFile>(row));
    },
    /** Did the same file go into the books, or is it about to, after this one was brought in? */
    async cameInMeanwhile({ id, createdAt }: ImportRecord): Promise<boolean> {
      const own = scope.table('import_files').where({ import_id: id }).select('sha256');
      const other: object | undefined = await scope
        .table('imports')
        .whereIn('id', scope.table('import_files').whereIn('sha256', own).select('import_id'))
        .whereNot({ id })
        .whereRaw(`(state = 'committing' OR (state = 'committed' AND committed_at > ?))`, [createdAt])
        .first('id');
      return other !== undefined;
    },
  };
}
