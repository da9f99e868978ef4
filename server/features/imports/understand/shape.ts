import type { Meaning } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import { looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { type CategoryMeaning, SALE } from '../words/categories.ts';
import { weekdayOf } from '../words/weekdays.ts';
import { actualPart, dealOf, headingMeanings, plannedPart } from '../words/headings.ts';
import { type ColumnFacts, holdsDays, holdsHours, holdsMoney, holdsText } from './column-facts.ts';
import type { Guess } from './guess.ts';
import { guessOfList, isVoucher } from './list-columns.ts';
import { sectionColumns } from '../read/section-columns.ts';
import { isFigure, namesVehicle, tabNamesVehicle, titleOf } from '../read/sheet-words.ts';
import type { Head, HeadRow } from './head.ts';

/** What one row stands for, or why the sheet cannot be read. */
export type ShapeGuess =
  | { readonly shape: Shape }
  | { readonly shape: null; readonly why: string; readonly row: number | null };

/** Guesses from the headings, and from how often the same vehicle comes back, what one row of the sheet stands for. */
export function guessShape(
  head: Head,
  all: readonly ColumnFacts[],
  categoryOf: (text: string) => CategoryMeaning | null,
  { sheetName, thisYear }: { readonly sheetName: string | null; readonly thisYear: number },
): ShapeGuess {
  const across = vehiclesAcross(head, thisYear);
  if (across) return { shape: null, row: across.line, why: ACROSS };
  if (isVehicleSheet(head, all, sheetName, thisYear)) return { shape: 'vehicle sheet' };
  if (!head.heading) {
    return {
      shape: null,
      row: null,
      why: 'No row reads like headings. Put a row of headings (date, car, what, amount) above the list and bring it in again.',
    };
  }
  const asList = guessOfList(all, 'expenses', thisYear);
  const column = (...meanings: Meaning[]) => all.find((_, i) => meanings.includes(asList[i]?.meaning ?? 'ignore'));
  const means = (meaning: Meaning, holds: (facts: ColumnFacts) => boolean) =>
    all.find((facts) => holds(facts) && headingMeanings(facts.heading).includes(meaning));
  const costs = all.filter((facts) => facts.filled > 0 && holdsMoney(facts) && isCost(facts, categoryOf));
  const isDated = means('date', isPlainDate) !== undefined;
  const name =
    means('stock number', (facts) => holdsNames(facts) && !(isDated && isVoucher(facts))) ??
    means('vehicle', holdsNames) ??
    means('model', () => true) ??
    column('vehicle', 'stock number', 'model');
  const amount = means('amount', holdsMoney);
  const weekdays = all.filter((facts) => weekdayOf(facts.heading) !== null);
  if (name && weekdays.length >= FEWEST_WEEKDAYS && weekdays.some(holdsHours)) return { shape: 'hours' };
  if (name && costs.length >= 2 && (name.distinct >= 0.8 || costs.length >= 4 || !amount)) return { shape: 'vehicles' };
  const isOverview = name && name.distinct >= 0.8 && isSaleOf(all) && !means('category', holdsText);
  if (isOverview && (!amount || !means('what', holdsText)) && !means('date', isPlainDate)) return { shape: 'vehicles' };
  const hours = means('hours', holdsHours);
  const isLog = hours && column('date') && (!amount || isOnlyPay(hours, all, asList));
  if (name && isLog) return { shape: 'hours' };
  if (name && column('amount', 'credit', 'estimate')) return { shape: 'expenses' };
  return {
    shape: null,
    row: head.heading.line,
    why: name
      ? 'No column of amounts was found under the headings.'
      : 'No column names the vehicle. Lists of costs need a column that says which car each row belongs to.',
  };
}

const DEALS = new Set<Meaning>(['boughtOn', 'soldOn']);

/** A column of days that is not just the day of a deal: `Date`, not `Date bought`. */
const isPlainDate = (facts: ColumnFacts) =>
  holdsDays(facts) && !headingMeanings(facts.heading).some((meaning) => DEALS.has(meaning));

const isSaleOf = (all: readonly ColumnFacts[]) =>
  all.some(
    (facts) =>
      facts.filled > 0 &&
      ((holdsMoney(facts) && headingMeanings(facts.heading).includes('sale')) ||
        ((holdsMoney(facts) || holdsDays(facts)) && dealOf(facts.heading) === 'selling')),
  );

/** Do hours stand on every row, and is nothing said of a vendor or a kind of cost? Then amounts are hours at a rate. */
function isOnlyPay(hours: ColumnFacts, all: readonly ColumnFacts[], asList: readonly Guess[]): boolean {
  const most = Math.max(...all.map(({ filled }) => filled));
  return hours.filled >= most * 0.9 && !asList.some(({ meaning }) => meaning === 'vendor' || meaning === 'category');
}

/** Text, or whole numbers, as people number their vehicles. */
const holdsNames = (facts: ColumnFacts) =>
  holdsText(facts) || facts.samples.every((cell) => /^\d{1,5}$/.test(cell) || !looksLikeMoney(cell));

/** A sheet that names its vehicle in a title or by its own name, and in no column. */
function isVehicleSheet(head: Head, all: readonly ColumnFacts[], sheetName: string | null, thisYear: number): boolean {
  const names: readonly Meaning[] = ['vehicle', 'stock number', 'model', 'year'];
  if (
    all.some((facts) => facts.filled > 1 && headingMeanings(facts.heading).some((meaning) => names.includes(meaning)))
  )
    return false;
  const rows = [...head.above, ...(head.heading ? [head.heading] : []), ...head.below];
  const hasTitle = rows.slice(0, TITLE_WITHIN).some((row) => titleOf(row.cells, thisYear) !== null);
  const isNamed = sheetName !== null && tabNamesVehicle(sheetName, thisYear);
  const hasCosts = rows.some((row) => sectionColumns(row.cells, false) !== null) || rows.some(isCostRow);
  return (hasTitle || isNamed) && hasCosts;
}

/** A row of words and an amount: `towing, 3/16/2019, Blue Heron, 185.00`. */
const isCostRow = ({ cells }: HeadRow) => cells.some(isFigure) && cells.some((cell) => /\p{L}{3}/u.test(cell));

const ACROSS =
  'The vehicles stand side by side, one per column. Copy the table, paste it turned (rows as columns), and bring it in again.';

/** A row of nothing but vehicles, as over a table that has one per column; null = there is none. */
function vehiclesAcross(head: Head, thisYear: number): HeadRow | null {
  const rows = [...head.above, ...(head.heading ? [head.heading] : []), ...head.below].slice(0, TITLE_WITHIN);
  const isAcross = ({ cells }: HeadRow) => {
    const filled = cells.filter((cell) => cell.trim() !== '');
    const named = new Set(filled.filter((cell) => !looksLikeDay(cell) && namesVehicle(cell, thisYear)));
    return named.size >= 2 && named.size >= filled.length - 1;
  };
  return rows.find(isAcross) ?? null;
}

const TITLE_WITHIN = 12;
const FEWEST_WEEKDAYS = 4;

function isCost(facts: ColumnFacts, categoryOf: (text: string) => CategoryMeaning | null): boolean {
  const planned = plannedPart(facts.heading);
  const category = categoryOf(planned ?? (actualPart(facts.heading) || facts.heading));
  return category !== null && category.category !== SALE;
}
