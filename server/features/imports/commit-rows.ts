import type { Control } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import { type ImportedBooks, importedBooks, type Importing } from '../../books/imported.ts';
import { replacedBooks } from '../../books/replaced.ts';
import { refreshOverhead, refreshRollup } from '../../books/rollup.ts';
import type { BroughtBooks } from '../../books/unimport.ts';
import type { RawDatabase } from '../../platform/database.ts';
import { headingPrint } from './earlier/match-rows.ts';
import { printsToBytes } from './earlier/past.ts';
import { lineWriter, type LineWriter } from './line-writer.ts';
import type { FilePlan, Plan } from './read/plan.ts';
import { readRows } from './read/read-rows.ts';
import type { GivenFile } from './sheets/open-files.ts';
import { shopBooks } from './shop-books.ts';
import { understand } from './understand/understand.ts';
import { writeRebuilds } from './write-rebuilds.ts';

/** The books changed since the file was read, so that it would now come in differently. */
export class ReadingOutdated extends Error {}

export interface CommitTask extends Importing {
  readonly settings: ImportSettings;
  /** What the reading that people saw came to; the commit must come to the same. */
  readonly control: Control;
  readonly now: Date;
}

/** What undoing an import, and reading a longer file, need to know beside the rows that carry its id. */
export interface Brought extends BroughtBooks {
  /** How the files spelled vehicles → the rebuilds that they are. */
  readonly vehicles: Readonly<Record<string, string>>;
  /** In the order of the reading's list. */
  readonly rebuildIds: readonly string[];
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
): { brought: Brought; settings: ImportSettings } {
  const { plan, settings } = understand(files, shopBooks(raw, task.shopId, task.now), task.settings);
  if (!plan) throw new ReadingOutdated();
  raw.pragma('defer_foreign_keys = ON');
  const books = importedBooks(raw, task);
  const replaced = replacedBooks(raw, task);
  const writer = lineWriter(raw, books, task.shopId);
  const known = new Map(plan.tables.map((table) => [table.sheet.number, printKeeper(table)]));
  const nameOf = (sheet: number) =>
    files[(plan.tables.find((table) => table.sheet.number === sheet)?.sheet.file ?? 1) - 1]?.name;
  const read = readRows(
    plan,
    {
      row(cells, row, result, sheet) {
        books.row({ sheet, row }, cells, result.outcome, result.reason);
        for (const made of result.lines) writer.write(made, sheet);
        for (const cell of result.replaces ?? [])
          replaced.replace(cell, `Row ${row} of “${nameOf(sheet)}” counts instead.`);
        if (result.outcome === 'taken') known.get(sheet)?.add(row);
      },
    },
    onPart,
  );
  if (!isSame(read.control, task.control)) throw new ReadingOutdated();
  for (const table of plan.tables) keepSheet(books, table, known.get(table.sheet.number)?.prints ?? []);
  books.flush();
  const { filled, facts } = writeRebuilds(raw, read.drafts, writer, task);
  const touched = new Set([...writer.touched, ...replaced.touched]);
  if (touched.size > 0) refreshRollup(raw, task.shopId, [...touched]);
  if (writer.hasOverhead() || replaced.hasOverhead()) refreshOverhead(raw, task.shopId);
  const brought = {
    filled,
    workerIds: writer.workerIds,
    replaced: { ...replaced.done, facts },
    vehicles: spellings(plan, writer),
    rebuildIds: read.drafts.map((draft) => writer.idOf(draft)),
  };
  return { brought, settings };
}

/** The hashes of the rows of a sheet that came in; rows come in the order in which they were surveyed. */
function printKeeper({ rows }: Plan) {
  const { lines, hashes } = rows.prints;
  const prints: [row: number, hash: number][] = [];
  let at = 0;
  return {
    prints,
    add(row: number): void {
      while (at < lines.length && (lines[at] as number) < row) at++;
      if (lines[at] === row) prints.push([row, hashes[at] as number]);
    },
  };
}

function keepSheet(books: ImportedBooks, { sheet, shape, heading }: Plan, prints: readonly [number, number][]): void {
  if (shape === null) return;
  const print = headingPrint(heading);
  books.sheet({
    sheet: sheet.number,
    name: sheet.name,
    shape,
    headings: print === null ? null : heading.cells,
    headingPrint: print,
    prints: printsToBytes(prints),
  });
}

function spellings({ tables }: FilePlan, writer: LineWriter): Record<string, string> {
  const spelled = new Map<string, string>();
  for (const [spelling, target] of tables[0]?.vehicles ?? [])
    if (typeof target === 'object' && target.place >= 0) spelled.set(spelling, writer.idOf(target));
  for (const draft of writer.drafts()) {
    for (const spelling of draft.found.spellings) spelled.set(spelling, writer.idOf(draft));
  }
  return Object.fromEntries(spelled);
}

function isSame(a: Control, b: Control): boolean {
  const sorted = (control: Control) =>
    JSON.stringify({
      ...control,
      centsByCategory: Object.entries(control.centsByCategory).sort(([x], [y]) => x.localeCompare(y)),
    });
  return sorted(a) === sorted(b);
}
