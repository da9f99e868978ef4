import { readHours } from '../cells/hours.ts';
import { categoryReader, PURCHASE, SALE, tradeMeaning } from '../words/categories.ts';
import { headingMeanings } from '../words/headings.ts';
import { categoryGuesser } from '../words/infer-category.ts';
import type { Draft } from './draft.ts';
import { type DraftLine, notData, type Plan, putAside, type RowRead, type RowReader, taken } from './plan.ts';
import { filled, totalLabel } from './row-kinds.ts';
import { looseColumns, type SectionColumns, sectionColumns } from './section-columns.ts';
import { sectionSums } from './section-sums.ts';
import { factReader } from './sheet-facts.ts';
import { isFigure, isOwnWork, titleOf } from './sheet-words.ts';
import type { ColumnSums } from './sums.ts';

/** Where the reader stands in the sheet. */
interface State {
  draft: Draft | null;
  section: { readonly category: string | null; readonly isOwnWork: boolean };
  columns: SectionColumns | null;
}

const LONGEST = 200;
const LONGEST_SECTION = 40;

/**
 * Reads a sheet about one vehicle, or several one below the other: a title, facts, sections of costs and of work with
 * headings of their own, subtotals, and the sale at the foot.
 */
export function vehicleSheetReader(plan: Plan, sums: ColumnSums): RowReader {
  const thisYear = Number(plan.books.today.slice(0, 4));
  const categoryOf = categoryReader(plan.books.categories);
  const facts = factReader(plan);
  const totals = sectionSums(plan, sums);
  const lineOf = lineReader(plan);
  const state: State = { draft: targetOf(plan, plan.sheet.name ?? ''), section: NO_SECTION, columns: null };

  function open(cells: readonly string[]): RowRead | null {
    const title = titleOf(cells, thisYear);
    const draft = title && targetOf(plan, title.text);
    if (!title || !draft) return null;
    if (draft !== state.draft) totals.restart();
    Object.assign(state, { draft, section: NO_SECTION, columns: null });
    facts.title(draft, title);
    return { ...taken([]), draft };
  }

  function beside(cells: readonly string[], line: number): RowRead | null {
    const label = totalLabel(cells);
    const [first = ''] = cells.filter((cell) => cell.trim() !== '');
    if (label !== undefined || headingMeanings(first).includes('derived')) {
      totals.compare(cells, line, label ?? first);
      return notData('total');
    }
    if (filled(cells) === 1 && !isFigure(first) && first.length <= LONGEST_SECTION) {
      const category = categoryOf(first)?.category ?? null;
      state.section = {
        category: category === PURCHASE || category === SALE ? null : category,
        isOwnWork: isOwnWork(first),
      };
      state.columns = null;
      totals.section();
      return notData('title');
    }
    const columns = sectionColumns(cells, state.section.isOwnWork);
    if (columns) state.columns = columns;
    return columns ? notData('heading') : null;
  }

  return (cells, line) => {
    const opened = open(cells) ?? beside(cells, line);
    if (opened) return opened;
    const { draft } = state;
    if (!draft) return cells.some(isFigure) ? putAside('missing-vehicle', null, null) : notData('title');
    if (state.columns === null && facts.row(draft, cells)) return { ...taken([]), draft };
    const read = lineOf(cells, line, state, draft, plan.repeats.has(line));
    totals.add(read);
    return read;
  };
}

const NO_SECTION = { category: null, isOwnWork: false };

function targetOf(plan: Plan, text: string): Draft | null {
  const target = plan.vehicles.get(text);
  return typeof target === 'object' ? target : null;
}

/** Reads one row of a section as a cost, a piece of work, or the sale. */
function lineReader(plan: Plan) {
  const categoryFor = categoryGuesser(plan.books.categories);
  const dayOf = plan.days.get(1);

  return (
    cells: readonly string[],
    line: number,
    { section, columns }: State,
    draft: Draft,
    isRepeat: boolean,
  ): RowRead => {
    const isSaleRow = isSale(cells);
    const at = (isSaleRow ? null : columns) ?? looseColumns(cells);
    const cell = (meaning: Parameters<SectionColumns['get']>[0]) => (cells[at.get(meaning) ?? -1] ?? '').trim();
    const text = (meaning: Parameters<SectionColumns['get']>[0]) => cell(meaning).normalize('NFC') || null;
    const col = (meaning: Parameters<SectionColumns['get']>[0]) => (at.get(meaning) ?? -1) + 1 || null;
    const seconds = at.has('hours')
      ? readHours(cell('hours'))
      : section.isOwnWork
        ? readHours(cell('amount'))
        : 'blank';
    const paid = plan.money(cell('amount'));
    const back = plan.money(cell('credit'));
    const isWork = (section.isOwnWork || (at.has('hours') && typeof paid !== 'number')) && !isSaleRow;
    const on = dayOf?.(cell('date')) ?? 'blank';
    const cents = typeof paid === 'number' ? paid : typeof back === 'number' ? -back : null;
    const what = text('what') ?? text('task');
    if (isRepeat) return putAside('duplicate', col('amount'), cents);
    if (cents === null && typeof seconds !== 'number')
      return unread(
        cells,
        cell('date') !== '' || columns !== null,
        isWork ? seconds : paid,
        col(isWork ? 'hours' : 'amount'),
      );
    if (on === 'bad') return putAside('bad-date', col('date'), isWork ? null : cents);
    if (Math.max(what?.length ?? 0, text('vendor')?.length ?? 0) > LONGEST)
      return putAside('cell-too-long', col('what'), cents);
    if (cents !== null && !isWork && plan.isForeign(cell('amount'))) return putAside('currency', col('amount'), cents);
    const { category, isSure } = categoryFor([text('category'), what], section.category);
    const kind = isWork
      ? 'hours'
      : isSaleRow || category === SALE
        ? 'sale'
        : category === PURCHASE
          ? 'purchase'
          : 'entry';
    const made: DraftLine = {
      kind,
      draft,
      category: kind === 'entry' ? category : null,
      on: on === 'blank' ? null : on,
      cents: isWork ? 0 : kind === 'sale' ? Math.abs(cents ?? 0) : (cents ?? 0),
      seconds: isWork && typeof seconds === 'number' ? seconds : 0,
      vendor: isWork ? null : text('vendor'),
      what: isWork ? (text('task') ?? what) : what,
      foreseen: null,
      isExtra: false,
      person: isWork ? (text('person') ?? (at.has('hours') ? null : text('vendor'))) : null,
      isGuess: kind === 'entry' && !isSure,
      row: line,
      col: col(isWork && at.has('hours') ? 'hours' : typeof paid === 'number' ? 'amount' : 'credit') ?? 1,
    };
    return taken([made]);
  };
}

/** Does the first word of a row say that it is the sale? */
function isSale(cells: readonly string[]): boolean {
  const first = cells.find((cell) => cell.trim() !== '') ?? '';
  const meaning = tradeMeaning(first.replace(/:\s*$/, ''));
  return meaning?.meaning === SALE && meaning.isExact;
}

function unread(cells: readonly string[], isMeant: boolean, value: unknown, col: number | null): RowRead {
  if (value === 'rough') return putAside('ambiguous-amount', col, null);
  if (value === 'bad') return putAside('bad-amount', col, null);
  return isMeant && filled(cells) > 1 ? putAside('missing-amount', col, null) : notData('note');
}
