import type { StatedTotal } from '#shared/contracts/import-reading.ts';

interface Sum {
  taken: number;
  aside: number;
  takenSince: number;
  asideSince: number;
}

/** A column whose totals are compared: cents, or seconds for hours. */
export interface SummedColumn {
  readonly col: number;
  readonly measure: StatedTotal['measure'];
  readonly read: (text: string) => number | null;
}

const MOST_KEPT = 2_000;
const GRAND = /grand|overall|gesamtsumme/i;

/**
 * Adds up what comes in per column, so that the totals that a file states can be held against it: each is compared
 * with the rows since the total before it, or with the whole file so far, whichever it means.
 */
export function columnSums(columns: readonly SummedColumn[], sheet = 1) {
  const sums = new Map<number, Sum>(
    columns.map(({ col }) => [col, { taken: 0, aside: 0, takenSince: 0, asideSince: 0 }]),
  );
  const stated: StatedTotal[] = [];
  let rows = 0;

  /** What a row holds in a column, and whether that came in. */
  function add(col: number, value: number, isTaken: boolean): void {
    const sum = sums.get(col);
    if (!sum) return;
    if (isTaken) {
      sum.taken += value;
      sum.takenSince += value;
    } else {
      sum.aside += value;
      sum.asideSince += value;
    }
  }

  /** Holds a row of totals against what came in. */
  function compare(cells: readonly string[], row: number, label: string): void {
    let isSubtotal = false;
    for (const { col, measure, read } of columns) {
      const value = read(cells[col - 1] ?? '');
      const sum = sums.get(col);
      if (value === null || !sum) continue;
      const isWhole = meansWhole(value, sum, label);
      isSubtotal ||= !isWhole;
      const imported = isWhole ? sum.taken : sum.takenSince;
      const putAside = isWhole ? sum.aside : sum.asideSince;
      if (stated.length < MOST_KEPT) {
        stated.push({
          sheet,
          row,
          col,
          label: label.trim(),
          measure,
          stated: value,
          imported,
          putAside,
          explanation: explain(value, imported, putAside),
        });
      }
    }
    for (const sum of sums.values()) sum.takenSince = sum.asideSince = 0;
  }

  /** Keeps a difference that was found elsewhere. */
  function note(total: Omit<StatedTotal, 'sheet'>): void {
    if (stated.length < MOST_KEPT) stated.push({ sheet, ...total });
  }

  /** Does an unlabelled row only repeat the sums of so many columns? One row alone is no sum. */
  function isTotal(cells: readonly string[], fewest: number): boolean {
    let agreeing = 0;
    if (rows < 2) return false;
    for (const { col, read } of columns) {
      const value = read(cells[col - 1] ?? '');
      if (value === null) continue;
      if (value !== sums.get(col)?.taken) return false;
      if (value !== 0) agreeing++;
    }
    return agreeing >= fewest;
  }

  /** A row of the table came in. */
  function row(): void {
    rows++;
  }

  return { add, row, compare, note, isTotal, stated: stated as readonly StatedTotal[] };
}

function meansWhole(value: number, sum: Sum, label: string): boolean {
  const fits = (taken: number, aside: number) => value === taken || value === taken + aside;
  if (fits(sum.takenSince, sum.asideSince)) return false;
  return fits(sum.taken, sum.aside) || GRAND.test(label) || sum.takenSince + sum.asideSince === 0;
}

/** Why a stated total and what came in agree or differ, in words. */
export function explain(value: number, imported: number, putAside: number): string {
  if (value === imported) return 'Agrees exactly.';
  if (value === imported + putAside) return 'The difference stands on rows that were put aside.';
  return putAside === 0
    ? 'The file’s own total differs from its own rows; nothing was put aside under it.'
    : 'The file’s own total differs from its own rows, even with those put aside.';
}

export type ColumnSums = ReturnType<typeof columnSums>;
