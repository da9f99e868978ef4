import type { Foreseen } from '#shared/vocabulary.ts';
import { fold } from '../cells/fold.ts';

// Meaning | words, tried in this order.
const DAMAGES: readonly (readonly [string, string])[] = [
  ['flood', 'flood water flooded wasser hochwasser'],
  ['fire', 'fire burn burnt burned brand feuer'],
  ['hail', 'hail hagel'],
  ['roof', 'roof roll rolled rollover dach uberschlag'],
  ['theft/vandalism', 'theft vandal vandalism stolen recovery stripped diebstahl'],
  ['mechanical', 'mechanical engine motor transmission blown trans electrical motorschaden getriebe'],
  ['front', 'front nose front end frontal front hit vorne'],
  ['rear', 'rear rear end ended back tail heck hinten'],
  ['side', 'side sides side swipe sideswipe t bone tboned door left right seite'],
];
const CLASSES: readonly (readonly [string, string])[] = [
  ['pickup', 'pickup truck pick up pritsche'],
  ['SUV', 'suv crossover 4x4 gelandewagen'],
  ['van', 'van minivan bus transporter'],
  ['sports', 'sports sport sportscar coupe roadster convertible sportwagen'],
  ['small car', 'small compact subcompact hatchback kleinwagen'],
  ['midsize car', 'midsize mid medium sedan mittelklasse'],
  ['large car', 'large full fullsize limousine'],
];

function reader(
  own: readonly string[],
  known: readonly (readonly [string, string])[],
): (text: string) => string | null {
  const byName = new Map(own.map((name) => [fold(name), name]));
  const meaningOf = (text: string) => {
    const words = new Set(fold(text).split(' '));
    return known.find(([, list]) => list.split(' ').some((word) => words.has(word)))?.[0] ?? null;
  };
  const byMeaning = new Map<string, string>();
  for (const name of own) {
    const meaning = meaningOf(name);
    if (meaning && !byMeaning.has(meaning)) byMeaning.set(meaning, name);
  }
  for (const name of own) byMeaning.set(name, name);
  return (text) => {
    const meaning = meaningOf(text);
    return byName.get(fold(text)) ?? (meaning === null ? null : (byMeaning.get(meaning) ?? null));
  };
}

/** Reads damage words into the shop's own; null = none of them. */
export const damageReader = (damages: readonly string[]) => reader(damages, DAMAGES);

/** Reads class words into the shop's own; null = none of them. */
export const classReader = (classes: readonly string[]) => reader(classes, CLASSES);

const YES = new Set(['y', 'yes', 'x', 'true', '1', 'ja', 'j', 'si', 'oui', 'o']);
const NO = new Set(['n', 'no', 'false', '0', 'nein', 'non']);
const SURPRISE = new Set(['surprise', 'unplanned', 'unforeseen', 'hidden', 'unexpected']);
const EXTRA = new Set(['extra', 'chosen extra', 'upgrade', 'want', 'optional']);
const PLANNED = new Set(['planned', 'foreseen', 'expected', 'estimated']);

/** Yes or no; null = neither. */
export function yesOrNo(text: string): boolean | null {
  const word = fold(text);
  return YES.has(word) ? true : NO.has(word) ? false : null;
}

/** What a word says of how a cost came about; `foreseen` null = nobody said. */
export function foreseenOf(text: string): { foreseen: Foreseen | null; isExtra: boolean } {
  const word = fold(text);
  if (EXTRA.has(word)) return { foreseen: null, isExtra: true };
  if (SURPRISE.has(word)) return { foreseen: 'surprise', isExtra: false };
  const answer = PLANNED.has(word) ? true : yesOrNo(text);
  return { foreseen: answer === null ? null : answer ? 'foreseen' : 'surprise', isExtra: false };
}
