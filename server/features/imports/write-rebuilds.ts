import { type ImportedRebuilds, importedRebuilds } from '../../books/imported-rebuilds.ts';
import type { Importing } from '../../books/imported.ts';
import { factCents } from '../../books/replaced.ts';
import type { BroughtBooks, Filled } from '../../books/unimport.ts';
import type { RawDatabase } from '../../platform/database.ts';
import type { LineWriter } from './line-writer.ts';
import type { Draft } from './read/draft.ts';
import { overwrittenColumns, rebuildColumns } from './rebuild-columns.ts';
import { wordIds } from './shop-books.ts';

type Facts = NonNullable<BroughtBooks['replaced']>['facts'];

/** Makes the rebuilds that rows came in for, or fills those that the shop has, with their locked plans. */
export function writeRebuilds(
  raw: RawDatabase,
  drafts: readonly Draft[],
  writer: LineWriter,
  importing: Importing,
): { filled: Filled; facts: Facts } {
  const books = importedRebuilds(raw, importing);
  const classes = wordIds(raw, importing.shopId, 'vehicle_classes');
  const damages = wordIds(raw, importing.shopId, 'damage_types');
  const filled: Record<string, Filled[string]> = {};
  const facts: Record<string, Facts[string]> = {};
  for (const draft of drafts) {
    const id = writer.idOf(draft);
    const columns = rebuildColumns(draft.found, classes, damages);
    if (draft.existing) {
      const over = overwrittenColumns(draft, classes, damages);
      addBooked(raw, columns, over, { id, importing });
      const done = books.fill(id, columns, over);
      if (Object.keys(done.filled).length > 0) filled[id] = { ...filled[id], ...done.filled };
      if (Object.keys(done.replaced).length > 0) facts[id] = { ...done.replaced, ...facts[id] };
    } else books.rebuild(id, draft.found, columns.set('tag', draft.found.tag));
    writePlan(books, draft, id, writer);
  }
  return { filled, facts };
}

const FACTS = [
  ['purchase_cents', 'purchase'],
  ['sale_cents', 'sale'],
] as const;

/** A purchase or sale written over is the new figure, and what else of it the books hold from files. */
function addBooked(
  raw: RawDatabase,
  columns: Map<string, string | number>,
  over: ReadonlySet<string>,
  { id, importing }: { id: string; importing: Importing },
): void {
  for (const [column, kind] of FACTS) {
    const fresh = columns.get(column);
    if (over.has(column) && typeof fresh === 'number') columns.set(column, fresh + factCents(raw, importing, id, kind));
  }
}

function writePlan(books: ImportedRebuilds, draft: Draft, rebuildId: string, { plans }: LineWriter): void {
  const planned = plans.get(draft);
  // A plan that was locked before stays as it was.
  if (!planned || draft.existing?.hasBaseline) return;
  books.baseline({
    rebuildId,
    madeOn: draft.found.dates.boughtOn ?? null,
    plannedSeconds: planned.seconds,
    expectedSaleCents: draft.found.expectedSaleCents,
    lines: planned.lines,
  });
}
