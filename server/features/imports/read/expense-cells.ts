import type { AsideReason } from '#shared/contracts/import-words.ts';
import type { Day } from '#shared/day.ts';
import { remembered } from '../cells/fold.ts';
import { readHours } from '../cells/hours.ts';
import type { VehicleTarget } from '../understand/vehicle-drafts.ts';
import { placeOf, vehicleText } from '../understand/vehicle-columns.ts';
import { type CategoryMeaning, paidWorkCategory, PURCHASE, SALE } from '../words/categories.ts';
import { categoryGuesser } from '../words/infer-category.ts';
import { daysInOrder } from './days-in-order.ts';
import { keptText } from './faulty-texts.ts';
import type { Plan } from './plan.ts';
import { hoursInside, saysWork } from '../words/own-work.ts';
import { ownPayIn } from '../understand/survey.ts';
import { hoursAt } from '../understand/own-labor.ts';

/** Money of a cell: cents, nothing, or why it cannot be taken. */
export type CellMoney = number | 'blank' | AsideReason;

/** An expense as its cells say it, before anything is decided. */
export interface ExpenseCells {
  readonly name: string;
  readonly dateCell: string;
  readonly on: Day | 'bad' | 'blank';
  readonly paid: CellMoney;
  readonly back: CellMoney;
  /** What was planned for the kind of cost of this row. */
  readonly planned: CellMoney;
  /** An amount or a day is only said roughly. */
  readonly isRough: boolean;
  readonly target: VehicleTarget | undefined;
  readonly meaning: CategoryMeaning | undefined;
  /** Its category as the file writes it. */
  readonly kind: string | null;
  /** Own work, in seconds: hours beside words that say so. Then its amount is only hours times a rate. */
  readonly ownSeconds: number | null;
  /** Money for own time of which the hours are not known: it is put aside. */
  readonly isOwnPay: boolean;
  readonly person: string | null;
  readonly what: string | null;
  readonly vendor: string | null;
}

export interface Fault {
  readonly reason: AsideReason;
  readonly col: number | null;
}

/** Column numbers of a list of expenses; 0 = there is no such column. */
export function expenseColumns(plan: Plan) {
  const col = (meaning: Parameters<typeof placeOf>[1]) => placeOf(plan.columns, meaning) + 1;
  return {
    date: col('date'),
    category: col('category'),
    what: col('what'),
    vendor: col('vendor'),
    foreseen: col('foreseen'),
    amount: col('amount'),
    credit: col('credit'),
    planned: col('estimate'),
    hours: col('hours'),
    person: col('person'),
    name: col('vehicle') || col('stock number') || col('model'),
  };
}
export type ExpenseColumns = ReturnType<typeof expenseColumns>;

/** Reads the money of a cell; nothing there is `blank`. */
export function cellMoney(plan: Plan, cell: string): CellMoney {
  const value = plan.money(cell);
  if (typeof value === 'number') return plan.isForeign(cell) ? 'currency' : value;
  if (value !== 'rough') return value === 'blank' ? 'blank' : 'bad-amount';
  const about = plan.about(cell);
  return about === null ? 'ambiguous-amount' : plan.isForeign(cell) ? 'currency' : about;
}

// Most cells are plain figures: they need no second look.
const MAY_BE_ROUGH = /[a-z~≈?×*@]/i;
const OTHER_MARK = { '.': /\.\d\d\D*$/, ',': /,\d\d\D*$/ };
const roughReader = (plan: Plan) => {
  const other = OTHER_MARK[plan.money('0.5') === 50 ? ',' : '.'];
  return (cell: string) => (MAY_BE_ROUGH.test(cell) || other.test(cell)) && plan.money(cell) === 'rough';
};

