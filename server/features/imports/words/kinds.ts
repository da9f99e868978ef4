import type { Foreseen } from '#shared/vocabulary.ts';
import { fold } from '../cells/fold.ts';

// Meaning | words, tried in this order.
const DAMAGES: readonly (readonly [string, string])[] = [
  ['flood', 'flood water flooded wasser hochwasser wasserschaden inundado inundacion agua inonde inondation eau'],
  ['fire', 'fire burn burnt burned brand feuer brandschaden incendio quemado incendie brule'],
  ['hail', 'hail hagel hagelschaden granizo grele'],
  ['roof', 'roof roll rolled rollover dach dachschaden uberschlag vuelco volcado techo toit tonneau'],
  [
    'theft/vandalism',
    'theft vandal vandalism vandalized stolen recovery stripped diebstahl gestohlen robo robado vol vole',
  ],
  [
    'mechanical',
    'mechanical engine motor transmission blown trans electrical motorschaden getriebe getriebeschaden mecanico averia mecanique moteur panne',
  ],
  ['front', 'front nose frontal vorne frontschaden delantero delantera frente avant frontale'],
  ['rear', 'rear rearend rearended back tail heck hinten heckschaden trasero trasera arriere'],
  [
    'side',
    'side sides swipe sideswipe tbone tboned bone door left right seite seitenschaden lateral laterales lado cote laterale gauche droite',
  ],
];
const CLASSES: readonly (readonly [string, string])[] = [
  ['pickup', 'pickup truck pick up pritsche'],
  ['SUV', 'suv crossover 4x4 gelandewagen todoterreno'],
  ['van', 'van minivan bus transporter furgoneta monospace fourgon utilitaire kastenwagen monovolumen'],
  ['sports', 'sports sport sportscar coupe roadster convertible sportwagen'],
  ['small car', 'small compact subcompact hatchback hatch kleinwagen utilitario citadine pequeno'],
  ['midsize car', 'midsize mid medium sedan mittelklasse berlina berline kombi break'],
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

const YES = new Set(['y', 'yes', 'x', 'true', '1', 'ja', 'j', 'si', 's', 'oui', 'o', 'ok', 'sure', 'yep']);
const NO = new Set(['n', 'no', 'false', '0', 'nein', 'non']);
const SURPRISE = new Set(
  'surprise unplanned unforeseen hidden unexpected ungeplant uberraschung sorpresa imprevisto imprevu surprise!'.split(
    ' ',
  ),
);
const EXTRA = new Set(['extra', 'chosen extra', 'upgrade', 'want', 'optional']);
const PLANNED = new Set('planned foreseen expected estimated geplant vorgesehen previsto planeado prevu'.split(' '));

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
