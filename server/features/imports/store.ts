import type { Control, Reading } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import type { ImportSettings, ImportState } from '#shared/contracts/imports.ts';
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

export interface NewFile {
  /** 1 = the first. */
  readonly number: number;
  readonly name: string;
  readonly sha256: string;
  readonly byteSize: number;
}

export interface NewImport {
  readonly id: string;
  readonly createdBy: string;
  readonly files: readonly NewFile[];
  readonly settings?: ImportSettings;
}

/** The only writer of `imports`, beside the worker that commits and undoes. */
export function importStore(scope: ShopScope) {
  const only = (id: string, state: ImportState) => scope.table('imports').where({ id, state });
  return {
    get: (id: string) => scope.get<ImportRecord>('imports', id),
    async create({ id, createdBy, files, settings = {} }: NewImport): Promise<void> {
      const [first] = files;
      if (!first) throw new Error('An import has at least one file');
      await scope.insert('imports', {
        id,
        createdBy,
        state: 'reading',
        fileName: files.length === 1 ? first.name : `${first.name} and ${files.length - 1} more`,
        fileSha256: first.sha256,
        byteSize: files.reduce((sum, file) => sum + file.byteSize, 0),
        mapping: JSON.stringify(settings),
        createdAt: new Date().toISOString(),
      });
      await scope.insert(
        'import_files',
        files.map((file) => ({ ...file, importId: id })),
      );
    },
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
      // Read again, it is another reading: who saw the one before must look at it.
      const version = scope.db.raw(to === 'reading' ? 'version + 1' : 'version');
      return (await only(id, from).update({ state: to, refusal, version })) === 1;
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
