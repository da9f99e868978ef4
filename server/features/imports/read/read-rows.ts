import type { Control, RebuildFound, StatedTotal } from '#shared/contracts/import-reading.ts';
import type { NotData } from '#shared/contracts/import-words.ts';
import { asBefore } from '../earlier/as-before.ts';
import { PURCHASE } from '../words/categories.ts';
import { emptyControl } from './empty-control.ts';
import type { Draft } from './draft.ts';
import { overwrittenFinder } from './overwritten.ts';
import { sumGuard } from './sum-guard.ts';
import type { DraftLine, FilePlan, RowRead } from './plan.ts';
import { tableReader } from './table-reader.ts';
import type { CarriedFigures } from './vehicle-row.ts';

/** What hears of each row as it is read: the preview, or the commit. `raw` = its cells as they stood in the file. */
export interface Sink {
  row(raw: readonly string[], line: number, read: RowRead, sheet: number, cells: readonly string[]): void;
}

/** What reading all rows came to. */
export interface RowsRead {
  readonly drafts: readonly Draft[];
  readonly control: Control;
  readonly notData: Partial<Record<NotData, number>>;
  readonly statedTotals: readonly StatedTotal[];
}

/** Reads every row of a file by its plan. Rebuilds are complete only when all rows are through. */
export function readRows(plan: FilePlan, sink: Sink, onPart?: (share: number) => void): RowsRead {
  const drafts: Draft[] = [];
  const tally = newTally();
  const fits = sumGuard();
  const overwritten = overwrittenFinder();
  const stated: StatedTotal[] = [];
  const carried: CarriedFigures = new Map();
  plan.tables.forEach((table, done) => {
    const { number } = table.sheet;
    const { read, stated: totals } = tableReader(table, carried);
    table.sheet.forEachRow(
      (cells, line, isMalformed) => {
        const all = read(cells, line, isMalformed);
        const result = table.shape === 'vehicles' ? all : asBefore(table.earlier.get(line), all);
        const at = { sheet: number, row: line };
        if (result.draft) place(result.draft, at, drafts);
        for (const made of result.lines) {
          book(made, at, drafts, tally.control);
          fits(made, tally.control, number);
          overwritten.add(made);
        }
        tally.count(result);
        const raw = table.sheet.rawRow?.(line) ?? cells;
        sink.row(table.sheet.asGiven?.(line, raw) ?? raw, line, result, number, cells);
      },
      onPart && ((share) => onPart((done + share) / plan.tables.length)),
    );
    stated.push(...totals);
  });
  // A sale's day stands in the books beside its price only.
  for (const { found, soldOn } of drafts)
    if (soldOn !== null && found.saleCents !== null) found.dates.soldOn ??= soldOn;
  overwritten.mark();
  tally.control.rebuilds = drafts.length;
  return { drafts, control: tally.control, notData: tally.notData, statedTotals: stated };
}

function newTally() {
  const control = emptyControl();
  const notData: Partial<Record<NotData, number>> = {};
  return {
    control,
    notData,
    count(read: RowRead): void {
      if (read.outcome === 'not data') notData[read.reason as NotData] = (notData[read.reason as NotData] ?? 0) + 1;
      if (read.reason === 'blank') {
        control.blankRows++;
        return;
      }
      control.rowsRead++;
      if (read.outcome === 'taken') control.taken++;
      else if (read.outcome === 'put aside') control.putAside++;
      else control.notData++;
      control.putAsideCents += read.cents ?? 0;
    },
  };
}

interface Place {
  readonly sheet: number;
  readonly row: number;
}

/** Puts a rebuild among those that rows came in for, at its first row. */
function place(draft: Draft, at: Place, drafts: Draft[]): void {
  if (draft.place >= 0) return;
  draft.place = drafts.push(draft) - 1;
  if (draft.found.row === 0) Object.assign(draft.found, at);
}

/** Adds a line to its rebuild and to the control totals. */
function book(line: DraftLine, at: Place, drafts: Draft[], control: Control): void {
  const { draft, cents } = line;
  if (draft) place(draft, at, drafts);
  if (line.kind === 'entry' || line.kind === 'purchase') {
    const key = line.kind === 'purchase' ? PURCHASE : (line.category ?? '');
    control.centsByCategory[key] = (control.centsByCategory[key] ?? 0) + cents;
    control.costCents += cents;
    if (cents < 0) control.creditCents += cents;
    if (line.kind === 'entry') control.entries++;
  } else if (line.kind === 'sale') control.saleCents += cents;
  else if (line.kind === 'estimate') control.estimateCents += cents;
  else if (line.kind === 'hours') control.hoursSeconds += line.seconds;
  if (draft && line.kind !== 'entry' && line.kind !== 'estimate') addFact(draft.found, line);
}

/** Purchase, sale and prices are facts of the rebuild, summed when several rows make them up. */
function addFact(found: RebuildFound, line: DraftLine): void {
  const sum = (before: number | null) => (before ?? 0) + line.cents;
  if (line.kind === 'purchase') {
    found.purchaseCents = sum(found.purchaseCents);
    found.boughtFrom ??= line.vendor === null || line.vendor.length > 120 ? null : line.vendor;
    if (line.on !== null && (found.dates.boughtOn === undefined || line.on < found.dates.boughtOn))
      found.dates.boughtOn = line.on;
  } else if (line.kind === 'sale') {
    found.saleCents = sum(found.saleCents);
    if (line.on !== null && (found.dates.soldOn === undefined || line.on > found.dates.soldOn))
      found.dates.soldOn = line.on;
  } else if (line.kind === 'asking') found.askingCents = line.cents;
  else if (line.kind === 'expected sale') found.expectedSaleCents = line.cents;
}
