import { shopScope } from '../../books/scope.ts';
import type { Services } from '../../platform/http.ts';
import { dropFile, importPath, sweepFiles } from './files.ts';
import { endProgress, tellProgress } from './progress.ts';
import { importFiles } from './import-files.ts';
import { runJob } from './run-job.ts';
import type { FileAt } from './work.ts';
import { controlOf, type ImportRecord, importStore, settingsOf } from './store.ts';

const NOT_BOOKED =
  'Booking it failed, and nothing of it stands in the books. Try again; if it fails once more, the server’s log says why.';

interface Asker {
  readonly services: Services;
  readonly shopId: string;
}

/** The files of an import, and where they lie. */
export async function filesAt({ services, shopId }: Asker, importId: string): Promise<FileAt[]> {
  const files = await importFiles(shopScope(services.database.reader, shopId)).list(importId);
  return files.map(({ name, number }) => ({ name, path: importPath(services.config.dataDir, importId, number) }));
}

const tracked = async (id: string, work: () => Promise<void>, { services }: Asker) => {
  tellProgress(id, 0);
  try {
    await work();
  } catch (error) {
    services.logger.error({ err: error, importId: id }, 'import failed');
  } finally {
    endProgress(id);
  }
};

/** Reads a file in a worker and keeps what was understood. Returns at once; the import tells how it is going. */
export function startReading(asker: Asker, record: ImportRecord): void {
  const { services, shopId } = asker;
  const { database, now } = services;
  const write = (work: (store: ReturnType<typeof importStore>) => Promise<unknown>) =>
    database.lock(() => work(importStore(shopScope(database.writer, shopId))));
  void tracked(
    record.id,
    async () => {
      const job = { databaseFile: database.file, shopId, importId: record.id, now: now() };
      try {
        const done = await runJob(
          { ...job, kind: 'read', files: await filesAt(asker, record.id), settings: settingsOf(record) },
          (share) => tellProgress(record.id, share),
        );
        if (done.kind === 'read') await write((store) => store.keepReading(record.id, done.reading));
      } catch (error) {
        services.logger.error({ err: error, importId: record.id }, 'reading an import failed');
        await write((store) =>
          store.refuse(record.id, 'This file could not be read. It may be too large, or damaged.'),
        );
      }
    },
    asker,
  );
}

/** Books an import in a worker while other writes wait their turn. Returns at once; on failure it is ready again. */
export function startCommit(
  asker: Asker & { readonly userId: string; readonly requestId: string },
  record: ImportRecord,
): void {
  const { services, shopId, userId, requestId } = asker;
  const { database, now } = services;
  void tracked(
    record.id,
    () =>
      database.lock(async () => {
        const common = { databaseFile: database.file, shopId, importId: record.id, now: now(), userId, requestId };
        const store = importStore(shopScope(database.writer, shopId));
        try {
          const done = await runJob(
            {
              ...common,
              kind: 'commit',
              files: await filesAt(asker, record.id),
              settings: settingsOf(record),
              control: controlOf(record),
              at: new Date().toISOString(),
            },
            (share) => tellProgress(record.id, share),
          );
          if (done.kind !== 'outdated') return;
          // The books changed under the reading: it is read anew, so that people see what would come in now.
          await store.move(record.id, 'committing', 'reading');
          startReading(asker, record);
        } catch (error) {
          await store.move(record.id, 'committing', 'ready', NOT_BOOKED);
          throw error;
        }
      }),
    asker,
  );
}

/** Puts imports straight that a stop of the server cut off: nothing of them was booked. */
export async function recoverImports({ config, database }: Services): Promise<void> {
  await database.lock(async () => {
    await database.writer('imports').where({ state: 'committing' }).update({ state: 'ready' });
    await database
      .writer('imports')
      .where({ state: 'reading' })
      .update({ state: 'refused', refusal: 'The server stopped while it read this file. Bring it in again.' });
  });
  const needed = await database
    .reader('import_files')
    .join('imports', (join) => join.on('imports.id', 'import_id').on('imports.shop_id', 'import_files.shop_id'))
    .whereNot('state', 'discarded')
    .select('import_id as importId', 'number');
  await sweepFiles(config.dataDir, needed);
}

/** Removes the files of an import that was dropped. */
export async function forgetFiles(asker: Asker, importId: string): Promise<void> {
  for (const { path } of await filesAt(asker, importId)) await dropFile(path);
}
