import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { daysToSell } from '../../server/domain/days-to-sell.ts';
import { kaplanMeier, medianDays, type Observation, unsoldAt } from '../../server/domain/kaplan-meier.ts';
import { logRank } from '../../server/domain/log-rank.ts';
import { addDays } from '#shared/day.ts';
import { buildRebuild, sale } from '../support/facts.ts';

const sold = (...days: number[]): Observation[] => days.map((day) => ({ days: day, isSold: true }));
const unsold = (...days: number[]): Observation[] => days.map((day) => ({ days: day, isSold: false }));
const watched = fc.array(fc.record({ days: fc.nat({ max: 200 }), isSold: fc.boolean() }), { maxLength: 40 });

// Published tables are checked in tests/reference.
describe('the curve of those still unsold', () => {
  it('is the plain share when everything sold', () => {
    fc.assert(
      fc.property(fc.array(fc.nat({ max: 200 }), { minLength: 1, maxLength: 40 }), (days) => {
        for (const { days: day, unsold: share } of kaplanMeier(sold(...days)).points) {
          expect(share).toBeCloseTo(days.filter((other) => other > day).length / days.length, 12);
        }
      }),
    );
  });

  it('falls, stays within its limits, and does not depend on order', () => {
    fc.assert(
      fc.property(watched, (list) => {
        const curve = kaplanMeier(list);
        expect(kaplanMeier(list.toReversed())).toEqual(curve);
        let before = 1;
        for (const { unsold: share, lower, upper } of curve.points) {
          expect(share).toBeLessThan(before);
          expect(lower ?? 0).toBeLessThanOrEqual(share);
          expect(upper ?? 1).toBeGreaterThanOrEqual(share);
          before = share;
        }
      }),
    );
  });

  it('one lost sight of on the day of a sale was still there to be sold', () => {
    expect(kaplanMeier([...sold(5), ...unsold(5, 9)]).points).toMatchObject([
      { days: 5, atRiskCount: 3, unsold: 1 - 1 / 3 },
    ]);
  });

  it('of nothing, and of nothing sold, has no point and no median', () => {
    expect(kaplanMeier([])).toEqual({ n: 0, soldCount: 0, points: [], longestDays: null });
    expect(medianDays(kaplanMeier([]))).toEqual({ days: null, lower: null, upper: null });
    expect(medianDays(kaplanMeier(unsold(3, 4))).days).toBeNull();
  });

  it('a vehicle may sell on the day it was listed', () => {
    expect(medianDays(kaplanMeier(sold(0, 0, 0)))).toEqual({ days: 0, lower: null, upper: null });
  });
});

describe('the share unsold at a day', () => {
  const curve = kaplanMeier([...sold(10, 40), ...unsold(20, 50)]);
  it('is 1 before the first sale and nobody knows beyond the longest time watched', () => {
    expect(unsoldAt(curve, 9)).toEqual({ unsold: 1, lower: null, upper: null });
    expect(unsoldAt(curve, 10).unsold).toBe(0.75);
    expect(unsoldAt(curve, 50).unsold).toBe(0.375);
    expect(unsoldAt(curve, 51)).toEqual({ unsold: null, lower: null, upper: null });
    expect(unsoldAt(kaplanMeier([]), 0)).toEqual({ unsold: null, lower: null, upper: null });
  });

  it('stays 0 once everything sold', () => {
    expect(unsoldAt(kaplanMeier(sold(10, 20)), 90)).toEqual({ unsold: 0, lower: null, upper: null });
  });
});

describe('two classes compared', () => {
  it('those who left before the first sale change nothing', () => {
    const [a, b] = [sold(9, 13, 18, 23), sold(5, 5, 8, 12)];
    const one = logRank(a, b);
    expect(logRank([...a, ...unsold(1, 2, 2)], [...b, ...unsold(3, 4)])).toEqual(one);
  });

  it('is the same the other way round', () => {
    fc.assert(
      fc.property(watched, watched, (a, b) => {
        const [one, other] = [logRank(a, b), logRank(b, a)];
        expect(other?.observedA).toBe(one?.observedB);
        expect(other?.expectedA ?? 0).toBeCloseTo(one?.expectedB ?? 0, 9);
        expect(other?.variance ?? 0).toBeCloseTo(one?.variance ?? 0, 9);
      }),
    );
  });

  it('says nothing without a sale, and has no test without a choice', () => {
    expect(logRank(unsold(1), unsold(2))).toBeNull();
    expect(logRank(sold(1), [])).toMatchObject({ variance: 0, chiSquare: null, p: null });
  });
});

describe('days to sell of the shop', () => {
  const listed = (id: string, kind: string | null, days: number | null) => {
    const exit = days === null ? null : sale(addDays('2025-03-10', days), 1);
    return buildRebuild({ id, class: kind, exit });
  };
  const facts = [
    listed('1', 'van', 5),
    listed('2', 'SUV', 9),
    listed('3', 'SUV', null),
    listed('4', 'car', 7),
    listed('5', null, 3),
  ];

  it('gives all and each class by name, and compares the two largest, of equals the first by name', () => {
    const one = daysToSell(facts, '2025-06-30');
    expect(one.overall).toMatchObject({ n: 5, soldCount: 4, isThin: true, median: { days: 7 } });
    expect(one.classes.map((group) => [group.class, group.n])).toEqual([
      ['SUV', 2],
      ['car', 1],
      ['van', 1],
    ]);
    expect(one.comparison).toMatchObject({ classA: 'SUV', classB: 'car', nA: 2, nB: 1 });
    expect(one.noClassCount).toBe(1);
  });

  it('has no comparison of one class, and nothing of nothing', () => {
    expect(daysToSell(facts.slice(1, 3), '2025-06-30').comparison).toBeNull();
    expect(daysToSell([], '2025-06-30')).toMatchObject({
      overall: { n: 0, at30: { unsold: null } },
      classes: [],
      comparison: null,
    });
  });
});
