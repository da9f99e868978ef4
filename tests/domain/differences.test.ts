import { describe, expect, it } from 'vitest';
import { rateDifference } from '../../server/domain/rate-difference.ts';
import { joined, NO_SUMS, ratioDifference, ratioSums } from '../../server/domain/ratio-difference.ts';
import { ratioWithoutOne } from '../../server/domain/ratio-without-one.ts';
import { wilson } from '../../server/domain/statistics.ts';

const ones = (values: readonly number[]) => ratioSums(values.map((y) => [1, y] as const));
const pairs = (list: readonly (readonly [number, number])[]) => ratioSums(list);

describe('difference of two sum-over-sum figures', () => {
  it('is Welch\u2019s interval where every divisor is the same', () => {
    // Student's sleep data; R's t.test(extra ~ group) and scipy 1.17.1 ttest_ind(equal_var=False) agree on the interval.
    const first = ones([0.7, -1.6, -0.2, -1.2, -0.1, 3.4, 3.7, 0.8, 0, 2]);
    const second = ones([1.9, 0.8, 1.1, 0.1, -0.1, 4.4, 5.5, 1.6, 4.6, 3.4]);
    const found = ratioDifference(first, second);
    expect(found?.difference).toBeCloseTo(-1.58, 12);
    expect(found?.lower).toBeCloseTo(-3.3654832307117104, 9);
    expect(found?.upper).toBeCloseTo(0.20548323071171137, 9);
    expect(found?.isThin).toBe(false);
  });

  it('weighs by the divisor', () => {
    // Source: numpy 2, residuals y − R·x over mean x, Welch's degrees of freedom 5.991720675759155, scipy's t.
    const a = pairs([
      [1000, 1200],
      [2000, 2900],
      [1500, 1400],
      [3000, 4200],
      [2500, 3300],
    ]);
    const b = joined(
      pairs([
        [800, 1500],
        [2200, 2600],
      ]),
      pairs([
        [1900, 2900],
        [2600, 3600],
      ]),
    );
    const found = ratioDifference(a, b);
    expect(found?.difference).toBeCloseTo(-0.11333333333333329, 12);
    expect(found?.lower).toBeCloseTo(-0.43054404783041555, 8);
    expect(found?.upper).toBeCloseTo(0.20387738116374898, 8);
    expect(found?.isThin).toBe(true);
  });

  it('says nothing with fewer than two on a side, and has no width without spread', () => {
    expect(ratioDifference(ones([1]), ones([1, 2]))).toBeNull();
    expect(ratioDifference(NO_SUMS, ones([1, 2]))).toBeNull();
    expect(ratioDifference(ones([3, 3]), ones([1, 1]))).toEqual({ difference: 2, lower: 2, upper: 2, isThin: true });
  });
});

describe('difference of two shares', () => {
  // Source: Newcombe 1998, Statistics in Medicine 17:873-890, table II, method 10, from memory, to four places.
  it.each([
    [56, 70, 48, 80, 0.0524, 0.3339],
    [9, 10, 3, 10, 0.1705, 0.809],
    [5, 56, 0, 29, -0.0381, 0.1926],
    [0, 10, 0, 20, -0.1611, 0.2775],
    [10, 10, 0, 10, 0.6075, 1],
  ])('%i of %i against %i of %i', (x, n, other, of, lower, upper) => {
    const found = rateDifference(wilson(x, n), wilson(other, of));
    expect(found?.lower).toBeCloseTo(lower, 4);
    expect(found?.upper).toBeCloseTo(upper, 4);
  });

  it('says nothing where nothing was tried', () => {
    expect(rateDifference(wilson(0, 0), wilson(1, 2))).toBeNull();
  });
});

describe('a ratio without one rebuild', () => {
  it('names the one that moves it most', () => {
    const parts = [
      { id: 'a', x: 100, y: 10 },
      { id: 'b', x: 100, y: 90 },
      { id: 'c', x: 100, y: 45 },
    ];
    expect(ratioWithoutOne(parts)).toEqual({ id: 'b', value: 55 / 200 });
    expect(ratioWithoutOne(parts.slice(0, 1))).toBeNull();
    expect(ratioWithoutOne([])).toBeNull();
  });
});
