import { isFaulty } from '../cells/faulty-cells.ts';
import type { Column, Meaning } from '#shared/contracts/import-reading.ts';

/** Place of the first column with a meaning, from 0; −1 = none. */
export function placeOf(columns: readonly Column[], meaning: Meaning): number {
  return (columns.find((column) => column.meaning === meaning)?.col ?? 0) - 1;
}

/** What a cell calls a vehicle; a fault calls it nothing. */
function calledIn(cells: readonly string[], place: number): string {
  const cell = (cells[place] ?? '').trim();
  return isFaulty(cell) ? '' : cell;
}

/**
 * How rows name their vehicle in a list: one column of free text, or a stock number, or year, make and model side by
 * side. '' = the row names none.
 */
export function vehicleText(columns: readonly Column[]): (cells: readonly string[]) => string {
  const single = [placeOf(columns, 'vehicle'), placeOf(columns, 'stock number')].find((place) => place >= 0);
  if (single !== undefined) return (cells) => calledIn(cells, single);
  const places = (['year', 'make', 'model'] as const)
    .map((meaning) => placeOf(columns, meaning))
    .filter((place) => place >= 0);
  return (cells) =>
    places
      .map((place) => calledIn(cells, place))
      .join(' ')
      .trim();
}

/** In a list with stock numbers: what year, make and model beside them call the vehicle. null = nothing stands beside. */
export function besideNumber(columns: readonly Column[]): ((cells: readonly string[]) => string) | null {
  if (placeOf(columns, 'stock number') < 0 || placeOf(columns, 'vehicle') >= 0) return null;
  const own = columns.filter(({ meaning }) => meaning === 'year' || meaning === 'make' || meaning === 'model');
  return own.length === 0 ? null : vehicleText(own);
}

/** What a row with a vehicle of its own calls it: its stock number, else its text, else year, make and model. */
export function vehicleName(columns: readonly Column[]): (cells: readonly string[]) => string {
  const single = [placeOf(columns, 'stock number'), placeOf(columns, 'vehicle')].find((place) => place >= 0);
  if (single !== undefined) return (cells) => calledIn(cells, single);
  const model = placeOf(columns, 'model');
  const parts = [placeOf(columns, 'year'), placeOf(columns, 'make'), model].filter((place) => place >= 0);
  return (cells) =>
    calledIn(cells, model) === ''
      ? ''
      : parts
          .map((place) => calledIn(cells, place))
          .join(' ')
          .trim();
}
