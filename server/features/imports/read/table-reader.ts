import type { StatedTotal } from '#shared/contracts/import-reading.ts';
import { readHours } from '../cells/hours.ts';
import { expenseRowReader } from './expense-row.ts';
import { hoursGridReader, weekdayColumns } from './hours-grid.ts';
import { hoursRowReader } from './hours-row.ts';
import { looseRowReader } from './loose-row.ts';
import { notData, type Plan, type RowRead, type RowReader } from './plan.ts';
import { isBlank, rowOutsideTable } from './row-kinds.ts';
import { type ColumnSums, columnSums, type SummedColumn } from './sums.ts';
import { type CarriedFigures, vehicleRowReader } from './vehicle-row.ts';
import { vehicleSheetReader } from './vehicle-sheet.ts';

/**
 * Reads the rows of one sheet in order, each as what it is; `stated` fills with the totals that the sheet states.
 * `carried` is shared by the sheets of a file: what earlier ones said of vehicles that a later one carries on.
 */
export function tableReader(
  plan: Plan,
  carried: CarriedFigures = new Map(),
): {
  read: (cells: readonly string[], line: number, isMalformed: boolean) => RowRead;
  stated: readonly StatedTotal[];
} {
  const sums = columnSums(summedColumns(plan), plan.sheet.number);
  const inside = readerOf(plan, sums, carried);
  const outside = rowOutsideTable(plan);
  return {
    read: (cells, line, isMalformed) => leftOut(plan, line) ?? outside(cells, line, isMalformed) ?? inside(cells, line),
    stated: sums.stated,
  };
}

/** A row that a person left out; blank ones stay blank. */
const leftOut = ({ sheet }: Plan, line: number): RowRead | null =>
  sheet.leftOut?.has(line) && !isBlank(sheet.rawRow?.(line) ?? []) ? notData('left out') : null;

function readerOf(plan: Plan, sums: ColumnSums, carried: CarriedFigures): RowReader {
  if (plan.shape === null) return looseRowReader(plan);
  if (plan.shape === 'vehicle sheet') return vehicleSheetReader(plan, sums);
  if (plan.shape === 'vehicles') return vehicleRowReader(plan, sums, carried);
  if (plan.shape === 'expenses') return expenseRowReader(plan, sums);
  return weekdayColumns(plan).length > 1 ? hoursGridReader(plan, sums) : hoursRowReader(plan, sums);
}

function summedColumns(plan: Plan): SummedColumn[] {
  const money = (text: string) => {
    const value = plan.money(text, true);
    return typeof value === 'number' ? value : null;
  };
  const hours = (text: string) => {
    const value = readHours(text);
    return typeof value === 'number' ? value : null;
  };
  const repeated = new Map(plan.repeated.map((column) => [column.col, column]));
  return plan.columns.flatMap(({ col, meaning, why }): SummedColumn[] => {
    const repeats = repeated.get(col);
    if (repeats) return [repeats];
    if (meaning === 'hours' || meaning === 'estimated hours') return [{ col, measure: 'hours', read: hours }];
    const isCompared =
      ['amount', 'credit', 'purchase', 'cost', 'estimate', 'sale'].includes(meaning) ||
      (meaning === 'derived' && why.includes('sum'));
    return isCompared ? [{ col, measure: 'money', read: money }] : [];
  });
}
