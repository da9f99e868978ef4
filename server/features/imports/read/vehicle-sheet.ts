import { YOU_SAID } from '../understand/section-headings.ts';
import { categoryReader, PURCHASE, SALE } from '../words/categories.ts';
import { looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { headingMeanings, isCarriedLabel } from '../words/headings.ts';
import type { Draft } from './draft.ts';
import { notData, type Plan, putAside, type RowRead, type RowReader, taken } from './plan.ts';
import { filled, totalLabel } from './row-kinds.ts';
import { asSaid, type SectionColumns, sectionColumns } from './section-columns.ts';
import { isSaleRow, type Section, sectionLineReader } from './section-line.ts';
import { sectionSums } from './section-sums.ts';
import { halves, type SideBySide, sideBySide, together } from './side-by-side.ts';
import { factReader } from './sheet-facts.ts';
import { isFigure, titleOf } from './sheet-words.ts';
import { isOwnWork } from '../words/own-work.ts';
import type { ColumnSums } from './sums.ts';

/** Where the reader stands in the sheet. */
interface State {
  draft: Draft | null;
  section: Section;
  /** A second table at the right of the section; null = none. */
  beside: SideBySide | null;
}

const LONGEST_SECTION = 40;
/** A label and a day, as `Sold, 8/2/2019` under a table of costs. */
const isLabeledDay = (cells: readonly string[]) => {
  const [label, day, ...more] = cells.filter((cell) => cell.trim() !== '');
  return more.length === 0 && day !== undefined && looksLikeDay(day) && !looksLikeDay(label ?? '');
};
const isText = (cell: string) => /\p{L}{2}/u.test(cell) && !looksLikeDay(cell) && !looksLikeMoney(cell);

/**
 * Reads a sheet about one vehicle, or several one below the other: a title, facts, sections of costs and of work with
 * headings of their own, subtotals, and the sale at the foot.
 */
export function vehicleSheetReader(plan: Plan, sums: ColumnSums): RowReader {
  const thisYear = Number(plan.books.today.slice(0, 4));
  const categoryOf = categoryReader(plan.books.categories, plan.books.retiredCategories);
  const facts = factReader(plan);
  const totals = sectionSums(plan, sums);
  const said = plan.columns.filter(({ why }) => why === YOU_SAID);
  const readLine = halvesReader(sectionLineReader(plan));
  const state: State = { draft: targetOf(plan, plan.sheet.name ?? ''), section: NO_SECTION, beside: null };

  function open(cells: readonly string[]): RowRead | null {
    const title = titleOf(cells, thisYear);
    const draft = title && targetOf(plan, title.text);
    if (!title || !draft) return null;
    if (draft !== state.draft) totals.restart();
    Object.assign(state, { draft, section: NO_SECTION, beside: null });
    facts.title(draft, title);
    return { ...taken([]), draft };
  }

  function beside(cells: readonly string[], line: number): RowRead | null {
    const [first = ''] = cells.filter((cell) => cell.trim() !== '');
    // A cost of a day, from `Total Auto Parts`, is no total.
    const isDated = cells.some(looksLikeDay) && cells.filter(isText).length > 1;
    const label = isDated ? undefined : totalLabel(cells);
    if (label !== undefined && isCarriedLabel(label)) return notData('carried');
    if (label !== undefined || (!isDated && headingMeanings(first).includes('derived'))) {
      compareTotals(cells, line, label ?? first);
      return notData('total');
    }
    if (filled(cells) === 1 && !isFigure(first) && first.length <= LONGEST_SECTION) {
      const category = categoryOf(first)?.category ?? null;
      state.beside = null;
      state.section = {
        category: category === PURCHASE || category === SALE ? null : category,
        isOwnWork: isOwnWork(first),
        columns: null,
      };
      totals.section();
      return notData('title');
    }
    const tables = sideBySide(cells);
    const named = tables?.left ?? sectionColumns(cells, state.section.isOwnWork);
    if (!named) return null;
    const columns = asSaid(
      named,
      said.filter(({ col }) => (cells[col - 1] ?? '').trim() !== ''),
    );
    state.beside = tables;
    state.section = { ...state.section, columns };
    totals.section();
    return notData('heading');
  }

  /** Totals of two tables beside each other stand in one row, each under its own. */
  function compareTotals(cells: readonly string[], line: number, label: string): void {
    const { section, beside: tables } = state;
    const { left, right } = halves(cells, tables?.from ?? cells.length);
    totals.compare(left, line, label, section.isOwnWork);
    if (!tables || !right.some(isFigure)) return;
    const isHours = isWork(tables.right);
    totals.compare(right, line, isHours ? `${label} (hours)` : label, isHours);
  }

  return (cells, line) => {
    const opened = open(cells) ?? beside(cells, line);
    if (opened) return opened;
    const { draft } = state;
    if (!draft) return cells.some(isFigure) ? putAside('missing-vehicle', null, null) : notData('title');
    const fact = state.section.columns === null || isLabeledDay(cells) ? facts.row(draft, cells) : null;
    if (fact) return fact;
    const read = readLine(state, cells, line, draft);
    totals.add(read);
    return read;
  };
}

/** Reads a row of two tables beside each other, each half by its own columns. */
function halvesReader(lineOf: ReturnType<typeof sectionLineReader>) {
  return ({ section, beside }: State, cells: readonly string[], line: number, draft: Draft): RowRead => {
    if (!beside || isSaleRow(cells)) return lineOf(cells, line, section, draft);
    const { left, right } = halves(cells, beside.from);
    const ofRight = { category: null, isOwnWork: isWork(beside.right), columns: beside.right };
    const reads = [lineOf(left, line, section, draft), lineOf(right, line, ofRight, draft)] as const;
    return together(cells, beside.from, ...reads);
  };
}

const isWork = (columns: SectionColumns) => columns.has('hours') && !columns.has('amount');
const NO_SECTION: Section = { category: null, isOwnWork: false, columns: null };

function targetOf(plan: Plan, text: string): Draft | null {
  const target = plan.vehicles.get(text);
  return typeof target === 'object' ? target : null;
}
