import { categoryReader, PURCHASE, SALE } from '../words/categories.ts';
import { looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { headingMeanings, isCarriedLabel } from '../words/headings.ts';
import type { Draft } from './draft.ts';
import { notData, type Plan, putAside, type RowRead, type RowReader, taken } from './plan.ts';
import { filled, totalLabel } from './row-kinds.ts';
import { sectionColumns } from './section-columns.ts';
import { type Section, sectionLineReader } from './section-line.ts';
import { sectionSums } from './section-sums.ts';
import { factReader } from './sheet-facts.ts';
import { isFigure, titleOf } from './sheet-words.ts';
import { isOwnWork } from '../words/own-work.ts';
import type { ColumnSums } from './sums.ts';

/** Where the reader stands in the sheet. */
interface State {
  draft: Draft | null;
  section: Section;
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
  const lineOf = sectionLineReader(plan);
  const state: State = { draft: targetOf(plan, plan.sheet.name ?? ''), section: NO_SECTION };

  function open(cells: readonly string[]): RowRead | null {
    const title = titleOf(cells, thisYear);
    const draft = title && targetOf(plan, title.text);
    if (!title || !draft) return null;
    if (draft !== state.draft) totals.restart();
    Object.assign(state, { draft, section: NO_SECTION });
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
      totals.compare(cells, line, label ?? first, state.section.isOwnWork);
      return notData('total');
    }
    if (filled(cells) === 1 && !isFigure(first) && first.length <= LONGEST_SECTION) {
      const category = categoryOf(first)?.category ?? null;
      state.section = {
        category: category === PURCHASE || category === SALE ? null : category,
        isOwnWork: isOwnWork(first),
        columns: null,
      };
      totals.section();
      return notData('title');
    }
    const columns = sectionColumns(cells, state.section.isOwnWork);
    if (!columns) return null;
    state.section = { ...state.section, columns };
    totals.section();
    return notData('heading');
  }

  return (cells, line) => {
    const opened = open(cells) ?? beside(cells, line);
    if (opened) return opened;
    const { draft } = state;
    if (!draft) return cells.some(isFigure) ? putAside('missing-vehicle', null, null) : notData('title');
    const fact = state.section.columns === null || isLabeledDay(cells) ? facts.row(draft, cells) : null;
    if (fact) return fact;
    const read = lineOf(cells, line, state.section, draft);
    totals.add(read);
    return read;
  };
}

const NO_SECTION: Section = { category: null, isOwnWork: false, columns: null };

function targetOf(plan: Plan, text: string): Draft | null {
  const target = plan.vehicles.get(text);
  return typeof target === 'object' ? target : null;
}
