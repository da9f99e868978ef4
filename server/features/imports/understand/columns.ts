import type { Column } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import type { ColumnFacts } from './column-facts.ts';
import { type CategoryReader, ignored } from './guess.ts';
import { guessOfList } from './list-columns.ts';
import { guessOfVehicles } from './vehicle-row-columns.ts';

/** Guesses what each column holds in a sheet of this shape. Every guess says why. */
export function guessColumns(
  all: readonly ColumnFacts[],
  shape: Shape,
  categoryOf: CategoryReader,
  known: { readonly sheet: number; readonly thisYear: number },
): Column[] {
  const guesses = shape === 'vehicles' ? guessOfVehicles(all, categoryOf) : guessOfList(all, shape, known.thisYear);
  return all.map((facts, i) => ({
    sheet: known.sheet,
    col: facts.col,
    heading: facts.heading,
    samples: [...facts.samples],
    ...(guesses[i] ?? ignored('The heading is not known.')),
  }));
}
