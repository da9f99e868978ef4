import { bands, isWithin } from './bands.ts';
import { measured } from './facts.ts';
import { demoBook } from './generate.ts';
import { lessons } from './lessons.ts';
import { DEMO_TODAY } from './parameters.ts';

/** What a seed fails, by name. Nothing = the demo may use it. */
export function failures(seed: number): string[] {
  const book = demoBook(seed);
  const data = measured(book);
  const isFuture = data.facts.some(({ exit, listedOn }) => (exit?.on ?? listedOn ?? '') > DEMO_TODAY);
  return [
    ...bands(data)
      .filter((band) => !isWithin(band))
      .map(({ name }) => name),
    ...lessons(data)
      .filter(({ holds }) => !holds)
      .map(({ name }) => name),
    ...(isFuture ? ['something happens after today'] : []),
    ...(book.planted.size < PLANTED ? ['a flaw found no place'] : []),
  ];
}

/** Kinds of flaws that the scenario wants. */
const PLANTED = 14;
