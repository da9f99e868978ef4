import {
  BOUGHT_PER_YEAR,
  DAMAGE_TRAITS,
  DEMO_CLASSES,
  DEMO_DAMAGES,
  type DemoClass,
  type DemoDamage,
  FIRST_YEAR,
  IN_CARS_SHEET,
  IN_RECEIPTS_LIST,
} from './parameters.ts';
import { type Random, random } from './random.ts';

/** How a vehicle's story ends by the demo's today. */
export type Fate = 'sold' | 'parted out' | 'listed long' | 'listed' | 'in work';

/** One vehicle before anything is known of its money: what it is, what hit it, when it came and how it will end. */
export interface Slot {
  /** Place in the order of buying, from 0. */
  readonly index: number;
  readonly boughtYear: number;
  /** Position within the year's buys, 0–1. */
  readonly season: number;
  readonly class: DemoClass;
  readonly damage: DemoDamage;
  readonly wasSeen: boolean;
  readonly fate: Fate;
}

interface Kind extends Pick<Slot, 'class' | 'damage' | 'wasSeen'> {
  readonly fate: Fate;
}

/** The 64 vehicles in the order they were bought. */
export function slots(seed: number): Slot[] {
  const chance = random(seed, 'quota');
  const kinds = withFates(chance.shuffle(DEMO_DAMAGES.flatMap((damage) => kindsOf(damage, chance))));
  return inOrder(kinds, chance).map(({ kind, year, season }, index) => ({
    ...kind,
    index,
    boughtYear: year,
    season,
  }));
}

function kindsOf(damage: DemoDamage, chance: Random): Kind[] {
  const { quota, seen } = DAMAGE_TRAITS[damage];
  const classes = DEMO_CLASSES.flatMap((name, index) => Array.from({ length: quota[index] ?? 0 }, () => name));
  return chance
    .shuffle(classes)
    .map((name, index) => ({ class: name, damage, wasSeen: index < seen, fate: 'sold' as const }));
}

/** Two flooded ones and one that rolled are parted out; one flooded one finds no buyer; the dear ones are still in work. */
function withFates(kinds: readonly Kind[]): Kind[] {
  const result = [...kinds];
  const give = (fate: Fate, fits: (kind: Kind) => boolean) => {
    const index = result.findIndex((kind) => kind.fate === 'sold' && fits(kind));
    const kind = result[index];
    if (kind) result[index] = { ...kind, fate };
  };
  const isLarge = ({ class: name }: Kind) => name === 'standard SUV' || name === 'standard pickup';
  const isCrash = ({ damage }: Kind) => damage === 'front' || damage === 'side' || damage === 'rear';
  give('parted out', ({ damage }) => damage === 'flood');
  give('parted out', ({ damage }) => damage === 'flood');
  give('parted out', ({ damage }) => damage === 'rollover');
  give('listed long', ({ damage }) => damage === 'flood');
  give('listed', (kind) => isCrash(kind) && kind.class !== 'compact car');
  give('in work', (kind) => isCrash(kind) && isLarge(kind));
  give('in work', (kind) => isCrash(kind) && kind.class !== 'compact car');
  return result;
}

const UNSOLD_ORDER: readonly Fate[] = ['listed', 'in work'];

/** The unsold ones were bought this year; the parted-out ones neither this year nor in the years of the old sheets. */
function inOrder(kinds: readonly Kind[], chance: Random) {
  const places = BOUGHT_PER_YEAR.flatMap((count, index) =>
    Array.from({ length: count }, (_, place) => ({ year: FIRST_YEAR + index, season: (place + 0.5) / count })),
  );
  const lastCount = BOUGHT_PER_YEAR.at(-1) ?? 0;
  const sold = kinds.filter(({ fate }) => fate === 'sold');
  const old = sold.slice(0, IN_CARS_SHEET + IN_RECEIPTS_LIST);
  const long = kinds.filter(({ fate }) => fate === 'listed long');
  const unsold = UNSOLD_ORDER.flatMap((wanted) => kinds.filter(({ fate }) => fate === wanted));
  const soldThisYear = sold.slice(-(lastCount - unsold.length - long.length)).sort(byLengthOfWork);
  const middle = [
    ...sold.slice(old.length, sold.length - soldThisYear.length),
    ...kinds.filter(({ fate }) => fate === 'parted out'),
  ];
  const ordered = [...old, ...chance.shuffle(middle), ...long, ...soldThisYear, ...unsold];
  return places.map((place, index) => ({ ...place, kind: ordered[index] as Kind }));
}

/** This year's long jobs came first: else they would not be sold yet. */
function byLengthOfWork(one: Kind, other: Kind): number {
  return DAMAGE_TRAITS[other.damage].hours - DAMAGE_TRAITS[one.damage].hours;
}
