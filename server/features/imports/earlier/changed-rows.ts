import type { Plan } from '../read/plan.ts';
import type { ChangedCell, ChangeKind } from './changed-cells.ts';
import type { SheetMatch, Twin } from './match-rows.ts';

/** What is done with a row, or a cell, that is not what it was: keep what is booked, take the new for it, count both. */
export type Decision = 'keep' | 'new' | 'both';

/** A row that looks like one of then with something changed. */
export interface ChangedRow {
  readonly plan: Plan;
  readonly line: number;
  readonly twin: Twin;
  readonly now: readonly string[];
  readonly cells: readonly ChangedCell[];
}

/** How much of an earlier sheet stands in today's files. */
export interface Share {
  readonly match: SheetMatch;
  readonly sameRows: number;
  readonly changedRows: number;
  /** Half of it does. Else its few equal rows may have happened again, and rows like others are rows of their own. */
  readonly isSure: boolean;
}

const ORDER: readonly ChangeKind[] = ['amount', 'place', 'date', 'text'];

/** A row is asked about as a whole, by what weighs most of its changes. */
export const mainKind = (cells: readonly ChangedCell[]): ChangeKind =>
  ORDER.find((kind) => cells.some((cell) => cell.kind === kind)) ?? 'text';
