import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';

/** Fees of trade.md §8, in cents: from this bid on, this fee; and 189.00 on top. */
export const FEE_STEPS: BidFields['feeSteps'] = [
  [0, 9_000],
  [100_000, 26_000],
  [200_000, 39_000],
  [300_000, 47_000],
  [400_000, 54_000],
];

/**
 * The worked example of trade.md §7.9: sale 11,600; planned 2,100; transport 430; title 180; holding 415; selling 110;
 * helper 700; 60 h at 25. Its cushion of 27 % and 930 stands here as a flat 27 % and a wanted profit of 930: a room of
 * 4,668, and so a bid of 3,950 that leaves 59.
 */
export function buildSheet(fields: Partial<BidFields> = {}): BidFields {
  return {
    name: 'Lot 41, blue, hit in front',
    year: 2016,
    make: 'Orrin',
    model: 'Vale',
    vin: null,
    odometer: 88_000,
    titleBrand: 'salvage',
    seller: null,
    classId: null,
    damageId: null,
    secondDamageId: null,
    isSeen: false,
    expectedSaleCents: 1_160_000,
    countedSaleCents: null,
    lines: [],
    rule: { kind: 'flat', percent: 27 },
    days: 83,
    ownSeconds: 60 * 3600,
    paidSeconds: 20 * 3600,
    paidLaborCents: 70_000,
    wantedCentsPerHour: 2_500,
    ticks: [],
    notes: null,
    feeSteps: FEE_STEPS,
    feeFlatCents: 18_900,
    bidStepCents: 5_000,
    tax: { p: 0, q: 1 },
    transportCents: 43_000,
    titleCents: 18_000,
    sellingCents: 11_000,
    holdingCentsPerDay: 500,
    wantedProfitCents: 93_000,
    ...fields,
  };
}

type Past = Pick<BidBasis, 'ruleInForce' | 'ladder' | 'past'>;

/** What a shop without a past knows: "all" with nothing on it. */
export const NO_PAST: Past = {
  ruleInForce: null,
  ladder: [
    {
      rung: 'all',
      classId: null,
      damageId: null,
      isSeen: null,
      percent: { n: 0, taken: [null, null, null, null] },
      twoPart: { n: 0, creepPercent: null, flatCents: [null, null, null, null] },
    },
  ],
  past: [],
};

/** A past rebuild, `percent` over a plan of 2,000.00, sold for `share` percent of the 8,000.00 that were expected. */
export function buildPast(id: string, percent: number, share: number, fields: Partial<Past['past'][number]> = {}) {
  return {
    id,
    tag: id,
    name: '',
    classId: 'SUV',
    damageId: 'front',
    isSeen: false,
    leftOn: '2026-01-01',
    estimateCents: 200_000,
    actualCents: 200_000 + 2_000 * percent,
    plannedSeconds: null,
    actualSeconds: null,
    daysHeld: 90,
    keptCents: 0,
    proceedsCents: 8_000 * share,
    expectedSaleCents: 800_000,
    ...fields,
  };
}
