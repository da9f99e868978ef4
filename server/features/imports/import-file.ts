import { writeFile } from 'node:fs/promises';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import { shopScope } from '../../books/scope.ts';
import type { Config } from '../../platform/config.ts';
import type { Database } from '../../platform/database.ts';
import { newId, sha256 } from '../../platform/ids.ts';
import { importPath, makeImportFolder } from './files.ts';
import { importStore } from './store.ts';
import { type Done, type Job, work } from './work.ts';

export interface FileToImport {
  readonly database: Database;
  readonly config: Pick<Config, 'dataDir'>;
  readonly shopId: string;
  readonly userId: string;
  readonly requestId: string;
  readonly fileName: string;
  readonly bytes: Buffer;
  /** What people would say of the file: columns, and answers to its questions. */
  readonly settings?: ImportSettings;
  readonly now?: Date;
}

/**
 * Brings a file in from end to end, as the page does but in this thread: for the demo, tools and tests. Throws when
 * the file is refused or a question that must be asked has no answer. Gives the import's id and how it was understood.
 */
export async function importFile(file: FileToImport): Promise<{ importId: string; reading: Reading }> {
  const { database, config, shopId, userId, requestId, bytes, settings = {}, now = new Date() } = file;
  const importId = newId();
  await makeImportFolder(config.dataDir);
  const kept = importPath(config.dataDir, importId);
  await writeFile(kept, bytes);
  const files = [{ name: file.fileName, path: kept }];
  const common = { databaseFile: database.file, shopId, importId, now, userId, requestId, files, settings };
  return database.lock(async () => {
    const store = importStore(shopScope(database.writer, shopId));
    await store.create({
      id: importId,
      createdBy: userId,
      files: [{ number: 1, name: file.fileName, sha256: sha256(bytes), byteSize: bytes.length }],
      settings,
    });
    const read = doJob({ ...common, kind: 'read' });
    if (read.kind !== 'read') throw new Error('The file was not read');
    const { reading } = read;
    await store.keepReading(importId, reading);
    if (reading.refusal) throw new Error(`${file.fileName}: ${reading.refusal.message}`);
    const open = reading.choices.find((choice) => choice.mustAsk && choice.answer === null);
    if (open) throw new Error(`${file.fileName}: ${open.question}`);
    await store.move(importId, 'ready', 'committing');
    const done = doJob({ ...common, kind: 'commit', control: reading.control, at: now.toISOString() });
    if (done.kind !== 'committed') throw new Error(`${file.fileName}: the books changed while it was read`);
    return { importId, reading };
  });
}

const doJob = (job: Job): Done => work(job, () => undefined);
