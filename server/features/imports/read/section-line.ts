import type { Meaning } from '#shared/contracts/import-reading.ts';
import { looksLikeDay } from '../cells/days.ts';
import { aboutHours, readHours } from '../cells/hours.ts';
import { PURCHASE, SALE, tradeMeaning } from '../words/categories.ts';
import { categoryGuesser } from '../words/infer-category.ts';
import { isRefund } from '../words/refunds.ts';
import { daysInOrder } from './days-in-order.ts';
import type { Draft } from './draft.ts';
import { cellMoney } from './expense-cells.ts';
import { keptText, withoutFaulty } from './faulty-texts.ts';
import { type DraftLine, notData, type Plan, putAside, type RowRead, taken } from './plan.ts';
import { filled } from './row-kinds.ts';
import { looseColumns, type SectionColumns } from './section-columns.ts';

/** The part of a sheet that a row stands in. */
export interface Section {
  readonly category: string | null;
  readonly isOwnWork: boolean;
  /** null = no headings stand above its rows. */
  readonly columns: SectionColumns | null;
}

const LONGEST = 200;
const TEXTS: readonly Meaning[] = ['category', 'what', 'task', 'vendor', 'person'];

/** Reads one row of a section as a cost, a piece of own work, or the sale of its vehicle. */
export function sectionLineReader(plan: Plan) {
  const categoryFor = categoryGuesser(plan.books.categories);
  const days = daysInOrder(plan, 1);
  const cellsOf = sectionCellReader(plan);

  return (cells: readonly string[], line: number, section: Section, draft: Draft): RowRead => {
    const row = cellsOf(cells, section);
    const on = days.next(row.date);
    const fault = faultOf(row, on === 'bad');
    if (plan.repeats.has(line)) return putAside('duplicate', row.amountCol, row.cents);
    if (fault) return fault;
    const { category, isSure } = categoryFor([row.category, row.what, row.first], section.category);
    const planned = plannedLine(row, category, draft, line);
    if (row.cents === null && row.seconds === null)
      return planned ? withoutFaulty(taken([planned]), cells, row.textCols) : unread(cells, row, section);
    const kind = row.isWork ? 'hours' : row.isSale ? 'sale' : kindOf(category);
    const cents = row.isWork ? 0 : (row.cents ?? 0);
    const isBack = kind === 'entry' && cents > 0 && isRefund(row.what);
    const made: DraftLine = {
      kind,
      draft,
      category: kind === 'entry' ? category : null,
      on: on === 'blank' || on === 'bad' ? null : on,
      cents: kind === 'sale' ? Math.abs(cents) : isBack ? -cents : cents,
      seconds: row.isWork ? (row.seconds ?? 0) : 0,
      vendor: row.isWork ? null : row.vendor,
      what: row.what,
      foreseen: null,
      isExtra: false,
      person: row.isWork ? row.person : null,
      isGuess: row.isRough || days.isGuess || isBack || (kind === 'entry' && !isSure),
      row: line,
      col: row.col,
    };
    return withoutFaulty(taken(planned ? [planned, made] : [made]), cells, row.textCols);
  };
}

/** What a row had planned beside what it came to; null = nothing, or for no category of the shop. */
function plannedLine(
  { planned, plannedCol, what }: SectionCells,
  category: string,
  draft: Draft,
  row: number,
): DraftLine | null {
  const isCost = category !== SALE && category !== PURCHASE;
  if (planned === null || planned <= 0 || !isCost) return null;
  return { ...PLANNED, draft, category, cents: planned, what, row, col: plannedCol };
}

const PLANNED = {
  kind: 'estimate',
  on: null,
  seconds: 0,
  vendor: null,
  foreseen: null,
  isExtra: false,
  person: null,
  isGuess: false,
} as const satisfies Partial<DraftLine>;

const kindOf = (category: string) => (category === SALE ? 'sale' : category === PURCHASE ? 'purchase' : 'entry');
type SectionCells = ReturnType<ReturnType<typeof sectionCellReader>>;

