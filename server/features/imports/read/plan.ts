import type { Choice, Column, Earlier, Line, StatedTotal } from '#shared/contracts/import-reading.ts';
import type { AsideReason, NotData, Outcome, Shape } from '#shared/contracts/import-words.ts';
import type { Day } from '#shared/day.ts';
import type { ShopBooks } from '../books.ts';
import type { DateOrder } from '../cells/days.ts';
import type { DecimalMark, Money } from '../cells/money.ts';
import type { PastCell } from '../earlier/past.ts';
import type { EarlierRows } from '../earlier/settle-earlier.ts';
import type { SurveyedRows } from '../understand/survey.ts';
import type { OwnLabor } from '../understand/own-labor.ts';
import type { VehicleTarget } from '../understand/vehicle-drafts.ts';
import type { CategoryMeaning } from '../words/categories.ts';
import type { Sheet } from '../sheets/sheet.ts';
import type { Draft } from './draft.ts';

/** Everything settled about a file before its rows are read. */
export interface FilePlan {
  readonly decimal: DecimalMark;
  /** What most of the file holds. */
  readonly shape: Shape;
  readonly choices: readonly Choice[];
  /** The imports that these files carry on. */
  readonly earlier: readonly Earlier[];
  /** One for every sheet that holds anything, in the file's order. */
  readonly tables: readonly Plan[];
}

/** What the headings of a sheet say. They stand on `line`, and down to `last` when they take several rows; 0 = none. */
export interface Heading {
  readonly line: number;
  readonly last: number;
  readonly cells: readonly string[];
  /** What stands above them. */
  readonly title?: string;
}

/** Everything settled about one sheet. */
export interface Plan {
  readonly sheet: Sheet;
  /** null = no table that could be read. */
  readonly shape: Shape | null;
  readonly columns: readonly Column[];
  readonly heading: Heading;
  readonly books: ShopBooks;
  readonly money: (text: string, isCostCell?: boolean) => Money;
  /** Money that is only said roughly; null = not even that. */
  readonly about: (text: string) => number | null;
  /** The order of day and month in each date column, by column number. */
  readonly orders: ReadonlyMap<number, DateOrder>;
  /** Reader of each date column, by column number. */
  readonly days: ReadonlyMap<number, (text: string) => Day | 'bad' | 'blank'>;
  readonly vehicles: ReadonlyMap<string, VehicleTarget>;
  /** In a workbook: the rebuild of each row of a sheet with one vehicle per row, which other sheets name, too. */
  readonly rowDrafts: ReadonlyMap<number, Draft>;
  /** In a workbook: columns that only repeat what other sheets hold in detail. */
  readonly repeated: readonly RepeatedColumn[];
  readonly categories: ReadonlyMap<string, CategoryMeaning>;
  /** What becomes of money for own time. */
  readonly ownLabor: OwnLabor;
  /** Lines that repeat a block pasted twice, to be put aside. */
  readonly repeats: ReadonlySet<number>;
  /** What the rows hold that sheets are known by later; see `SurveyedRows`. */
  readonly rows: SurveyedRows;
  /** Rows that came in with an earlier import, by line. */
  readonly earlier: EarlierRows;
  /** A cell that names another currency than the shop's. */
  readonly isForeign: (text: string) => boolean;
}

/** A column of an overview that adds up receipts of other sheets: it is checked against them, never counted. */
export interface RepeatedColumn {
  readonly col: number;
  readonly measure: StatedTotal['measure'];
  readonly read: (text: string) => number | null;
  /** Cents or seconds that came in for the vehicle of a row. */
  readonly of: ReadonlyMap<number, number>;
  /** Where they stand, in words. */
  readonly sheets: string;
}

/** A cell put aside while the rest of its row came in. */
export interface CellAside {
  readonly col: number;
  readonly reason: AsideReason;
  readonly text: string;
  readonly cents: number | null;
}

/** One line of a row, with its rebuild still as a draft; null = overhead. */
export type DraftLine = Omit<Line, 'rebuild' | 'sheet'> & { readonly draft: Draft | null };

/** A line as people see it: its rebuild by its place in the list of those that came in. */
export const lineOf = ({ draft, ...line }: DraftLine, sheet: number): Line => ({
  ...line,
  sheet,
  rebuild: draft === null ? null : draft.place,
});

/** How one row of the file ended. */
export interface RowRead {
  readonly outcome: Outcome;
  readonly reason: AsideReason | NotData | null;
  /** The cell that put the row aside; null = none in particular. */
  readonly col: number | null;
  /** Readable money on a row put aside. */
  readonly cents: number | null;
  readonly lines: readonly DraftLine[];
  readonly cells: readonly CellAside[];
  /** The rebuild that the whole row stands for, in a sheet with one vehicle per row. */
  readonly draft?: Draft;
  /** What is booked of an earlier import, and makes way for this row. */
  readonly replaces?: readonly PastCell[];
}

export const notData = (reason: NotData): RowRead => ({
  outcome: 'not data',
  reason,
  col: null,
  cents: null,
  lines: [],
  cells: [],
});
export const putAside = (reason: AsideReason, col: number | null, cents: number | null): RowRead => ({
  outcome: 'put aside',
  reason,
  col,
  cents,
  lines: [],
  cells: [],
});
export const taken = (lines: readonly DraftLine[]): RowRead => ({
  outcome: 'taken',
  reason: null,
  col: null,
  cents: null,
  lines,
  cells: [],
});

/** Reads one row of the table; `sums` hears what each money column holds. */
export type RowReader = (cells: readonly string[], line: number) => RowRead;
