import BetterSqlite3 from 'better-sqlite3';
import { chainedAfterLast } from './trail-record.ts';
import type { FirstRow, Reading } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import { removeImported, undoObstacle } from '../../books/unimport.ts';
import { preparePragmas, type RawDatabase } from '../../platform/database.ts';
import { type Brought, type CommitTask, commitRows, ReadingOutdated } from './commit-rows.ts';
import { readFile } from './read/read-file.ts';
import { type RowsWanted, rowWindow } from './read/row-window.ts';
import { shopBooks } from './shop-books.ts';
import { bytesOfFile } from './text/bytes.ts';

/** What the worker is asked to do with one import. Everything in it can be sent to another thread. */
interface Task {
  readonly databaseFile: string;
  readonly shopId: string;
  readonly importId: string;
  readonly now: Date;
}
/** A file of the import, by its place on disk. */
export interface FileAt {
  readonly name: string;
  readonly path: string;
}
export interface ReadTask extends Task {
  readonly kind: 'read';
  readonly files: readonly FileAt[];
  readonly settings: ImportSettings;
}
export interface RowsTask extends Task {
  readonly kind: 'rows';
  readonly files: readonly FileAt[];
  readonly settings: ImportSettings;
  readonly wanted: RowsWanted;
}
export interface CommitJob extends Task, Omit<CommitTask, 'now'> {
  readonly kind: 'commit';
  readonly files: readonly FileAt[];
  readonly requestId: string;
}
export interface UndoTask extends Task {
  readonly kind: 'undo';
  readonly userId: string;
  readonly requestId: string;
}
export type Job = ReadTask | RowsTask | CommitJob | UndoTask;

/** How a job ended. 'outdated': the books changed, so the file must be read again; `obstacle`: why undo is refused. */
export type Done =
  | { readonly kind: 'read'; readonly reading: Reading }
  | { readonly kind: 'rows'; readonly rows: readonly FirstRow[] }
  | { readonly kind: 'committed' }
  | { readonly kind: 'outdated' }
  | { readonly kind: 'undone'; readonly obstacle: string | null };

// The indexes on an import's rows grow at random places; with SQLite's usual 2 MB they are read again and again.
const CACHE_KB = 8 * 1024;

/** Does a job on a connection of its own. Whoever calls holds the write lock for a commit or an undo. */
export function work(job: Job, onPart: (share: number) => void): Done {
  const raw = new BetterSqlite3(job.databaseFile);
  try {
    preparePragmas(raw);
    raw.pragma(`cache_size = -${CACHE_KB}`);
    if (job.kind === 'read') {
      const books = shopBooks(raw, job.shopId, job.now);
      return { kind: 'read', reading: readFile(given(job.files), books, job.settings, onPart) };
    }
    if (job.kind === 'rows') {
      const books = shopBooks(raw, job.shopId, job.now);
      return { kind: 'rows', rows: rowWindow(given(job.files), books, job.settings, job.wanted) };
    }
    return job.kind === 'commit' ? commitJob(raw, job, onPart) : undoJob(raw, job);
  } finally {
    raw.close();
  }
}

const given = (files: readonly FileAt[]) => files.map(({ name, path }) => ({ name, source: bytesOfFile(path) }));

function commitJob(raw: RawDatabase, job: CommitJob, onPart: (share: number) => void): Done {
  try {
    const commit = raw.transaction(() => {
      const { brought, settings } = commitRows(raw, given(job.files), job, onPart);
      const version = raiseBooksVersion(raw, job.shopId);
      const { changes } = raw
        .prepare(
          `UPDATE imports SET state = 'committed', committed_at = ?, committed_version = ?, reading = json_set(reading, '$.brought', json(?)),
             mapping = ?, version = version + 1
           WHERE shop_id = ? AND id = ? AND state = 'committing'`,
        )
        .run(job.at, version, JSON.stringify(brought), JSON.stringify(settings), job.shopId, job.importId);
      if (changes !== 1) throw new Error('The import is not waiting to be booked.');
      leave(raw, job, 'commit import', null, job.control);
    });
    commit.immediate();
    return { kind: 'committed' };
  } catch (error) {
    if (error instanceof ReadingOutdated) return { kind: 'outdated' };
    throw error;
  }
}

function undoJob(raw: RawDatabase, job: UndoTask): Done {
  const undo = raw.transaction((): Done => {
    const kept = raw
      .prepare(
        `SELECT json_extract(reading, '$.brought') FROM imports WHERE shop_id = ? AND id = ? AND state = 'committed'`,
      )
      .pluck()
      .get(job.shopId, job.importId) as string | undefined;
    // Someone else took it out while this one waited its turn.
    if (kept === undefined) return { kind: 'undone', obstacle: null };
    const brought = JSON.parse(kept) as Brought;
    const obstacle = undoObstacle(raw, job.shopId, job.importId, brought);
    if (obstacle !== null) return { kind: 'undone', obstacle };
    removeImported(raw, job.shopId, job.importId, brought);
    raiseBooksVersion(raw, job.shopId);
    raw
      .prepare(`UPDATE imports SET state = 'undone', undone_at = ?, version = version + 1 WHERE shop_id = ? AND id = ?`)
      .run(job.now.toISOString(), job.shopId, job.importId);
    leave(raw, job, 'undo import', { state: 'committed' }, { state: 'undone' });
    return { kind: 'undone', obstacle: null };
  });
  return undo.immediate();
}

function raiseBooksVersion(raw: RawDatabase, shopId: string): number {
  return raw
    .prepare('UPDATE shops SET books_version = books_version + 1 WHERE id = ? RETURNING books_version')
    .pluck()
    .get(shopId) as number;
}

function leave(raw: RawDatabase, job: CommitJob | UndoTask, action: string, before: unknown, after: unknown): void {
  const { shopId, userId, requestId, importId } = job;
  chainedAfterLast(raw, {
    shopId,
    actorId: userId,
    requestId,
    action,
    subject: 'import',
    subjectId: importId,
    before,
    after,
  });
}
