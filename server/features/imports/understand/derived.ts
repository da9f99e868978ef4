import type { Column } from '#shared/contracts/import-reading.ts';
import type { moneyReader } from '../cells/money.ts';
import type { Head } from './head.ts';

const ENOUGH_ROWS = 3;
const MOST = 0.8;

/**
 * Finds columns that only repeat other columns of their row: the sum of its costs, the sale less that sum. They are
 * known by arithmetic, whatever their heading says; the unknown ones are marked so and never imported.
 */
export function markDerived(columns: readonly Column[], head: Head, money: ReturnType<typeof moneyReader>): Column[] {
  const costs = columns.filter((column) => column.meaning === 'cost' || column.meaning === 'purchase');
  const sale = columns.find((column) => column.meaning === 'sale');
  const cents = (row: readonly string[], col: number) => {
    const value = money(row[col - 1] ?? '', true);
    return typeof value === 'number' ? value : 0;
  };
  const sums = head.below.map(({ cells }) => costs.reduce((sum, column) => sum + cents(cells, column.col), 0));
  const sales = head.below.map(({ cells }) => (sale ? cents(cells, sale.col) : 0));
  const agrees = (column: Column, expected: (i: number) => number) => {
    const filled = head.below
      .map((row, i) => ({ value: money(row.cells[column.col - 1] ?? '', true), i }))
      .filter(({ value }) => typeof value === 'number');
    const right = filled.filter(({ value, i }) => Math.abs((value as number) - expected(i)) <= 1).length;
    return filled.length >= ENOUGH_ROWS && right >= filled.length * MOST;
  };
  return columns.map((column) => {
    if (column.meaning !== 'ignore' && column.meaning !== 'derived') return column;
    const isSum = agrees(column, (i) => sums[i] ?? 0);
    if (!isSum && !agrees(column, (i) => (sales[i] ?? 0) - (sums[i] ?? 0))) return column;
    return {
      ...column,
      meaning: 'derived',
      category: null,
      why: isSum ? SUM_OF_COSTS : 'It equals the sale less the costs of its row.',
    };
  });
}

/** Said of a column that adds up the costs of its row; its own total is compared with all costs. */
export const SUM_OF_COSTS = 'It equals the sum of the costs of its row.';
