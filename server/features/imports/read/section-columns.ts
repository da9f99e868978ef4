import type { Meaning } from '#shared/contracts/import-reading.ts';
import { looksLikeDay } from '../cells/days.ts';
import { isFaulty } from '../cells/faulty-cells.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { headingMeanings, plannedPart } from '../words/headings.ts';
import { filled } from './row-kinds.ts';

/** Where the columns of a section stand, from 0. */
export type SectionColumns = ReadonlyMap<Meaning, number>;

const WANTED: readonly Meaning[] = [
  'date',
  'estimate',
  'hours',
  'amount',
  'credit',
  'category',
  'person',
  'what',
  'vendor',
  'foreseen',
  'task',
];
const OF_WORK: readonly Meaning[] = ['date', 'hours', 'person', 'task', 'what', 'amount'];

/** The columns that a row of headings inside a sheet names; null = the row is no such row. */
export function sectionColumns(cells: readonly string[], isOwnWork: boolean): SectionColumns | null {
  if (filled(cells) < 2) return null;
  const columns = new Map<Meaning, number>();
  const wanted = isOwnWork ? OF_WORK : WANTED;
  let known = 0;
  for (const [at, cell] of cells.entries()) {
    if (cell.trim() === '') continue;
    if (looksLikeMoney(cell) || looksLikeDay(cell)) return null;
    const meanings = plannedPart(cell) === '' ? (['estimate'] as const) : headingMeanings(cell);
    if (meanings.length > 0) known++;
    const meaning = wanted.find((one) => (meanings as readonly Meaning[]).includes(one) && !columns.has(one));
    if (meaning) columns.set(meaning, at);
  }
  const isTable = columns.has('amount') || columns.has('hours') || columns.has('credit') || columns.has('estimate');
  return known >= 2 && known >= filled(cells) / 2 && isTable ? columns : null;
}

/** The columns of a section with what a person said of them going before what its headings say. */
export function asSaid(
  columns: SectionColumns,
  said: readonly { readonly col: number; readonly meaning: Meaning }[],
): SectionColumns {
  if (said.length === 0) return columns;
  const named = new Map(said.map(({ col, meaning }) => [col - 1, meaning]));
  const kept = [...columns].filter(([meaning, at]) => !named.has(at) && ![...named.values()].includes(meaning));
  const own = [...named].flatMap(([at, meaning]): [Meaning, number][] =>
    WANTED.includes(meaning) ? [[meaning, at]] : [],
  );
  return new Map([...kept, ...own]);
}

/**
 * Where a row without headings above it holds its parts: the first day, the last amount, the texts in order. A label
 * right before the amount (`Buyer fee:`) says what it was.
 */
export function looseColumns(cells: readonly string[]): SectionColumns {
  const columns = new Map<Meaning, number>();
  let label = -1;
  for (const [at, cell] of cells.entries()) {
    if (cell.trim() === '') continue;
    if (looksLikeMoney(cell) && !looksLikeDay(cell) && label > 0) {
      columns.set('what', label);
      if (columns.get('vendor') === label) columns.delete('vendor');
    }
    label = /:\s*$/.test(cell) ? at : -1;
    if (looksLikeDay(cell)) {
      if (!columns.has('date')) columns.set('date', at);
    } else if (looksLikeMoney(cell) || (isFaulty(cell) && !columns.has('amount'))) columns.set('amount', at);
    else if (!columns.has('what')) columns.set('what', at);
    else if (!columns.has('vendor')) columns.set('vendor', at);
  }
  return columns;
}
