import type { ImportedBooks } from '../../books/imported.ts';
import type { RawDatabase } from '../../platform/database.ts';
import type { Draft } from './read/draft.ts';
import type { DraftLine } from './read/plan.ts';
import { wordIds } from './shop-books.ts';

interface Planned {
  readonly lines: Map<string, number>;
  seconds: number | null;
}

/** Writes lines one by one, and keeps what belongs to their rebuilds until all rows are through. */
export function lineWriter(raw: RawDatabase, books: ImportedBooks, shopId: string) {
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
    } else if (draft && rebuildId !== null) {
      const categoryId = line.category === null ? null : categoryOf(line);
      books.fact({ ...line, sheet, rebuildId, categoryId });
      addToPlan(line, draft);
    }
  }

  /** A locked plan is made of all its lines at once, when all rows are through. */
  function addToPlan(line: DraftLine, draft: Draft): void {
    if (line.kind === 'estimate') {
      const { lines } = planOf(draft);
      lines.set(categoryOf(line), (lines.get(categoryOf(line)) ?? 0) + line.cents);
    } else if (line.kind === 'estimated hours') planOf(draft).seconds = line.seconds;
    else if (line.kind === 'expected sale') planOf(draft);
  }

  return { write, idOf, plans, touched, workerIds, drafts: () => ids.keys(), hasOverhead: () => isOverhead };
}

export type LineWriter = ReturnType<typeof lineWriter>;
