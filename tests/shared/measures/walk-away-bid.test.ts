import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { repairBudget } from '#shared/measures/repair-budget.ts';
import { type BidTerms, bidFee, bidRoom, bidTax, walkAwayBid } from '#shared/measures/walk-away-bid.ts';

const NO_TAX = { p: 0, q: 1 };

/** A sale with nothing to pay for but the bid, unless told otherwise: the room is the sale. */
function terms(some: Partial<BidTerms> = {}): BidTerms {
  return {
    saleCents: 0,
    repairBudgetCents: 0,
    transportCents: 0,
    sellingCents: 0,
    holdingCentsPerDay: 0,
    days: 0,
    paidLaborCents: 0,
    ownSeconds: 0,
    wantedCentsPerHour: 0,
    wantedProfitCents: 0,
    tax: NO_TAX,
    feeSteps: [],
    feeFlatCents: 0,
    bidStepCents: 1,
    ...some,
  };
}

// Source: the worked example of our notes on the trade (trade.md §7, point 9), worked out by hand there; its fee table
// is that of the demo shop (§8). A small SUV hit in front, bought unseen.
describe('the worked example', () => {
  const budget = repairBudget(210_000, { kind: 'two-part', creepPercent: 27, flatCents: 93_000 });
  const example = terms({
    saleCents: 1_160_000,
    repairBudgetCents: budget,
    transportCents: 43_000,
    // Title 180 and selling 110.
    sellingCents: 29_000,
    holdingCentsPerDay: 41_500,
    days: 1,
    paidLaborCents: 70_000,
    ownSeconds: 60 * 3600,
    wantedCentsPerHour: 2_500,
    feeSteps: [
      [0, 9_000],
      [100_000, 26_000],
      [200_000, 39_000],
      [300_000, 47_000],
      [400_000, 54_000],
      [500_000, 62_000],
      [600_000, 69_000],
      [800_000, 78_000],
      [1_000_000, 88_000],
      [1_500_000, 105_000],
    ],
    feeFlatCents: 18_900,
    bidStepCents: 5_000,
  });

  it('walks away above 3,950 with 59 left of 4,668', () => {
    expect(budget).toBe(359_700);
    expect(walkAwayBid(example)).toEqual({
      roomCents: 466_800,
      bidCents: 395_000,
      feeCents: 65_900,
      taxCents: 0,
      leftCents: 5_900,
    });
  });

  it('would need 4,729 for a bid of 4,000', () => {
    expect(400_000 + bidFee(400_000, example)).toBe(472_900);
    expect(walkAwayBid({ ...example, saleCents: 1_160_000 + 472_900 - 466_800 - 1 }).bidCents).toBe(395_000);
    expect(walkAwayBid({ ...example, saleCents: 1_160_000 + 472_900 - 466_800 }).bidCents).toBe(400_000);
  });
});

// Worked out by hand.
describe('the walk-away bid', () => {
  it('is 0 when the flat fee takes all, and none a cent below', () => {
    const fee = { feeSteps: [[0, 9_000]] as const, feeFlatCents: 18_900 };
    expect(walkAwayBid(terms({ ...fee, saleCents: 27_900 }))).toMatchObject({ bidCents: 0, leftCents: 0 });
    const none = { bidCents: null, feeCents: null, taxCents: null, leftCents: null };
    expect(walkAwayBid(terms({ ...fee, saleCents: 27_899 }))).toEqual({ roomCents: 27_899, ...none });
    expect(walkAwayBid(terms({ saleCents: 5, repairBudgetCents: 12 }))).toEqual({ roomCents: -7, ...none });
    expect(walkAwayBid(terms({ saleCents: 5, repairBudgetCents: null }))).toEqual({ roomCents: null, ...none });
  });

  it('finds the bid above a dearer row', () => {
    // Up to 799.99 the fee is 60.00, from 800.00 only 10.00: with 810.00 the bid is 800.00, with a cent less 740.00.
    const falling = terms({
      feeSteps: [
        [0, 6_000],
        [80_000, 1_000],
      ],
      bidStepCents: 10_00,
    });
    expect(walkAwayBid({ ...falling, saleCents: 81_000 }).bidCents).toBe(80_000);
    expect(walkAwayBid({ ...falling, saleCents: 80_999 }).bidCents).toBe(74_000);
  });

  it('raises half a cent of tax', () => {
    const tax = { p: 13, q: 200 };
    expect([bidTax(100, tax), bidTax(1_300, tax), bidTax(92, tax), bidTax(131_700, tax)]).toEqual([7, 85, 6, 8_561]);
  });

  it('pays own time to the second, and takes the room down to the cent', () => {
    // 31,320 s at 25.87 an hour come to 22,506.9 cents.
    const own = { ownSeconds: 31_320, wantedCentsPerHour: 2_587 };
    expect(bidRoom(terms({ ...own, saleCents: 710_406 }))).toBe(687_899);
    expect(bidRoom(terms({ ...own, saleCents: 0 }))).toBe(-22_507);
    expect(bidRoom(terms({ ownSeconds: 37_080, wantedCentsPerHour: 2_600, saleCents: 27_780 }))).toBe(1_000);
  });

  it('is exact where doubles are not', () => {
    const found = walkAwayBid(terms({ saleCents: 999_999_999_999, tax: { p: 333_333, q: 1_000_000 } }));
    const { bidCents, taxCents, leftCents } = found;
    expect(leftCents).toBeGreaterThanOrEqual(0);
    const next = (bidCents ?? 0) + 1;
    const nextTax = (2n * BigInt(next) * 333_333n + 1_000_000n) / 2_000_000n;
    expect(BigInt(next) + nextTax > 999_999_999_999n).toBe(true);
    expect(taxCents).toBe(Number((2n * BigInt(bidCents ?? 0) * 333_333n + 1_000_000n) / 2_000_000n));
  });
});

