import { divideRounded } from '../money.ts';
import { quantileOfSorted } from './quantile.ts';
import { seeded } from './seeded.ts';
import { type Rate, wilson } from './wilson.ts';

/** How one past rebuild came out against what was expected of it. Cents; both expectations are above 0. */
export interface PastPair {
  readonly overrunCents: number;
  readonly estimateCents: number;
  readonly proceedsCents: number;
  readonly expectedSaleCents: number;
}

/** A bid sheet: what repair and sale are expected to come to, and the cautious figures that the bid was made with. */
export interface BidSheet {
  readonly planCents: number;
  readonly repairBudgetCents: number;
  readonly expectedSaleCents: number;
  readonly saleCents: number;
  /** What the walk-away bid leaves over beyond the wanted profit. */
  readonly leftCents: number;
}

export interface JointChance {
  /** Past rebuilds whose repair would have stayed within the budget. */
  readonly repair: Rate;
  /** … whose sale would have reached the figure of the sheet. */
  readonly sale: Rate;
  /** … both. */
  readonly both: Rate;
  /** … that would have brought the wanted profit: a good sale may pay for a dear repair. */
  readonly wanted: Rate;
  /** Profit beyond the wanted one, cents: 10th percentile, median, 90th. null = no past rebuild. */
  readonly beyondCents: { readonly p10: number; readonly p50: number; readonly p90: number } | null;
  /** 95 % interval of that median by resampling. null = fewer than two. */
  readonly medianInterval: { readonly lower: number; readonly upper: number } | null;
  readonly seed: number;
  readonly resampleCount: number;
}

const RESAMPLES = 2_000;

/**
 * Cushions stack: a cautious sale and a cautious repair budget together are more cautious than either (definitions
 * §11c). So each past rebuild's overrun and its sale ÷ expected sale are put on this sheet together, as they came, and
 * it is counted how often repair, sale, both and the wanted profit would have held; Wilson intervals. How sure the
 * median is: percentile bootstrap of whole pairs (Efron 1979), with the seed that it can be repeated by.
 * Example: plan 1,000, expected 5,000; a past 20 % over that sold at 0.9 counts as a repair of 1,200, a sale of 4,500.
 */
export function jointChance(pairs: readonly PastPair[], sheet: BidSheet, seed: number): JointChance {
  const outcomes = pairs.map((pair) => onSheet(pair, sheet));
  const rateOf = (holds: (one: (typeof outcomes)[number]) => boolean): Rate =>
    wilson(outcomes.filter(holds).length, outcomes.length);
  const beyond = Float64Array.from(outcomes, (one) => one.beyondCents).sort();
  const [p10, p50, p90] = [0.1, 0.5, 0.9].map((p) => quantileOfSorted(beyond, p));
  return {
    repair: rateOf((one) => one.isRepairHeld),
    sale: rateOf((one) => one.isSaleHeld),
    both: rateOf((one) => one.isRepairHeld && one.isSaleHeld),
    wanted: rateOf((one) => one.beyondCents >= 0),
    beyondCents: p10 == null || p50 == null || p90 == null ? null : { p10, p50, p90 },
    medianInterval: beyond.length < 2 ? null : medianInterval(beyond, seeded(seed)),
    seed,
    resampleCount: RESAMPLES,
  };
}

/** Past rebuilds whose sale would have reached the figure of the sheet: the chance that this figure stands for. */
export function saleChance(
  pairs: readonly PastPair[],
  { expectedSaleCents, saleCents }: Pick<BidSheet, 'expectedSaleCents' | 'saleCents'>,
): Rate {
  return wilson(pairs.filter((pair) => saleOf(pair, expectedSaleCents) >= saleCents).length, pairs.length);
}

/** The past rebuild's fortune on this sheet's figures, to the nearest cent. */
function onSheet(pair: PastPair, sheet: BidSheet) {
  const overCents = scaled(sheet.planCents, pair.overrunCents, pair.estimateCents);
  const spared = sheet.repairBudgetCents - sheet.planCents - overCents;
  const gained = saleOf(pair, sheet.expectedSaleCents) - sheet.saleCents;
  return { isRepairHeld: spared >= 0, isSaleHeld: gained >= 0, beyondCents: sheet.leftCents + spared + gained };
}

function saleOf(pair: PastPair, expectedSaleCents: number): number {
  return scaled(expectedSaleCents, pair.proceedsCents, pair.expectedSaleCents);
}

function scaled(cents: number, part: number, whole: number): number {
  return Number(divideRounded(BigInt(cents) * BigInt(part), BigInt(whole)));
}

function medianInterval(values: Float64Array, chance: () => number): JointChance['medianInterval'] {
  const drawn = new Float64Array(values.length);
  const medians = Float64Array.from({ length: RESAMPLES }, () => {
    for (let i = 0; i < drawn.length; i += 1) drawn[i] = values[Math.floor(chance() * values.length)] ?? 0;
    return quantileOfSorted(drawn.sort(), 0.5) ?? 0;
  }).sort();
  const [lower, upper] = [0.025, 0.975].map((p) => quantileOfSorted(medians, p));
  return lower == null || upper == null ? null : { lower, upper };
}
