import { looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { tradeMeaning } from '../words/categories.ts';
import { namesPart } from '../words/parts.ts';
import type { HeadRow } from './head.ts';
import { looksLikeVehicle } from './vehicle-text.ts';

const MOST = 0.7;
const FEWEST_ROWS = 3;
const SOME = 0.4;

/**
 * Headings for a list that has none, by what its columns hold: days, vehicles, amounts, kinds of cost, words. null = it
 * is no list of costs, or a column that such a list needs cannot be told.
 */
export function madeHeadings(rows: readonly HeadRow[], thisYear: number): string[] | null {
  const filled = rows.filter(({ cells }) => cells.filter((cell) => cell.trim() !== '').length >= 3);
  // A first row of nothing but words is headings, if in words that nobody knows.
  const isFigures = (cell: string) => looksLikeMoney(cell) || looksLikeDay(cell);
  if (filled.length < FEWEST_ROWS || !filled[0]?.cells.some(isFigures)) return null;
  const width = Math.max(...filled.map(({ cells }) => cells.length));
  const columns = Array.from({ length: width }, (_, at) =>
    filled.map(({ cells }) => (cells[at] ?? '').trim()).filter((cell) => cell !== ''),
  );
  const headings = columns.map(() => '');
  const name = (heading: string, test: (cell: string) => boolean, from: 'first' | 'last' = 'first') => {
    const fits = (cells: readonly string[], at: number) =>
      headings[at] === '' &&
      cells.length >= filled.length / 2 &&
      cells.filter((cell) => test(cell)).length >= cells.length * MOST;
    const found = from === 'first' ? columns.findIndex(fits) : columns.findLastIndex(fits);
    if (found >= 0) headings[found] = heading;
    return found >= 0;
  };
  const isVehicle = (cell: string) => looksLikeVehicle(cell, thisYear);
  const isWord = (cell: string) => !isFigures(cell);
  const isList = name('Date', looksLikeDay) && name('Vehicle', isVehicle) && name('Amount', looksLikeMoney, 'last');
  if (!isList) return null;
  // A second column of words may say what each row was for, or from whom; the first is a kind of cost only beside the former.
  const words = columns.filter((cells, at) => headings[at] === '' && cells.some(isWord));
  const saysWhat = (cells: readonly string[]) =>
    cells.filter((cell) => tradeMeaning(cell) !== null || namesPart(cell)).length >= cells.length * SOME;
  if (words.length > 2 || words.filter(saysWhat).length > 1) {
    name('Category', (cell) => tradeMeaning(cell)?.isExact ?? false);
  }
  name('What', isWord);
  name('Vendor', isWord);
  return headings;
}
