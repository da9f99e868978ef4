import fc from 'fast-check';
import { expect, test } from 'vitest';
import { ruleReserve } from '#shared/measures/rule-reserve.ts';

test('percent and sum, raised to the cent', () => {
  expect(ruleReserve({ percent: 24, flatCents: 45_000 }, 200_100)).toBe(93_024);
  // 24 % of 1.01 is 24.24 cents.
  expect(ruleReserve({ percent: 24, flatCents: null }, 101)).toBe(25);
  expect(ruleReserve({ percent: 0, flatCents: null }, 500_000)).toBe(0);
});

test('never less than the exact share and never a whole cent more', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 500 }), fc.integer({ min: 0, max: 1e9 }), (percent, estimate) => {
      const short = ruleReserve({ percent, flatCents: null }, estimate) * 100 - percent * estimate;
      expect(short).toBeGreaterThanOrEqual(0);
      expect(short).toBeLessThan(100);
    }),
  );
});
