import { type Day, dayNumber } from '#shared/day.ts';
import type { RebuildFacts } from './facts.ts';
import { kaplanMeier, medianDays } from './kaplan-meier.ts';
import { hasOddDates } from './sets.ts';

/** How long vehicles wait for their sale; those that wait still are counted as such. */
export interface Wait {
  readonly n: number;
  readonly soldCount: number;
  readonly unsoldCount: number;
  /** Left otherwise than by sale: watched up to that day. */
  readonly otherExitCount: number;
  /** Days by which half are sold, with its 95 % interval; null = half never were, or not reached. */
  readonly median: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
}

/**
 * Days from bought to sold as `daysToSell` counts those from listed (definitions §7): by Kaplan and Meier, whatever was
 * bought by `asOf` and is unsold watched up to then. Out: no purchase day, days in an impossible order. Taking only the
 * sold ones would make holding a car look shorter than it is.
 */
export function daysHeldUntilSold(facts: readonly RebuildFacts[], asOf: Day): Wait {
  const members = facts.flatMap((one) => {
    const { boughtOn, exit } = one;
    if (boughtOn === null || boughtOn > asOf || hasOddDates(one)) return [];
    return [{ days: dayNumber(exit?.on ?? asOf) - dayNumber(boughtOn), isSold: exit?.kind === 'sold', exit }];
  });
  const curve = kaplanMeier(members);
  const { days, lower, upper } = medianDays(curve);
  const otherExitCount = members.filter(({ exit, isSold }) => exit !== null && !isSold).length;
  const { n, soldCount } = curve;
  return { n, soldCount, unsoldCount: n - soldCount - otherExitCount, otherExitCount, median: days, lower, upper };
}
