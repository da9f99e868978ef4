import type { Hint } from '#shared/contracts/import-beside.ts';
import type { Aside, Line, Reading } from '#shared/contracts/import-reading.ts';
import type { ImportRow } from '#shared/contracts/imports.ts';
import { rowKey } from '../place.ts';

/** What the reading says about places of the file, ready to be looked up row by row. */
export interface Facts {
  readonly asides: ReadonlyMap<string, readonly Aside[]>;
  readonly hints: ReadonlyMap<string, readonly Hint[]>;
}

/** Asides and hints by row. */
export function factsOf(reading: Reading): Facts {
  return { asides: byRow(reading.asides), hints: byRow(reading.hints) };
}

function byRow<T extends { sheet: number; row: number }>(all: readonly T[]): Map<string, T[]> {
  const found = new Map<string, T[]>();
  for (const one of all) {
    const key = rowKey(one);
    const known = found.get(key);
    if (known) known.push(one);
    else found.set(key, [one]);
  }
  return found;
}

/** How one cell ended: at fault, read as a figure, read as a guess, or neither. */
export type CellMark = 'fault' | 'guess' | 'read' | 'plain';

/** The mark of a cell. A row that is put aside as a whole has no cell at fault, unless its reason names one. */
export function markOf(lines: readonly Line[], asides: readonly Aside[], col: number): CellMark {
  if (asides.some((aside) => aside.col === col)) return 'fault';
  const own = lines.filter((line) => line.col === col);
  if (own.length === 0) return 'plain';
  return own.some((line) => line.isGuess) ? 'guess' : 'read';
}

/** The cells that someone would put right first, by their columns. */
export const faultyCols = (asides: readonly Aside[]): number[] =>
  [...new Set(asides.flatMap(({ cols }) => cols))].toSorted((a, b) => a - b);

/** Widths of the grid's columns in characters: wide enough for nine in ten cells, within bounds. */
export function widthsOf(rows: readonly ImportRow[], headings: readonly string[]): number[] {
  const count = Math.max(headings.length, ...rows.map((row) => row.cells.length));
  const sample = rows.slice(0, 200).filter((row) => row.outcome === 'taken' || row.outcome === 'put aside');
  return Array.from({ length: count }, (_, at) => {
    const lengths = sample.map((row) => row.cells[at]?.trim().length ?? 0).toSorted((a, b) => a - b);
    const usual = lengths[Math.floor(lengths.length * 0.9)] ?? 0;
    return Math.min(24, Math.max(8, usual, Math.min(headings[at]?.length ?? 0, 18)));
  });
}