function sectionCellReader(plan: Plan) {
  return (cells: readonly string[], { columns, isOwnWork }: Section) => {
    const isSale = isSaleRow(cells);
    const at = (isSale ? null : columns) ?? looseColumns(cells);
    const cell = (meaning: Meaning) => (cells[at.get(meaning) ?? -1] ?? '').trim();
    const text = (meaning: Meaning) => keptText(cell(meaning));
    const col = (meaning: Meaning) => (at.get(meaning) ?? -1) + 1;
    const time = at.has('hours') ? cell('hours') : isOwnWork ? cell('amount') : '';
    const exact = readHours(time);
    const seconds = exact === 'bad' ? aboutHours(time) : exact;
    const paid = cellMoney(plan, cell('amount'));
    const back = cellMoney(plan, cell('credit'));
    const isWork = !isSale && (isOwnWork || (at.has('hours') && typeof paid !== 'number' && time !== ''));
    const planned = cellMoney(plan, cell('estimate'));
    const amountCol = (typeof paid === 'number' || paid !== 'blank' ? col('amount') : col('credit')) || null;
    return {
      isSale,
      planned: typeof planned === 'number' ? planned : null,
      plannedCol: col('estimate'),
      isWork,
      date: cell('date') || (columns && !isSale ? '' : dayInside(cells)),
      seconds: typeof seconds === 'number' ? seconds : null,
      isBadTime: exact === 'bad' && seconds === null,
      cents: typeof paid === 'number' ? paid : typeof back === 'number' ? -back : null,
      badMoney: typeof paid === 'string' && paid !== 'blank' ? paid : null,
      isRough: isWork ? exact === 'bad' : plan.money(cell('amount')) === 'rough',
      what: text(isWork ? 'task' : 'what') ?? text(isWork ? 'what' : 'task'),
      category: text('category'),
      first: columns ? null : (cells.find((one) => one.trim() !== '')?.trim() ?? null),
      vendor: text('vendor'),
      textCols: TEXTS.map(col),
      person: text('person') ?? (at.has('hours') ? null : text('vendor')),
      amountCol,
      col: (isWork && at.has('hours') ? col('hours') : amountCol) ?? 1,
    };
  };
}

function faultOf(row: SectionCells, isBadDay: boolean): RowRead | null {
  if (!row.isWork && row.badMoney) return putAside(row.badMoney, row.amountCol, null);
  if (row.isWork && row.isBadTime) return putAside('bad-hours', row.col, null);
  if (row.cents === null && row.seconds === null) return null;
  if (isBadDay) return putAside('bad-date', null, row.isWork ? null : row.cents);
  const isLong = Math.max(row.what?.length ?? 0, row.vendor?.length ?? 0, row.person?.length ?? 0) > LONGEST;
  return isLong ? putAside('cell-too-long', null, row.cents) : null;
}

/** A day that stands beside words in one cell: `sold 6/19/2019`. '' = none. */
function dayInside(cells: readonly string[]): string {
  const first = cells.find((cell) => cell.trim() !== '' && !looksLikeDay(cell)) ?? '';
  return /\d{4}-\d\d-\d\d|\d{1,2}[-/.]\d{1,2}[-/.]\d{2,4}/.exec(first)?.[0] ?? '';
}

const SMALL = /\s(?:am|on|le|el|for|to|für|an|por|pour|à|a)(?=\s|$)/gi;

/** Does the first word of a row say that it is the sale? */
export function isSaleRow(cells: readonly string[]): boolean {
  const first = cells.find((cell) => cell.trim() !== '' && !looksLikeDay(cell)) ?? '';
  const words = first.replace(/[\d/.:-]+/g, ' ').replace(SMALL, ' ');
  const meaning = tradeMeaning(words);
  return meaning?.meaning === SALE && meaning.isExact;
}

/** A row without figures is a note, unless it stands in a table and names a day. */
function unread(cells: readonly string[], row: SectionCells, { columns }: Section): RowRead {
  const isMeant = columns !== null && filled(cells) > 1 && row.date !== '';
  return isMeant ? putAside(row.isWork ? 'bad-hours' : 'missing-amount', row.col, null) : notData('note');
}
