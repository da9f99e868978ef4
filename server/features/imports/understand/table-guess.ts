import type { Choice, Column } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import type { ShopBooks } from '../books.ts';
import { type DecimalMark, moneyReader } from '../cells/money.ts';
import type { Heading } from '../read/plan.ts';
import type { Sheet } from '../sheets/sheet.ts';
import { categoryReader } from '../words/categories.ts';
import { settleAmount } from './amount-column.ts';
import { askOfColumns } from './column-choices.ts';
import { columnFacts } from './column-facts.ts';
import { guessColumns } from './columns.ts';
import { markDerived } from './derived.ts';
import { type Head, readHead } from './head.ts';
import { sectionHeadings } from './section-headings.ts';
import { askOfRivals } from './rival-columns.ts';
import { guessShape } from './shape.ts';

/** What the first rows of a sheet let expect of all its rows. */
export interface TableGuess {
  readonly sheet: Sheet;
  readonly hasRows: boolean;
  readonly heading: Heading;
  readonly columns: readonly Column[];
  readonly choices: readonly Choice[];
  /** null = no table; then `why` and `row` say what is missing. */
  readonly shape: Shape | null;
  readonly why: string;
  readonly row: number | null;
}

const LONGEST_TITLE = 500;
const titleOver = ({ above }: Head) =>
  above
    .flatMap(({ cells }) => cells)
    .join(' ')
    .slice(0, LONGEST_TITLE);

interface Asked {
  readonly books: ShopBooks;
  readonly settings: ImportSettings;
  readonly decimal: DecimalMark;
  readonly answers: ReadonlyMap<string, string>;
}

const NO_HEADING: Heading = { line: 0, last: 0, cells: [], title: '' };

/** Guesses what a sheet holds from its first rows and what a person said of its columns. */
export function guessTable(sheet: Sheet, { books, settings, decimal, answers }: Asked): TableGuess {
  const head = readHead(sheet, Number(books.today.slice(0, 4)));
  const said = (settings.columns ?? []).filter((column) => (column.sheet ?? 1) === sheet.number);
  const guess = guessAll(head, sheet, books, said, decimal);
  const hasRows = head.heading !== null || head.below.length > 0;
  const heading = head.heading
    ? { line: head.heading.line, last: head.last, cells: head.heading.cells, title: titleOver(head) }
    : NO_HEADING;
  if (guess.shape === null) return { sheet, hasRows, heading, choices: [], ...guess };
  if (guess.shape === 'vehicle sheet') return { sheet, hasRows, heading: NO_HEADING, choices: [], ...guess };
  const rivals = askOfRivals(guess.columns, guess.shape, { head, money: moneyReader(decimal), answers });
  const asked = askOfColumns(rivals.columns, guess.shape, answers, books);
  return { sheet, hasRows, heading, ...guess, columns: asked.columns, choices: [...rivals.choices, ...asked.choices] };
}

function guessAll(
  head: Head,
  sheet: Sheet,
  books: ShopBooks,
  said: NonNullable<ImportSettings['columns']>,
  decimal: DecimalMark,
) {
  const facts = columnFacts(head);
  const categoryOf = categoryReader(books.categories, books.retiredCategories);
  const thisYear = Number(books.today.slice(0, 4));
  const guessed = guessShape(head, facts, categoryOf, { sheetName: sheet.name, thisYear });
  if (guessed.shape === 'vehicle sheet')
    return { columns: sectionHeadings(head, sheet.number, said), why: '', row: null, ...guessed };
  const columns = guessColumns(facts, guessed.shape ?? 'expenses', categoryOf, {
    sheet: sheet.number,
    thisYear,
  });
  const money = moneyReader(decimal);
  const derived =
    guessed.shape === 'vehicles'
      ? markDerived(columns, head, money)
      : guessed.shape === 'expenses'
        ? settleAmount(columns, head, money)
        : columns;
  if (said.length === 0) return { columns: derived, why: '', row: null, ...guessed };
  const changed = new Map(said.map((column) => [column.col, column]));
  const own = derived.map((column) => {
    const change = changed.get(column.col);
    const isSame = !change || (change.meaning === column.meaning && change.category === column.category);
    return isSame ? column : { ...column, meaning: change.meaning, category: change.category, why: 'You said so.' };
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
