import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type BidSheet, jointChance, type PastPair } from '#shared/measures/joint-chance.ts';

const SHEET: BidSheet = {
  planCents: 100_000,
  repairBudgetCents: 130_000,
  expectedSaleCents: 500_000,
  saleCents: 450_000,
  leftCents: 0,
};

/** A past rebuild that was `percent` over a plan of 2,000.00 and sold for `share` percent of what was expected. */
function pair(percent: number, share: number): PastPair {
  return {
    overrunCents: 2_000 * percent,
    estimateCents: 200_000,
    proceedsCents: 8_000 * share,
    expectedSaleCents: 800_000,
  };
}

describe('the joint chance', () => {
  // By hand: on this sheet 30 % over is the budget, and 90 % of the expected sale is its figure.
  const pairs = [pair(30, 90), pair(10, 80), pair(40, 100), pair(50, 85)];

  it('counts repair, sale, both and the wanted profit, each past rebuild as it came', () => {
    const found = jointChance(pairs, SHEET, 1);
    expect(found.repair).toMatchObject({ n: 4, x: 2 });
    expect(found.sale).toMatchObject({ n: 4, x: 2 });
    expect(found.both).toMatchObject({ n: 4, x: 1 });
    // Beyond the wanted: 0; 200 − 500 = −300; −100 + 500 = 400; −200 − 250 = −450.
    expect(found.wanted).toMatchObject({ n: 4, x: 2, rate: 0.5 });
    expect(found.beyondCents?.p50).toBe(-15_000);
  });

  it('adds what the bid leaves over', () => {
    expect(jointChance(pairs, { ...SHEET, leftCents: 30_000 }, 1).wanted.x).toBe(3);
    expect(jointChance(pairs, { ...SHEET, leftCents: 29_999 }, 1).wanted.x).toBe(2);
  });

  it('repeats itself by its seed, and says it', () => {
    const [one, same, other] = [7, 7, 8].map((seed) => jointChance([...pairs, pair(20, 95)], SHEET, seed));
    expect(one).toEqual(same);
    expect(one).toMatchObject({ seed: 7, resampleCount: 2_000 });
    expect(other?.both).toEqual(one?.both);
  });

  it('says nothing of nothing, and gives no interval for one', () => {
    expect(jointChance([], SHEET, 1)).toMatchObject({
      both: { n: 0, rate: null },
      beyondCents: null,
      medianInterval: null,
    });
    expect(jointChance([pair(30, 90)], SHEET, 1)).toMatchObject({ both: { n: 1, x: 1 }, medianInterval: null });
  });

  // Exact: the median of three drawn from 1, 2, 3 (each n³ draws counted) is 1 in 7 of 27, so 2.5 % lies at 1.
  it('has the interval that all draws would give', () => {
    const three = [pair(30, 91), pair(30, 92), pair(30, 93)];
    expect(jointChance(three, SHEET, 3).medianInterval).toEqual({ lower: 5_000, upper: 15_000 });
  });

  it('is never likelier together than either alone, and holds more often with a smaller sale', () => {
    const any = fc.array(fc.tuple(fc.integer({ min: -30, max: 90 }), fc.integer({ min: 50, max: 130 })), {
      maxLength: 20,
    });
    fc.assert(
      fc.property(any, (past) => {
        const list = past.map(([percent, share]) => pair(percent, share));
        const found = jointChance(list, SHEET, 1);
        expect(found.both.x).toBeLessThanOrEqual(Math.min(found.repair.x, found.sale.x));
        expect(found.both.x).toBeGreaterThanOrEqual(found.repair.x + found.sale.x - list.length);
        // Where both hold, the wanted profit is there.
        expect(found.wanted.x).toBeGreaterThanOrEqual(found.both.x);
        expect(jointChance(list, { ...SHEET, saleCents: 400_000 }, 1).sale.x).toBeGreaterThanOrEqual(found.sale.x);
      }),
      { numRuns: 50 },
    );
  });
});
