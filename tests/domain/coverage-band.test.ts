import { describe, expect, it } from 'vitest';
import { coverageBand } from '../../server/domain/coverage-band.ts';

describe('the band of the true coverage', () => {
  // Source: our notes on the trade (trade.md §7, point 4): 10–90 % band of an "80 %" rule, in whole percent.
  it.each([
    [4, 4, 56, 97],
    [9, 8, 63, 94],
    [20, 17, 70, 91],
    [60, 49, 74, 87],
  ])('from %d rebuilds, the %d. taken, is %d to %d %%', (n, k, lower, upper) => {
    const band = coverageBand(n, k);
    expect([Math.round((band?.lower ?? 0) * 100), Math.round((band?.upper ?? 0) * 100)]).toEqual([lower, upper]);
  });

  it('has the closed form of the largest of n, and mirrors it for the smallest', () => {
    for (const n of [1, 2, 7, 500]) {
      expect(coverageBand(n, n)?.lower).toBeCloseTo(0.1 ** (1 / n), 10);
      expect(coverageBand(n, n)?.upper).toBeCloseTo(0.9 ** (1 / n), 10);
      expect(coverageBand(n, 1)?.lower).toBeCloseTo(1 - 0.9 ** (1 / n), 10);
    }
  });

  it('closes around the promise as rebuilds are added', () => {
    // Normal approximation: 0.8 ± 1.2816·√(0.16/20,000).
    const band = coverageBand(20_000, 16_001);
    expect(band?.lower).toBeCloseTo(0.79638, 4);
    expect(band?.upper).toBeCloseTo(0.80363, 4);
  });

  it('is nothing where the rule has too few', () => {
    expect(coverageBand(3, 4)).toBeNull();
    expect(coverageBand(0, 1)).toBeNull();
  });
});
