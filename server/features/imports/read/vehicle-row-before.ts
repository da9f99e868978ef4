import type { Meaning } from '#shared/contracts/import-reading.ts';
import type { ExistingRebuild } from '../books.ts';
import type { PastCell } from '../earlier/past.ts';
import type { EarlierRow } from '../earlier/settle-earlier.ts';
import type { Plan } from './plan.ts';
import type { Figure, VehicleCells } from './vehicle-cells.ts';

/** What the row of a vehicle that came in before says that is not booked yet. */
export interface FreshCells {
  readonly row: VehicleCells;
  readonly replaces: readonly PastCell[];
  /** Facts of the rebuild that the row says anew, in place of those that the books hold. */
  readonly overwrites: readonly string[];
  readonly isEmpty: boolean;
}

type Read = (cells: readonly string[]) => VehicleCells;
const ADDED_UP = new Set<Meaning>(['cost', 'hours', 'purchase', 'sale']);
const FIELDS: Partial<Record<Meaning, string>> = {
  purchase: 'purchaseCents',
  sale: 'saleCents',
  asking: 'askingCents',
};

/** Reads only the cells that are new, or that a person wants in place of what is booked, or beside it. */
export function freshCells(
  plan: Plan,
  read: Read,
  cells: readonly string[],
  { earlier, existing }: { earlier: EarlierRow; existing: ExistingRebuild },
): FreshCells {
  const meanings = new Map(plan.columns.map((column) => [column.col, column.meaning]));
  const wanted = [...earlier.cells].filter(
    ([col, { decision }]) => decision === 'new' || (decision === 'both' && ADDED_UP.has(meanings.get(col) ?? 'ignore')),
  );
  const only = (cols: ReadonlySet<number>) => read(cells.map((cell, at) => (cols.has(at + 1) ? cell : '')));
  const row = settledByBooks(only(new Set(wanted.map(([col]) => col))), existing, earlier);
  const changed = wanted.filter(([, { isAdded }]) => !isAdded);
  const overwrites = changed.flatMap(([col, { decision }]) => {
    const { known, dates, figures } = only(new Set([col]));
    const facts = figures.flatMap(({ column }) => FIELDS[column.meaning] ?? []);
    return decision === 'new' ? [...facts, ...Object.keys(known), ...Object.keys(dates)] : facts;
  });
  const replaces = changed.flatMap(([, { decision, oldCol }]) =>
    decision === 'new' && oldCol !== null ? earlier.from.map((from) => ({ ...from, col: oldCol })) : [],
  );
  const isEmpty =
    row.figures.length + row.asides.length + replaces.length === 0 &&
    Object.keys(row.known).length + Object.keys(row.dates).length === 0;
  return { row, replaces, overwrites, isEmpty };
}

/** A locked plan, and a purchase or sale that was entered by hand meanwhile, stand; the cell is put aside. */
function settledByBooks(row: VehicleCells, existing: ExistingRebuild, { cells }: EarlierRow): VehicleCells {
  const isHeld = ({ column: { meaning, col } }: Figure) => {
    if (meaning === 'estimate' || meaning === 'estimated hours') return existing.hasBaseline;
    if (!cells.get(col)?.isAdded) return false;
    return (meaning === 'purchase' && existing.hasPurchase) || (meaning === 'sale' && existing.hasLeft);
  };
  const held = row.figures.filter(isHeld);
  const asides = held.map(({ column: { col, heading }, cents }) => ({
    col,
    reason: 'duplicate' as const,
    text: heading,
    cents: cents || null,
  }));
  return { ...row, figures: row.figures.filter((figure) => !isHeld(figure)), asides: [...row.asides, ...asides] };
}
