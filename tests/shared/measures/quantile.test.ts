import fc from 'fast-check';
import { expect, it } from 'vitest';
import { quantileOfSorted } from '#shared/measures/quantile.ts';
import { quantile } from '../../../server/domain/statistics.ts';

// Hyndman & Fan 1996, type 7: 1, 2, 3, 4 at a quarter is 1.75.
it('interpolates as type 7', () => {
  expect(quantileOfSorted([1, 2, 3, 4], 0.25)).toBe(1.75);
  expect(quantileOfSorted([], 0.5)).toBeNull();
});

// Outside check: simple-statistics, which the server uses.
it('agrees with the library', () => {
  const values = fc.array(fc.integer({ min: -1_000_000, max: 1_000_000 }), { minLength: 1, maxLength: 50 });
  fc.assert(
    fc.property(values, fc.constantFrom(0, 0.025, 0.1, 0.5, 0.9, 1), (list, p) => {
      const sorted = list.toSorted((a, b) => a - b);
      expect(quantileOfSorted(sorted, p)).toBeCloseTo(quantile(list, p) ?? Number.NaN, 6);
    }),
  );
});
