import { ceilProduct, compareFractions } from '#shared/exact.ts';
import { type Level, levelOf, rankAt } from '#shared/measures/level.ts';
import type { Overran } from '#shared/measures/reserves.ts';
import { LEVELS as LEVEL_NAMES } from '#shared/vocabulary.ts';
import type { RebuildFacts } from './facts.ts';
import { planned, plannedOutcomes } from './sets.ts';

export { type Level, levelOf, rankAt };

/** The levels shown: half, two thirds, four fifths, nine tenths. */
export const LEVELS: readonly Level[] = LEVEL_NAMES.map(levelOf);

export interface Contingency {
  readonly n: number;
  readonly level: Level;
  /** Which of the sorted overruns is taken. */
  readonly k: number;
  /** k/(n + 1): the chance that the next rebuild stays within. null = too few yet. */
  readonly guarantee: number | null;
  /** The overrun taken. null = too few yet: k is above n, whatever the values are. */
  readonly taken: Overran | null;
  /** `taken` as a fraction of the estimate; may be negative. null = too few yet. */
  readonly uplift: number | null;
}

/** Order of two overruns by their fraction, exactly. */
export function byOverrun(a: Overran, b: Overran): number {
  return compareFractions(a.overrunCents, a.estimateCents, b.overrunCents, b.estimateCents);
}

/**
 * Cushion that past rebuilds ask for (definitions §10, §18.3): of n sorted overruns o = (B − E)/E the k-th, k =
 * ceil((n + 1)·p/q), uninterpolated and free of any curve; the next like rebuild stays within it with probability
 * k/(n + 1) ≥ p/q (order statistics; exact unless values tie). k > n: null, never the maximum in its place.
 * Example: nine overruns at 4/5 take the eighth.
 */
export function contingency(set: readonly Overran[], level: Level): Contingency {
  const n = set.length;
  const k = rankAt(n, level);
  const taken = k > n ? null : (set.toSorted(byOverrun)[k - 1] ?? null);
  return {
    n,
    level,
    k,
    guarantee: taken && k / (n + 1),
    taken,
    uplift: taken && taken.overrunCents / taken.estimateCents,
  };
}

/** `contingency` over the shop's completed rebuilds with an estimate (set K), at each of the levels. */
export function contingencies(facts: readonly RebuildFacts[], levels: readonly Level[]): Contingency[] {
  const outcomes = plannedOutcomes(planned(facts));
  return levels.map((level) => contingency(outcomes, level));
}

/** The overrun taken as a figure to adopt: raised to a whole percent, exactly, and never below 0. */
export function wholePercent(taken: Overran): number {
  return taken.overrunCents <= 0 ? 0 : ceilProduct(100, taken.overrunCents, taken.estimateCents);
}
