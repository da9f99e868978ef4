import type { Control } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import { type ImportedBooks, importedBooks, type Importing } from '../../books/imported.ts';
import { type ImportedRebuilds, importedRebuilds } from '../../books/imported-rebuilds.ts';
import { refreshOverhead, refreshRollup } from '../../books/rollup.ts';
import type { Filled } from '../../books/unimport.ts';
import type { RawDatabase } from '../../platform/database.ts';
import type { Draft } from './read/draft.ts';
import type { DraftLine } from './read/plan.ts';
import { readRows, type RowsRead } from './read/read-rows.ts';
import { rebuildColumns } from './rebuild-columns.ts';
import type { GivenFile } from './sheets/open-files.ts';
import { shopBooks, wordIds } from './shop-books.ts';
import { understand } from './understand/understand.ts';

/** The books changed since the file was read, so that it would now come in differently. */
export class ReadingOutdated extends Error {}

export interface CommitTask extends Importing {
  readonly settings: ImportSettings;
  /** What the reading that people saw came to; the commit must come to the same. */
  readonly control: Control;
  readonly now: Date;
}

/** What undoing an import needs to know beside the rows that carry its id. */
export interface Brought {
  readonly filled: Filled;
  readonly workerIds: readonly string[];
}

interface Planned {
  readonly lines: Map<string, number>;
  seconds: number | null;
}

/**
 * Books everything that a file was understood to hold: rebuilds, entries, hours, locked plans and the raw rows, with
 * the sums over them. Runs in the caller's transaction; throws ReadingOutdated when it does not come to what was seen.
 */
export function commitRows(
  raw: RawDatabase,
  files: readonly GivenFile[],
  task: CommitTask,
  onPart?: (share: number) => void,
): Brought {
  const { plan } = understand(files, shopBooks(raw, task.shopId, task.now), task.settings);
  if (!plan) throw new ReadingOutdated();
  raw.pragma('defer_foreign_keys = ON');
  const books = importedBooks(raw, task);
  const writer = lineWriter(raw, books, task.shopId);
  const read = readRows(
    plan,
    {
      row(cells, row, result, sheet) {
        books.row({ sheet, row }, cells, result.outcome, result.reason);
        for (const made of result.lines) writer.write(made, sheet);
      },
    },
    onPart,
  );
  if (!isSame(read.control, task.control)) throw new ReadingOutdated();
  books.flush();
  const filled = writeRebuilds(raw, importedRebuilds(raw, task), read, writer, task);
  if (writer.touched.size > 0) refreshRollup(raw, task.shopId, [...writer.touched]);
  if (writer.hasOverhead()) refreshOverhead(raw, task.shopId);
  return { filled, workerIds: writer.workerIds };
}

function isSame(a: Control, b: Control): boolean {
  const sorted = (control: Control) =>
    JSON.stringify({
      ...control,
      centsByCategory: Object.entries(control.centsByCategory).sort(([x], [y]) => x.localeCompare(y)),
    });
  return sorted(a) === sorted(b);
}

/** Writes lines one by one, and keeps what belongs to their rebuilds until all rows are through. */
function lineWriter(raw: RawDatabase, books: ImportedBooks, shopId: string) {
  const categories = wordIds(raw, shopId, 'categories');
  const workers = wordIds(raw, shopId, 'workers');
  const paid = new Set(
    raw.prepare('SELECT id FROM workers WHERE shop_id = ? AND is_paid = 1').pluck().all(shopId) as string[],
  );
  const ids = new Map<Draft, string>();
  const plans = new Map<Draft, Planned>();
  const touched = new Set<string>();
  const workerIds: string[] = [];
  let isOverhead = false;

  function idOf(draft: Draft): string {
    const known = ids.get(draft);
    if (known !== undefined) return known;
    const id = draft.existing?.id ?? books.nextId();
    ids.set(draft, id);
    touched.add(id);
    return id;
  }

  function workerOf(name: string | null): string | null {
    if (name === null) return null;
    const known = workers.get(name.toLowerCase());
    if (known !== undefined) return known;
    const id = books.worker(name);
    workers.set(name.toLowerCase(), id);
    workerIds.push(id);
    return id;
  }

  function planOf(draft: Draft): Planned {
    const plan = plans.get(draft) ?? { lines: new Map<string, number>(), seconds: null };
    plans.set(draft, plan);
    return plan;
  }

  const categoryOf = (line: DraftLine) => categories.get((line.category ?? '').toLowerCase()) as string;

  function write(line: DraftLine, sheet: number): void {
    const { draft, row, col } = line;
    const rebuildId = draft ? idOf(draft) : null;
    if (line.kind === 'entry') {
      isOverhead ||= rebuildId === null;
      books.entry({ ...line, sheet, rebuildId, categoryId: categoryOf(line), datedOn: line.on });
    } else if (line.kind === 'hours' && rebuildId !== null) {
      const workerId = workerOf(line.person);
      books.hours({
        rebuildId,
        workerId,
        isPaid: workerId !== null && paid.has(workerId),
        workedOn: line.on,
        seconds: line.seconds,
        task: line.what,
        isGuess: line.isGuess,
        sheet,
        row,
        col,
      });
    } else if (line.kind === 'estimate' && draft) {
      const { lines } = planOf(draft);
      lines.set(categoryOf(line), (lines.get(categoryOf(line)) ?? 0) + line.cents);
    } else if (line.kind === 'estimated hours' && draft) planOf(draft).seconds = line.seconds;
    else if (line.kind === 'expected sale' && draft) planOf(draft);
  }

  return { write, idOf, plans, touched, workerIds, hasOverhead: () => isOverhead };
}

function writeRebuilds(
  raw: RawDatabase,
  books: ImportedRebuilds,
  read: RowsRead,
  writer: ReturnType<typeof lineWriter>,
  task: CommitTask,
): Filled {
  const classes = wordIds(raw, task.shopId, 'vehicle_classes');
  const damages = wordIds(raw, task.shopId, 'damage_types');
  const filled: Record<string, Record<string, string | number>> = {};
  for (const draft of read.drafts) {
    const id = writer.idOf(draft);
    const columns = rebuildColumns(draft.found, classes, damages);
    if (draft.existing) {
      const done = books.fill(id, columns);
      if (Object.keys(done).length > 0) filled[id] = done;
    } else books.rebuild(id, draft.found, columns.set('tag', draft.found.tag));
    const planned = writer.plans.get(draft);
    if (planned) {
      books.baseline({
        rebuildId: id,
        madeOn: draft.found.dates.boughtOn ?? null,
        plannedSeconds: planned.seconds,
        expectedSaleCents: draft.found.expectedSaleCents,
        lines: planned.lines,
      });
    }
  }
  return filled;
}
