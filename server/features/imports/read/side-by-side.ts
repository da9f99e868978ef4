import { type CellAside, type RowRead, taken } from './plan.ts';
import { filled } from './row-kinds.ts';
import { type SectionColumns, sectionColumns } from './section-columns.ts';

/** Two tables of one sheet beside each other: costs at the left and hours at the right, with a blank column between. */
export interface SideBySide {
  /** Where the right one begins, from 0. */
  readonly from: number;
  readonly left: SectionColumns;
  readonly right: SectionColumns;
}

/** The two tables that a row of headings begins; null = it begins one, or none. */
export function sideBySide(cells: readonly string[]): SideBySide | null {
  for (let at = 1; at < cells.length - 1; at++) {
    if ((cells[at] ?? '').trim() !== '') continue;
    const { left, right } = halves(cells, at + 1);
    const [ofLeft, ofRight] = [sectionColumns(left, false), sectionColumns(right, false)];
    if (ofLeft && ofRight) return { from: at + 1, left: ofLeft, right: ofRight };
  }
  return null;
}

/** A row as the left and as the right table see it: each with its own cells, at their places. */
export function halves(cells: readonly string[], from: number): { left: string[]; right: string[] } {
  return {
    left: cells.slice(0, from),
    right: cells.map((cell, at) => (at < from ? '' : cell)),
  };
}

/** What both halves of a row came to. Where one came in and the other did not, that one is put aside by its cell. */
export function together(cells: readonly string[], from: number, left: RowRead, right: RowRead): RowRead {
  const parts = [
    { read: left, first: 0 },
    { read: right, first: from },
  ].filter(({ first }) => filled(first === 0 ? cells.slice(0, from) : cells.slice(from)) > 0);
  const isTaken = parts.some(({ read }) => read.outcome === 'taken');
  const asides = parts.flatMap(({ read, first }) => [...read.cells, ...(isTaken ? asCell(read, first, cells) : [])]);
  if (isTaken) return { ...taken(parts.flatMap(({ read }) => read.lines)), cells: asides };
  const [one, other] = parts.map(({ read }) => read).sort((a) => (a.outcome === 'put aside' ? -1 : 1));
  const both = one?.outcome === 'put aside' && other?.outcome === 'put aside';
  const cents = both && other.cents !== null ? (one.cents ?? 0) + other.cents : (one?.cents ?? null);
  return { ...(one ?? left), cents, cells: asides };
}

function asCell({ outcome, reason, col, cents }: RowRead, first: number, cells: readonly string[]): CellAside[] {
  if (outcome !== 'put aside') return [];
  const at = col ?? cells.findIndex((cell, i) => i >= first && cell.trim() !== '') + 1;
  return [{ col: at, reason: reason as CellAside['reason'], text: (cells[at - 1] ?? '').slice(0, 200), cents }];
}
