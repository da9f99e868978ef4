import { isFaulty } from '../cells/faulty-cells.ts';
import type { CellAside, RowRead } from './plan.ts';

// A formula that holds words of its own, or refers to nothing, is a text: it is kept as it stands, and never run.
const saysNothing = (cell: string) =>
  isFaulty(cell) && !cell.includes('"') && !(cell.startsWith('=') && !/\p{L}/u.test(cell));

/** A row that came in, with its texts (columns from 1; 0 = none) that hold a spreadsheet's fault put aside. */
export function withoutFaulty(read: RowRead, cells: readonly string[], cols: readonly number[]): RowRead {
  if (read.outcome !== 'taken') return read;
  const faulty = cols.flatMap((col): CellAside[] => {
    const text = (cells[col - 1] ?? '').trim();
    return saysNothing(text) ? [{ col, reason: 'bad-value', text, cents: null }] : [];
  });
  return faulty.length === 0 ? read : { ...read, cells: [...read.cells, ...faulty] };
}

/** What a cell says in words, as it is kept; null = nothing, or a spreadsheet's fault. */
export const keptText = (cell: string): string | null =>
  saysNothing(cell) ? null : cell.trim().normalize('NFC') || null;
