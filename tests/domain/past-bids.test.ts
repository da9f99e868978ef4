import { describe, expect, it } from 'vitest';
import { type PastBid, pastBids } from '../../server/domain/past-bids.ts';

// Source: worked out by hand. Expected 9,000, estimate 3,000, cushion 700: limit 5,300, and 6,000 without the cushion.
const bid = (id: string, changes: Partial<PastBid> = {}): PastBid => ({
  id,
  purchaseCents: 500_000,
  expectedSaleCents: 900_000,
  plannedSeconds: 144_000,
  estimateCents: 300_000,
  reserveCents: 70_000,
  profitCents: 100_000,
  ownSeconds: 180_000,
  ...changes,
});
const ids = (list: readonly { id: string }[]) => list.map(({ id }) => id);

describe('what the rule would have done to past bids', () => {
  it('skips what was paid for above the limit with the cushion, and only that', () => {
    const found = pastBids(
      [
        bid('within', { purchaseCents: 530_000 }),
        bid('a cent above', { purchaseCents: 530_001, profitCents: -40_000 }),
        bid('just within the plan', { purchaseCents: 600_000 }),
        bid('above the plan itself', { purchaseCents: 600_001 }),
      ],
      null,
    );
    expect(found).toMatchObject({ n: 4, reserveCents: 280_000 });
    expect(ids(found.skipped)).toEqual(['a cent above', 'just within the plan']);
    expect(ids(found.aboveAnyway)).toEqual(['above the plan itself']);
    expect(found.skipped[0]).toMatchObject({ paidCents: 530_001, limitCents: 530_000, profitCents: -40_000 });
  });

  it('lets planned hours ask for their pay, raised to the cent', () => {
    // 40 hours at 25.00 are 1,000.00: the limit falls from 5,300 to 4,300.
    expect(ids(pastBids([bid('a', { purchaseCents: 430_000 })], 2_500).skipped)).toEqual([]);
    expect(ids(pastBids([bid('a', { purchaseCents: 430_001 })], 2_500).skipped)).toEqual(['a']);
    // One second at 25.00 an hour is 0.69 of a cent.
    const second = bid('a', { purchaseCents: 530_000, plannedSeconds: 1 });
    expect(ids(pastBids([second], 2_500).skipped)).toEqual(['a']);
    expect(pastBids([bid('a', { purchaseCents: 530_000, plannedSeconds: 0 })], 2_500)).toMatchObject({
      n: 1,
      skipped: [],
    });
  });

  it('leaves out and names what was not locked then', () => {
    const found = pastBids(
      [
        bid('no purchase', { purchaseCents: null, expectedSaleCents: null }),
        bid('no sale', { expectedSaleCents: null }),
        // A sheet on which no sale was put in is kept with 0.
        bid('sale of nothing', { expectedSaleCents: 0 }),
        bid('no hours', { plannedSeconds: null }),
      ],
      2_500,
    );
    expect(found).toEqual({
      n: 0,
      reserveCents: 0,
      skipped: [],
      aboveAnyway: [],
      noPurchaseIds: ['no purchase'],
      noSaleIds: ['no sale', 'sale of nothing'],
      noHoursIds: ['no hours'],
    });
    // Hours that ask for nothing need not be planned.
    expect(pastBids([bid('no hours', { plannedSeconds: null })], null)).toMatchObject({ n: 1, noHoursIds: [] });
  });

  it('never looks at how a car ended to say whether it would have been bought', () => {
    const bids = (profitCents: number) => [bid('a', { purchaseCents: 540_000, profitCents })];
    expect(ids(pastBids(bids(-9_999_999), null).skipped)).toEqual(ids(pastBids(bids(9_999_999), null).skipped));
  });
});
