/** What kind of shop Pennywhistle Yard is, in figures. Money in dollars, shares of a vehicle's clean value as fractions. */

export const DEMO_TODAY = '2026-12-15';
/** The yard began its first vehicle in this year. */
export const FIRST_YEAR = 2021;
/** Vehicles bought per year, from the first on: 64 in all. */
export const BOUGHT_PER_YEAR = [6, 9, 11, 12, 14, 12] as const;
/** The oldest vehicles stand only in old spreadsheets: seven in a sheet of vehicles, then two in a list of receipts. */
export const IN_CARS_SHEET = 7;
export const IN_RECEIPTS_LIST = 2;

export const DEMO_CLASSES = [
  'compact car',
  'midsize car',
  'small SUV',
  'standard SUV',
  'minivan',
  'standard pickup',
] as const;
export type DemoClass = (typeof DEMO_CLASSES)[number];

export const DEMO_DAMAGES = ['front', 'rear', 'side', 'hail', 'theft', 'flood', 'rollover', 'fire'] as const;
export type DemoDamage = (typeof DEMO_DAMAGES)[number];

interface ClassTraits {
  /** Median value undamaged, in the first year. */
  readonly clean: number;
  readonly logSd: number;
  /** Added to the share of clean value that a rebuilt one fetches. */
  readonly priceShift: number;
  readonly listingDays: number;
  readonly hoursFactor: number;
}

export const CLASS_TRAITS: Readonly<Record<DemoClass, ClassTraits>> = {
  'compact car': { clean: 12_500, logSd: 0.15, priceShift: -0.01, listingDays: 32, hoursFactor: 0.9 },
  'midsize car': { clean: 15_000, logSd: 0.16, priceShift: 0, listingDays: 34, hoursFactor: 1 },
  'small SUV': { clean: 17_500, logSd: 0.15, priceShift: 0.02, listingDays: 22, hoursFactor: 1 },
  'standard SUV': { clean: 24_000, logSd: 0.16, priceShift: -0.01, listingDays: 42, hoursFactor: 1.1 },
  minivan: { clean: 16_500, logSd: 0.15, priceShift: 0.01, listingDays: 28, hoursFactor: 1 },
  'standard pickup': { clean: 23_000, logSd: 0.18, priceShift: 0.02, listingDays: 26, hoursFactor: 1.1 },
};

interface DamageTraits {
  /** Vehicles per class, in the order of `DEMO_CLASSES`. */
  readonly quota: readonly [number, number, number, number, number, number];
  /** How many of them were seen before buying. */
  readonly seen: number;
  readonly priceOff: number;
  readonly hammer: number;
  readonly plan: number;
  readonly hours: number;
  readonly listing: number;
  /** Surprises per vehicle that was seen; 2.1 times as many unseen. */
  readonly surprises: number;
  readonly surpriseDollars: number;
}

const traits = (
  quota: DamageTraits['quota'],
  [seen, priceOff, hammer, plan, hours, listing, surprises, surpriseDollars]: readonly [
    number,
    number,
    number,
    number,
    number,
    number,
    number,
    number,
  ],
): DamageTraits => ({ quota, seen, priceOff, hammer, plan, hours, listing, surprises, surpriseDollars });

export const DAMAGE_TRAITS: Readonly<Record<DemoDamage, DamageTraits>> = {
  front: traits([4, 5, 5, 1, 2, 3], [5, 0.28, 0.315, 0.12, 78, 1, 0.4, 520]),
  rear: traits([2, 2, 2, 0, 1, 1], [4, 0.26, 0.365, 0.085, 54, 1, 0.22, 380]),
  side: traits([2, 2, 2, 1, 0, 1], [4, 0.28, 0.34, 0.1, 66, 1, 0.26, 430]),
  hail: traits([1, 1, 2, 1, 1, 2], [7, 0.19, 0.5, 0.07, 26, 0.8, 0.1, 200]),
  theft: traits([1, 1, 2, 0, 0, 2], [3, 0.2, 0.5, 0.05, 28, 0.9, 0.28, 450]),
  flood: traits([2, 2, 2, 0, 1, 1], [5, 0.35, 0.21, 0.05, 60, 1.8, 0.6, 800]),
  rollover: traits([0, 0, 1, 1, 0, 1], [1, 0.36, 0.215, 0.16, 105, 1.4, 0.45, 700]),
  fire: traits([1, 1, 0, 0, 1, 0], [2, 0.36, 0.24, 0.12, 80, 1.4, 0.45, 650]),
};

/** Buyer's fee by hammer price: the fee of the last step reached, plus the flat part. */
export const FEE_STEPS = [
  [0, 90],
  [1_000, 260],
  [2_000, 390],
  [3_000, 470],
  [4_000, 540],
  [5_000, 620],
  [6_000, 690],
  [8_000, 780],
  [10_000, 880],
  [15_000, 1_050],
] as const;
export const FEE_FLAT = 189;

export function buyersFee(hammer: number): number {
  const step = FEE_STEPS.findLast(([from]) => from <= hammer);
  return (step?.[1] ?? 0) + FEE_FLAT;
}

/** The helper does this share of the hours, and is paid by the hour: a little more each year. */
export const HELPER_SHARE = 0.38;
export function helperWageCents(year: number): number {
  return 1_900 + 80 * (year - FIRST_YEAR);
}

/** Cover while a vehicle is owned, and what the money tied up in it costs a year. */
export const COVER_PER_30_DAYS = 38;
export const INTEREST_RATE = 0.085;
