import { remembered } from '../cells/fold.ts';
import { PURCHASE, SALE } from '../words/categories.ts';
import { isCarriedLabel } from '../words/headings.ts';
import { foreseenOf } from '../words/kinds.ts';
import { isRefund } from '../words/refunds.ts';
import { type ExpenseCells, expenseCellReader, expenseColumns, expenseFault, isPlanned } from './expense-cells.ts';
import { withoutFaulty } from './faulty-texts.ts';
import { type DraftLine, notData, type Plan, putAside, type RowRead, type RowReader, taken } from './plan.ts';
import { filled, totalLabel } from './row-kinds.ts';
import type { ColumnSums } from './sums.ts';

/** Reads rows of a list with one expense each. Credits and refunds become negative, sales facts of their rebuild. */
export function expenseRowReader(plan: Plan, sums: ColumnSums): RowReader {
  const cols = expenseColumns(plan);
  const read = expenseCellReader(plan, cols);
  const said = remembered(foreseenOf);
  const texts = [cols.category, cols.what, cols.vendor, cols.foreseen, cols.person];
  const readRow: RowReader = (cells, line) => {
    const row = read(cells);
    const beside = rowBeside(cells, row);
    if (beside?.reason === 'total') sums.compare(cells, line, totalLabel(cells) ?? '');
    if (beside) return beside;
    const fault = plan.earlier.has(line) ? earlierFault(row, cols) : expenseFault(row, cols, plan.repeats.has(line));
    const isWork = row.ownSeconds !== null && typeof row.target === 'object';
    if (typeof row.paid === 'number') sums.add(cols.amount, row.paid, fault === null && !isWork);
    if (typeof row.back === 'number') sums.add(cols.credit, row.back, fault === null);
    if (fault) return putAside(fault.reason, fault.col, readableCents(row));
    if (isWork) return taken([workOf(row, line, cols.hours || cols.amount)]);
    const came = said(cols.foreseen > 0 ? (cells[cols.foreseen - 1] ?? '').trim() : '');
    const lines: DraftLine[] = [];
    const isBack = row.back === 'blank' && isTypedPositive(row);
    if (isPlanned(row)) lines.push(plannedOf(row, line, cols.planned));
    if (typeof row.paid === 'number')
      lines.push(lineOf(row, isBack ? -row.paid : row.paid, { line, col: cols.amount, isBack, ...came }));
    if (typeof row.back === 'number')
      lines.push(lineOf(row, -row.back, { line, col: cols.credit, isBack: false, ...came }));
    return taken(lines);
  };
  return (cells, line) => withoutFaulty(readRow(cells, line), cells, texts);
}

/** A row that came in before was taken then: that the books hold its purchase or sale is no fault of it. */
function earlierFault(row: ExpenseCells, cols: ReturnType<typeof expenseColumns>) {
  const fault = expenseFault(row, cols, false);
  return fault?.reason === 'duplicate' ? null : fault;
}

/** Own time at a rate is hours, no money. */
function workOf(row: ExpenseCells, line: number, col: number): DraftLine {
  const from = { line, col, foreseen: null, isExtra: false, isBack: false };
  const { ownSeconds, person } = row;
  return {
    ...lineOf(row, 0, from),
    kind: 'hours',
    category: null,
    seconds: ownSeconds ?? 0,
    vendor: null,
    person,
    isGuess: false,
  };
}

function plannedOf(row: ExpenseCells, line: number, col: number): DraftLine {
  const from = { line, col, foreseen: null, isExtra: false, isBack: false };
  return { ...lineOf(row, typeof row.planned === 'number' ? row.planned : 0, from), kind: 'estimate', vendor: null };
}

/** A refund whose words say so while its amount says nothing of it. */
function isTypedPositive({ paid, what, kind, meaning }: ExpenseCells): boolean {
  const isFact = meaning?.category === PURCHASE || meaning?.category === SALE;
  return typeof paid === 'number' && paid > 0 && !isFact && (isRefund(what) || isRefund(kind));
}

function lineOf(
  row: ExpenseCells,
  cents: number,
  from: Pick<DraftLine, 'col' | 'foreseen' | 'isExtra'> & { line: number; isBack: boolean },
): DraftLine {
  const category = row.meaning?.category ?? '';
  const kind = category === PURCHASE ? 'purchase' : category === SALE ? 'sale' : 'entry';
  return {
    kind,
    draft: typeof row.target === 'object' ? row.target : null,
    category: kind === 'entry' ? category : null,
    on: row.on === 'blank' || row.on === 'bad' ? null : row.on,
    // A sale stands positive in one column or in the other; in the books it is what came in.
    cents: kind === 'sale' ? Math.abs(cents) : cents,
    seconds: 0,
    vendor: row.vendor,
    what: row.what,
    foreseen: from.foreseen,
    isExtra: from.isExtra,
    person: null,
    isGuess: from.isBack || row.isRough || !(row.meaning?.isSure ?? false),
    row: from.line,
    col: from.col,
  };
}

function readableCents({ paid, back }: ExpenseCells): number | null {
  if (typeof paid !== 'number' && typeof back !== 'number') return null;
  return (typeof paid === 'number' ? paid : 0) - (typeof back === 'number' ? back : 0);
}

/** Rows of the list that are no expense: totals, notes. null = an expense, or meant to be one. */
function rowBeside(cells: readonly string[], { name, dateCell, paid, back }: ExpenseCells): RowRead | null {
  if (dateCell !== '' && name !== '') return null;
  const label = totalLabel(cells);
  if (label !== undefined) return notData(isCarriedLabel(label) ? 'carried' : 'total');
  return paid === 'blank' && back === 'blank' && filled(cells) === 1 ? notData('note') : null;
}