/** Fee tables of any shape: rising, falling, starting above 0, with rows closer than a step. */
const feeSteps = fc
  .uniqueArray(fc.tuple(fc.integer({ min: 0, max: 600 }), fc.integer({ min: 0, max: 200 })), {
    selector: ([from]) => from,
    maxLength: 8,
  })
  .map((rows) => rows.toSorted(([a], [b]) => a - b));
const anyTerms = fc
  .record({
    saleCents: fc.integer({ min: -50, max: 800 }),
    tax: fc.record({ p: fc.integer({ min: 0, max: 40 }), q: fc.integer({ min: 1, max: 400 }) }),
    feeSteps,
    feeFlatCents: fc.integer({ min: 0, max: 60 }),
    bidStepCents: fc.integer({ min: 1, max: 60 }),
    ownSeconds: fc.integer({ min: 0, max: 90_000 }),
    wantedCentsPerHour: fc.integer({ min: 0, max: 9 }),
  })
  .map((some) => terms(some));

/** The definition taken at its word: every multiple of the step is tried, in whole numbers times 3,600·2q. */
function tryEveryBid(one: BidTerms): number | null {
  let best: number | null = null;
  for (let bid = 0; bid <= 800; bid += one.bidStepCents) {
    let fee = one.feeFlatCents;
    for (const [i, [from, rowFee]] of one.feeSteps.entries()) {
      if (from <= bid && (one.feeSteps[i + 1]?.[0] ?? 801) > bid) fee += rowFee;
    }
    const tax = Math.floor((2 * bid * one.tax.p + one.tax.q) / (2 * one.tax.q));
    if (3600 * (bid + fee + tax) <= 3600 * one.saleCents - one.ownSeconds * one.wantedCentsPerHour) best = bid;
  }
  return best;
}

describe('the search', () => {
  it('finds what trying every bid finds, whatever the table', () => {
    fc.assert(
      fc.property(anyTerms, (one) => {
        const { roomCents, bidCents, feeCents, taxCents, leftCents } = walkAwayBid(one);
        expect(bidCents).toBe(tryEveryBid(one));
        if (bidCents === null) return;
        expect(feeCents).toBe(bidFee(bidCents, one));
        expect(leftCents).toBe((roomCents ?? 0) - bidCents - (feeCents ?? 0) - (taxCents ?? 0));
        expect(leftCents).toBeGreaterThanOrEqual(0);
      }),
      { numRuns: 3_000 },
    );
  });

  it('takes a bid that just fits, and not one that is a cent short', () => {
    fc.assert(
      fc.property(anyTerms, fc.integer({ min: 0, max: 12 }), (one, steps) => {
        const bid = steps * one.bidStepCents;
        const room = bid + bidFee(bid, one) + bidTax(bid, one.tax);
        const fits = { ...one, ownSeconds: 0, saleCents: room };
        expect(walkAwayBid(fits).bidCents).toBeGreaterThanOrEqual(bid);
        expect(walkAwayBid({ ...fits, saleCents: room - 1 }).bidCents).not.toBe(bid);
      }),
    );
  });

  it('never bids less for more room', () => {
    fc.assert(
      fc.property(anyTerms, fc.nat({ max: 100 }), (one, more) => {
        const [now, then] = [walkAwayBid(one), walkAwayBid({ ...one, saleCents: one.saleCents + more })];
        expect(then.bidCents ?? -1).toBeGreaterThanOrEqual(now.bidCents ?? -1);
      }),
    );
  });
});

describe('the repair budget', () => {
  it('is the plan and what the rule asks, raised to the cent', () => {
    expect(repairBudget(230_001, { kind: 'none' })).toBe(230_001);
    // 15 % of 2,300.01 is 345.0015.
    expect(repairBudget(230_001, { kind: 'flat', percent: 15 })).toBe(264_502);
    expect(repairBudget(100, { kind: 'percent', taken: { overrunCents: 1, estimateCents: 3 } })).toBe(134);
    expect(repairBudget(100, { kind: 'percent', taken: { overrunCents: -1, estimateCents: 3 } })).toBe(100);
    expect(repairBudget(101, { kind: 'two-part', creepPercent: 1, flatCents: 7 })).toBe(110);
  });

  it('is nothing where the rule has too few past rebuilds', () => {
    expect(repairBudget(100, { kind: 'percent', taken: null })).toBeNull();
    expect(repairBudget(100, { kind: 'two-part', creepPercent: null, flatCents: null })).toBeNull();
  });
});
