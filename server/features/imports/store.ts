import type { Control, Reading } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import type { ImportSettings, ImportState } from '#shared/contracts/imports.ts';
import { fromRow } from '../../platform/rows.ts';
import type { ShopScope } from '../../books/scope.ts';

/** An import as the warehouse keeps it. `mapping` and `reading` are JSON. */
export interface ImportRecord {
  readonly id: string;
  readonly fileName: string;
  readonly fileSha256: string;
  readonly byteSize: number;
  readonly state: ImportState;
  readonly shape: Shape | null;
  readonly mapping: string | null;
  readonly reading: string | null;
  readonly refusal: string | null;
  readonly createdBy: string;
  readonly createdAt: string;
  readonly committedAt: string | null;
  readonly undoneAt: string | null;
  readonly version: number;
}

export interface NewImport {
  readonly id: string;
  readonly fileName: string;
  readonly fileSha256: string;
  readonly byteSize: number;
  readonly createdBy: string;
}

/** The only writer of `imports`, beside the worker that commits and undoes. */
export function importStore(scope: ShopScope) {
  const only = (id: string, state: ImportState) => scope.table('imports').where({ id, state });
  return {
    get: (id: string) => scope.get<ImportRecord>('imports', id),
    /** An import of the same file whose rows stand in the books; null = none. */
    async findCommitted(sha256: string): Promise<ImportRecord | null> {
      const row: object | undefined = await scope
        .table('imports')
        .where({ file_sha256: sha256, state: 'committed' })
        .first();
      return row ? fromRow<ImportRecord>(row) : null;
    },
    /** Did the same file go into the books, or is it about to, after this one was brought in? */
    async cameInMeanwhile({ id, fileSha256, createdAt }: ImportRecord): Promise<boolean> {
      const other: object | undefined = await scope
        .table('imports')
        .where({ file_sha256: fileSha256 })
        .whereNot({ id })
        .whereRaw(`(state = 'committing' OR (state = 'committed' AND committed_at > ?))`, [createdAt])
        .first('id');
      return other !== undefined;
    },
    create: (fields: NewImport) =>
      scope.insert('imports', { ...fields, state: 'reading', createdAt: new Date().toISOString() }),
    /** Starts another reading with what a person said of the file. */
    readAgain: (id: string, version: number, settings: ImportSettings) =>
      scope.update<ImportRecord>('imports', id, version, {
        state: 'reading',
        mapping: JSON.stringify(settings),
        refusal: null,
      }),
    /** Keeps a reading, unless the import was dropped or changed meanwhile. */
    async keepReading(id: string, reading: Reading): Promise<void> {
      const { refusal, shape } = reading;
      await only(id, 'reading').update({
        state: refusal ? 'refused' : 'ready',
        shape,
        reading: JSON.stringify(reading),
        refusal: refusal?.message ?? null,
      });
    },
    async refuse(id: string, message: string): Promise<void> {
      await only(id, 'reading').update({ state: 'refused', refusal: message });
    },
    /** From one state to another, and why if it is a step back; false = it was not in that state. */
    async move(id: string, from: ImportState, to: ImportState, refusal: string | null = null): Promise<boolean> {
      return (await only(id, from).update({ state: to, refusal })) === 1;
    },
    async discard(id: string): Promise<void> {
      await scope
        .table('imports')
        .where({ id })
        .whereIn('state', ['ready', 'refused'])
        .update({ state: 'discarded', reading: null });
    },
  };
}

/** What people said of a file so far. */
export function settingsOf(record: ImportRecord): ImportSettings {
  return record.mapping ? (JSON.parse(record.mapping) as ImportSettings) : {};
}

/** The reading that people saw; null = none yet. */
export function readingOf(record: ImportRecord): Reading | null {
  return record.reading ? (JSON.parse(record.reading) as Reading) : null;
}

/** Control totals of a reading; throws where there is none. */
export function controlOf(record: ImportRecord): Control {
  const reading = readingOf(record);
  if (!reading) throw new Error(`Import ${record.id} was never read`);
  return reading.control;
}
