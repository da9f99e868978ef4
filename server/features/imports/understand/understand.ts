import type { Choice, Column, Reading, Shape } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import type { ShopBooks } from '../books.ts';
import { dayReader } from '../cells/days.ts';
import { currenciesIn, type DecimalMark, moneyReader } from '../cells/money.ts';
import { remembered } from '../cells/fold.ts';
import type { Plan } from '../read/plan.ts';
import { FileRefusal } from '../refusal.ts';
import type { ByteSource } from '../text/bytes.ts';
import { findFormat, type TextFormat } from '../text/rows.ts';
import { categoryReader } from '../words/categories.ts';
import { categoryWords } from './category-words.ts';
import { columnFacts } from './column-facts.ts';
import { guessColumns } from './columns.ts';
import { dateOrders } from './date-order.ts';
import { markDerived } from './derived.ts';
import { type Head, readHead } from './head.ts';
import { askOfColumns } from './column-choices.ts';
import { guessShape } from './shape.ts';
import { type Survey, survey } from './survey.ts';
import { vehicleDrafts } from './vehicle-drafts.ts';

/** What could be understood of a file that is not refused outright. `plan` is null when its shape cannot be read. */
export interface Understanding {
  readonly format: Reading['format'];
  readonly columns: readonly Column[];
  readonly choices: readonly Choice[];
  readonly plan: Plan | null;
  readonly refusal: Reading['refusal'];
}

/**
 * Understands a file before its rows are read: how it is written, where its headings are, what its columns hold, in
 * which order its dates stand, which spellings are one vehicle. Throws a FileRefusal for what is no table of text.
 */
export function understand(source: ByteSource, books: ShopBooks, settings: ImportSettings): Understanding {
  const format = findFormat(source);
  const head = readHead(source, format);
  const decimal = usualDecimal(books.locale);
  const answers = new Map(Object.entries(settings.answers ?? {}));
  const guess = guessAll(head, books, settings, decimal);
  const base = { format: { ...format, decimal, headingRow: head.heading?.line ?? null }, columns: guess.columns };
  if (guess.shape === null || !head.heading) {
    return { ...base, choices: [], plan: null, refusal: { kind: 'shape', message: guess.why, row: guess.row } };
  }
  const asked = askOfColumns(guess.columns, guess.shape, answers, books);
  const heading = { line: head.heading.line, cells: head.heading.cells };
  const found = survey(source, format, asked.columns, heading);
  refuseForeign(found, books.currency);
  const plan = makePlan({
    format,
    shape: guess.shape,
    columns: asked.columns,
    heading,
    books,
    found,
    answers,
    choices: asked.choices,
  });
  return {
    ...base,
    format: { ...base.format, decimal: plan.decimal },
    columns: plan.columns,
    choices: plan.choices,
    plan,
    refusal: null,
  };
}

function guessAll(head: Head, books: ShopBooks, settings: ImportSettings, decimal: DecimalMark) {
  const facts = columnFacts(head);
  const categoryOf = categoryReader(books.categories);
  const guessed = guessShape(head, facts, categoryOf);
  const columns =
    guessed.shape === null
      ? guessColumns(facts, 'expenses', categoryOf)
      : guessColumns(facts, guessed.shape, categoryOf);
  const money = moneyReader(decimal);
  const derived = guessed.shape === 'vehicles' ? markDerived(columns, head, money) : columns;
  if (!settings.columns) return { columns: derived, why: '', row: null, ...guessed };
  const changed = new Map(settings.columns.map((column) => [column.col, column]));
  const own = derived.map((column) => {
    const change = changed.get(column.col);
    const isSame = !change || (change.meaning === column.meaning && change.category === column.category);
    return isSame ? column : { ...column, ...change, why: 'You said so.' };
  });
  const shape = shapeOf(own);
  return shape
    ? { columns: own, shape, why: '', row: null }
    : {
        columns: own,
        shape: null,
        why: 'A column must name the vehicle, and another hold amounts or hours.',
        row: head.heading?.line ?? null,
      };
}

/** The shape that columns set by hand make. */
function shapeOf(columns: readonly Column[]): Shape | null {
  const has = (...meanings: Column['meaning'][]) => columns.some((column) => meanings.includes(column.meaning));
  if (!has('vehicle', 'stock number', 'model')) return null;
  if (has('amount', 'credit')) return 'expenses';
  if (has('cost', 'purchase', 'sale', 'estimate')) return 'vehicles';
  return has('hours') ? 'hours' : null;
}

const usualDecimal = (locale: string): DecimalMark =>
  new Intl.NumberFormat(locale).formatToParts(1.5).find((part) => part.type === 'decimal')?.value === ',' ? ',' : '.';

/** A file whose amounts carry another currency's sign is refused; single foreign cells are put aside later. */
function refuseForeign(found: Survey, currency: string): void {
  let own = 0;
  let other: [string, number] = ['', 0];
  for (const [name, cells] of found.currencies) {
    if (name === currency) own = cells;
    else if (cells > other[1]) other = [name, cells];
  }
  if (other[1] > own) {
    throw new FileRefusal(
      'currency',
      `The amounts in this file are in ${other[0]}, and the shop keeps its books in ${currency}.`,
    );
  }
}

interface Settled {
  readonly format: TextFormat;
  readonly shape: Shape;
  readonly columns: readonly Column[];
  readonly heading: Plan['heading'];
  readonly books: ShopBooks;
  readonly found: Survey;
  readonly answers: ReadonlyMap<string, string>;
  readonly choices: readonly Choice[];
}

function makePlan({ format, shape, columns, heading, books, found, answers, choices }: Settled): Plan {
  const decimal: DecimalMark =
    found.decimalVotes === 0 ? usualDecimal(books.locale) : found.decimalVotes > 0 ? '.' : ',';
  const dates = dateOrders(columns, found.dates, books.locale, answers);
  const isList = shape !== 'vehicles';
  const vehicles = isList ? vehicleDrafts(found.vehicles, books, answers) : { of: new Map(), choices: [] };
  const words =
    shape === 'expenses'
      ? categoryWords(found.categories.size ? found.categories : new Map([['', 1]]), books.categories, answers)
      : { of: new Map(), choices: [] };
  const repeat = repeatChoice(found.repeats.size, answers);
  return {
    format,
    decimal,
    shape,
    columns,
    heading,
    books,
    choices: [...choices, ...dates.choices, ...vehicles.choices, ...words.choices, ...(repeat ? [repeat] : [])],
    money: moneyReader(decimal),
    days: new Map([...dates.orders].map(([col, order]) => [col, remembered(dayReader(order, books.today))])),
    vehicles: vehicles.of,
    categories: words.of,
    repeats: answers.get('duplicate') === 'twice' ? new Set() : found.repeats,
    isForeign: (text) => {
      const named = currenciesIn(text);
      return named !== null && !named.includes(books.currency);
    },
  };
}

function repeatChoice(rows: number, answers: ReadonlyMap<string, string>): Choice | null {
  if (rows === 0) return null;
  return {
    id: 'duplicate',
    kind: 'duplicate',
    column: null,
    question: `${rows} rows repeat a block of rows before them exactly. Do they count once or twice?`,
    options: [
      { value: 'once', label: 'once: put the repeats aside' },
      { value: 'twice', label: 'twice: they happened again' },
    ],
    preset: 'once',
    answer: answers.get('duplicate') ?? null,
    mustAsk: false,
    why: 'Three or more different rows in the same order look like an accident of pasting.',
  };
}