/** Reads the cells of one row, each on its own. */
export function expenseCellReader(plan: Plan, cols: ExpenseColumns): (cells: readonly string[]) => ExpenseCells {
  const nameOf = vehicleText(plan.columns);
  const days = daysInOrder(plan, cols.date);
  const textOf = remembered(keptText);
  const guess = categoryGuesser(plan.books.categories);
  const guessOf = remembered((what: string) => guess([what], null));
  const unnamed = plan.categories.get('');
  const payOf = ownPayIn(plan.columns);
  const isRough = roughReader(plan);
  const labor = plan.ownLabor;
  const paidWork = { ...paidWorkCategory(plan.books.categories), isSure: true };
  // A list without a column for it says in its own words what each cost was, unless a person said where they belong.
  const meaningOf = (word: string, what: string | null) =>
    cols.category === 0 && what !== null && !unnamed?.isSure ? guessOf(what) : (plan.categories.get(word) ?? unnamed);
  return (cells) => {
    const cell = (col: number) => (col > 0 ? (cells[col - 1] ?? '') : '');
    const name = nameOf(cells);
    const dateCell = cell(cols.date).trim();
    const what = textOf(cell(cols.what));
    const kind = textOf(cell(cols.category));
    const paid = cellMoney(plan, cell(cols.amount));
    const isPay = payOf(cells) !== null;
    return {
      name,
      dateCell,
      on: days.next(dateCell),
      paid,
      back: cellMoney(plan, cell(cols.credit)),
      planned: cellMoney(plan, cell(cols.planned)),
      isRough: days.isGuess || isRough(cell(cols.amount)) || isRough(cell(cols.credit)),
      target: plan.vehicles.get(name),
      meaning: isPay && labor.as === 'paid' ? paidWork : meaningOf(kind ?? '', what),
      kind,
      ownSeconds:
        isPay && labor.as === 'hours' && typeof paid === 'number' && paid > 0
          ? hoursAt(paid, labor.rate)
          : ownSeconds(cell(cols.hours), [cell(cols.category), what ?? '']),
      isOwnPay: isPay && labor.as === 'aside',
      person: textOf(cell(cols.person)),
      what,
      vendor: textOf(cell(cols.vendor)),
    };
  };
}

function ownSeconds(cell: string, words: readonly string[]): number | null {
  if (!words.some(saysWork)) return null;
  const inside = () => words.map(hoursInside).find((seconds) => seconds !== null) ?? null;
  const seconds = readHours(cell);
  return typeof seconds === 'number' && seconds > 0 ? seconds : inside();
}

const LONGEST = { what: 500, vendor: 200 };

/** Why a row cannot come in, the first reason that stands; null = it can. */
export function expenseFault(row: ExpenseCells, cols: ExpenseColumns, isRepeat: boolean): Fault | null {
  const { target, on, paid, back } = row;
  if (isRepeat) return { reason: 'duplicate', col: typeof paid === 'number' ? cols.amount : cols.name };
  if (row.name === '') return { reason: 'missing-vehicle', col: cols.name };
  if (target === undefined || target === 'ambiguous' || target === 'aside')
    return { reason: 'ambiguous-vehicle', col: cols.name };
  if (on === 'bad' || (on === 'blank' && target === 'overhead')) return { reason: 'bad-date', col: cols.date };
  if (typeof paid === 'string' && paid !== 'blank') return { reason: paid, col: cols.amount };
  if (typeof back === 'string' && back !== 'blank') return { reason: back, col: cols.credit };
  if (paid === 'blank' && back === 'blank' && row.ownSeconds === null && !isPlanned(row))
    return { reason: 'missing-amount', col: cols.amount || cols.credit };
  if (row.isOwnPay) return { reason: 'bad-hours', col: cols.amount };
  if ((row.what?.length ?? 0) > LONGEST.what) return { reason: 'cell-too-long', col: cols.what };
  if ((row.vendor?.length ?? 0) > LONGEST.vendor) return { reason: 'cell-too-long', col: cols.vendor };
  return factFault(row, cols);
}

/** Does a row say what was planned for a kind of cost of a rebuild? */
export const isPlanned = ({ planned, target, meaning }: ExpenseCells) =>
  typeof planned === 'number' &&
  planned > 0 &&
  typeof target === 'object' &&
  meaning?.category !== PURCHASE &&
  meaning?.category !== SALE;

/** A purchase or sale needs a rebuild, and one of which the books do not hold it already. */
function factFault({ target, meaning }: ExpenseCells, cols: ExpenseColumns): Fault | null {
  if (meaning?.category !== PURCHASE && meaning?.category !== SALE) return null;
  if (typeof target !== 'object') return { reason: 'missing-vehicle', col: cols.name };
  const isHeld = meaning.category === PURCHASE ? target.existing?.hasPurchase : target.existing?.hasLeft;
  return isHeld ? { reason: 'duplicate', col: cols.amount || cols.credit } : null;
}
