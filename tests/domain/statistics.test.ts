import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mean, median, quantile, ratio, sampleDeviation, tInterval, wilson } from '../../server/domain/statistics.ts';

const value = fc.integer({ min: -1e9, max: 1e9 });
const values = fc.array(value, { minLength: 1, maxLength: 40 });

// Published figures are checked in tests/reference; here the laws and the edges.
describe('of nothing, of one, of equals', () => {
  it('nothing has no figure', () => {
    expect([mean([]), median([]), quantile([], 0.5), sampleDeviation([]), ratio(3, 0), ratio(3, -1)]).toEqual(
      Array(6).fill(null),
    );
    expect(wilson(0, 0)).toEqual({ n: 0, x: 0, rate: null, lower: null, upper: null });
  });

  it('one value is its own middle and has no spread', () => {
    expect([mean([7]), median([7]), quantile([7], 0.1), sampleDeviation([7])]).toEqual([7, 7, 7, null]);
    expect(tInterval(7, null, 1)).toBeNull();
  });

  it('equal values have a spread of exactly 0 and an interval of one point', () => {
    expect(sampleDeviation([0.1, 0.1, 0.1])).toBe(0);
    expect(tInterval(0.1, 0, 3)).toEqual({ lower: 0.1, upper: 0.1 });
  });

  it('an even number has the mean of the middle two', () => expect(median([4, 1, 3, 2])).toBe(2.5));

  // Type 7, worked by hand: h = 3 · 0.25 + 1 = 1.75.
  it('a quantile interpolates', () => expect(quantile([1, 2, 3, 4], 0.25)).toBe(1.75));
});

describe('laws', () => {
  it('order does not matter, and nothing is changed in place', () => {
    fc.assert(
      fc.property(values, (list) => {
        const before = [...list];
        const turned = list.toReversed();
        expect(median(turned)).toBe(median(list));
        expect(quantile(turned, 0.75)).toBe(quantile(list, 0.75));
        expect(list).toEqual(before);
      }),
    );
  });

  it('a quantile lies between the ends and rises with its share', () => {
    fc.assert(
      fc.property(values, fc.double({ min: 0, max: 1, noNaN: true }), (list, p) => {
        const at = quantile(list, p) ?? Number.NaN;
        expect(at).toBeGreaterThanOrEqual(Math.min(...list));
        expect(at).toBeLessThanOrEqual(Math.max(...list));
        expect(quantile(list, p / 2) ?? Number.NaN).toBeLessThanOrEqual(at);
        expect(quantile(list, 0.5)).toBeCloseTo(median(list) ?? Number.NaN, 6);
      }),
    );
  });

  it('a Wilson interval holds its rate, stays within 0 and 1 and mirrors', () => {
    fc.assert(
      fc.property(fc.nat({ max: 500 }), fc.nat({ max: 500 }), (hits, misses) => {
        fc.pre(hits + misses > 0);
        const one = wilson(hits, hits + misses);
        const other = wilson(misses, hits + misses);
        expect(one.lower).toBeLessThanOrEqual(one.rate ?? -1);
        expect(one.upper).toBeGreaterThanOrEqual(one.rate ?? 2);
        expect(one.lower).toBeGreaterThanOrEqual(0);
        expect(one.upper).toBeLessThanOrEqual(1);
        expect(one.lower ?? 2).toBeCloseTo(1 - (other.upper ?? 2), 12);
      }),
    );
  });

  it('none and all give an end of exactly 0 and exactly 1', () => {
    expect(wilson(0, 7).lower).toBe(0);
    expect(wilson(7, 7).upper).toBe(1);
  });
});
