import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { seeded } from '#shared/measures/seeded.ts';
import { contingency, LEVELS } from '../../server/domain/contingency.ts';
import { percentWithoutOne, twoPartWithoutOne } from '../../server/domain/leave-one-out.ts';
import type { PlannedOutcome } from '../../server/domain/sets.ts';
import { twoPartRule } from '../../server/domain/two-part-rule.ts';
import { inventPast } from '../support/invented-past.ts';

const LEVEL = { p: 4, q: 5 };

function outcomes(percents: readonly number[]): PlannedOutcome[] {
  return percents.map((percent, i) => {
    const day = { exitOn: '2026-01-01', boughtOn: null };
    return { id: `r${i}`, ...day, estimateCents: 100_000, overrunCents: percent * 1_000, surpriseCents: 0 };
  });
}
const without = <T>(set: readonly T[], i: number) => set.filter((_, at) => at !== i);

describe('one rebuild left out', () => {
  // By hand: of 1 to 10 % the ninth is taken, 9 %. Of the nine others the eighth: 9 % without one of 1 to 8 %, else 8 %.
  it('moves the percent rule to one of two neighbours', () => {
    const moves = percentWithoutOne(outcomes([1, 2, 3, 4, 5, 6, 7, 8, 9, 10]), LEVEL);
    expect([moves?.lowest.overrunCents, moves?.highest.overrunCents]).toEqual([8_000, 9_000]);
  });

  it('says too few where a level is only just attainable', () => {
    expect(percentWithoutOne(outcomes([1, 2, 3, 4]), LEVEL)).toBeNull();
    expect(percentWithoutOne([], LEVEL)).toBeNull();
    expect(twoPartWithoutOne(outcomes([1, 2, 3, 4]), LEVEL)).toBeNull();
    expect(twoPartWithoutOne([], LEVEL)).toBeNull();
    expect(twoPartWithoutOne(outcomes([5]), { p: 1, q: 2 })).toBeNull();
  });

  it('moves nothing where all are equal', () => {
    const moves = percentWithoutOne(outcomes([7, 7, 7, 7, 7, 7]), LEVEL);
    expect([moves?.lowest.overrunCents, moves?.highest.overrunCents]).toEqual([7_000, 7_000]);
    expect(twoPartWithoutOne(outcomes([7, 7, 7, 7, 7, 7]), LEVEL)).toEqual({
      creepPercent: { lowest: 7, highest: 7 },
      flatCents: { lowest: 0, highest: 0 },
    });
  });

  // The law itself: leave each out in turn and set the rule anew.
  it('is what setting both rules anew without each of them gives', () => {
    const sizes = fc.integer({ min: 2, max: 40 });
    fc.assert(
      fc.property(sizes, fc.integer({ min: 1, max: 1e6 }), fc.constantFrom(...LEVELS), (count, seed, level) => {
        const set = inventPast({ count, chance: seeded(seed) });
        const uplifts = set.map((_, i) => contingency(without(set, i), level).uplift);
        const moves = percentWithoutOne(set, level);
        const rates = moves && [moves.lowest, moves.highest].map((one) => one.overrunCents / one.estimateCents);
        const known = uplifts.filter((one) => one !== null);
        expect(rates).toEqual(known.length === count ? [Math.min(...known), Math.max(...known)] : null);

        const rules = set.map((_, i) => twoPartRule(without(set, i), level));
        const flats = rules.flatMap(({ flatCents }) => (flatCents === null ? [] : [flatCents]));
        const creeps = rules.flatMap(({ creepPercent }) => (creepPercent === null ? [] : [creepPercent]));
        expect(twoPartWithoutOne(set, level)).toEqual(
          flats.length === count
            ? {
                creepPercent: { lowest: Math.min(...creeps), highest: Math.max(...creeps) },
                flatCents: { lowest: Math.min(...flats), highest: Math.max(...flats) },
              }
            : null,
        );
      }),
      { numRuns: 200 },
    );
  });
});
