import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { daysHeld, profit, rebuildProfit } from '../../server/domain/profit.ts';
import { priced } from '../../server/domain/sets.ts';
import { buildLine, buildRebuild, sale } from '../support/facts.ts';

describe('profit', () => {
  it('of one rebuild: proceeds less purchase and work', () => {
    const [one] = priced([buildRebuild({}, [buildLine({ cents: 300_000 })])]);
    expect(one && rebuildProfit(one)).toEqual({
      id: 'r1',
      workCents: 300_000,
      costCents: 800_000,
      profitCents: 200_000,
      returnOnCost: 0.25,
    });
    expect(one && daysHeld(one)).toBe(90);
  });

  // By hand: profits 200,000 and −100,000 and 0 on costs 800,000, 600,000 and 500,000.
  it('of the shop: sums, losses, pooled beside median and mean', () => {
    const facts = [
      buildRebuild({ id: 'a' }, [buildLine({ cents: 300_000 })]),
      buildRebuild({ id: 'b', exit: sale('2025-04-01', 500_000) }, [buildLine({ cents: 100_000 })]),
      buildRebuild({ id: 'c', exit: { kind: 'parted out', on: '2025-04-01', proceedsCents: 500_000 } }),
      buildRebuild({ id: 'held', exit: null }),
      buildRebuild({ id: 'unpriced', purchaseCents: null }),
    ];
    const one = profit(facts);
    expect(one).toMatchObject({ n: 3, noPurchaseCount: 1, lossCount: 1, profitCents: 100_000, costCents: 1_900_000 });
    expect(one).toMatchObject({ purchaseCents: 1_500_000, workCents: 400_000, proceedsCents: 2_000_000 });
    expect(one.returnOnCost.pooled).toBeCloseTo(100_000 / 1_900_000, 14);
    expect(one.returnOnCost).toMatchObject({ n: 3, median: 0 });
    expect(one.returnOnCost.mean).toBeCloseTo((0.25 - 1 / 6) / 3, 14);
  });

  it('of nothing: sums of 0 and no return', () => {
    expect(profit([])).toMatchObject({
      n: 0,
      profitCents: 0,
      returnOnCost: { n: 0, pooled: null, median: null, mean: null },
    });
  });

  it('has no return on a cost that is not above 0, and no days held without a day of purchase', () => {
    const [gift] = priced([buildRebuild({ purchaseCents: 0, boughtOn: null })]);
    expect(gift && rebuildProfit(gift)).toMatchObject({ returnOnCost: null, profitCents: 1_000_000 });
    expect(gift && daysHeld(gift)).toBeNull();
  });

  it('proceeds = cost + profit, in any order', () => {
    const money = fc.integer({ min: 0, max: 1e8 });
    const rebuild = fc
      .tuple(money, money, money)
      .map(([purchaseCents, work, proceeds]) =>
        buildRebuild({ purchaseCents, exit: sale('2025-04-01', proceeds) }, [buildLine({ cents: work })]),
      );
    fc.assert(
      fc.property(fc.array(rebuild, { maxLength: 10 }), (facts) => {
        const one = profit(facts);
        expect(one.costCents + one.profitCents).toBe(one.proceedsCents);
        expect(one.purchaseCents + one.workCents).toBe(one.costCents);
        expect(profit(facts.toReversed()).profitCents).toBe(one.profitCents);
      }),
    );
  });
});
