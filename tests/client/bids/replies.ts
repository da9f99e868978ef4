import type { Bid } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { bidFigures } from '#shared/measures/bid-sheet.ts';
import { idOf } from '../../support/fake-server.ts';

const word = (letter: string, name: string) => ({ id: idOf(letter), name, isRetired: false });
const NO_WAIT = { n: 0, soldCount: 0, unsoldCount: 0, otherExitCount: 0, median: null, lower: null, upper: null };

/** A shop whose unseen cars ask 27 % and 930 four times in five, as in the worked example of the trade notes (§7). */
export function buildBasis(change: Partial<BidBasis> = {}): BidBasis {
  return {
    asOf: '2026-06-15',
    booksVersion: 7,
    wantedCentsPerHour: 2500,
    feeTable: {
      feeSteps: [
        [200_000, 65_900],
        [400_000, 72_900],
      ],
      feeFlatCents: 0,
      bidStepCents: 5000,
      tax: { p: 0, q: 1 },
      transportCents: 43_000,
      titleCents: 18_000,
      sellingCents: 11_000,
      holdingCentsPerDay: 500,
      wantedProfitCents: 0,
      version: 3,
    },
    classes: [word('c', 'small SUV')],
    damages: [word('f', 'front')],
    categories: [
      { ...word('p', 'parts'), place: null },
      { ...word('t', 'tow'), place: 'transport' },
    ],
    ruleInForce: null,
    ladder: [
      {
        rung: 'all',
        classId: null,
        damageId: null,
        isSeen: null,
        percent: { n: 31, taken: [null, null, null, null] },
        twoPart: { n: 31, creepPercent: 27, flatCents: [10_000, 50_000, 93_000, 150_000] },
      },
    ],
    starts: [
      {
        classId: null,
        damageId: null,
        n: 12,
        lines: [
          { categoryId: idOf('p'), n: 12, planCents: 180_400, actualCents: 210_000 },
          { categoryId: idOf('t'), n: 12, planCents: 30_000, actualCents: 36_000 },
        ],
        hours: { n: 12, plannedSeconds: 180_000, actualSeconds: 216_000, ownSeconds: 144_000 },
      },
    ],
    bias: [{ categoryId: idOf('p'), n: 41, planCents: 100_000, actualCents: 117_000 }],
    hoursBias: { n: 38, plannedSeconds: 360_000, actualSeconds: 511_200 },
    selling: [
      { classId: null, toSell: NO_WAIT, held: { ...NO_WAIT, n: 20, soldCount: 19, unsoldCount: 1, median: 83 } },
    ],
    surprises: [
      {
        damageId: null,
        isSeen: null,
        n: 20,
        x: 9,
        categories: [
          {
            categoryId: idOf('p'),
            x: 6,
            medianCents: 52_000,
            whats: [{ what: 'radiator', x: 4, medianCents: 31_000 }],
          },
        ],
      },
    ],
    past: [],
    pastTotal: 0,
    ...change,
  };
}

/** A past rebuild that sold for what was expected. */
export function buildPast(): BidBasis['past'][number] {
  return {
    id: idOf('z'),
    tag: 'B-07',
    name: '2014 Orrin Vale',
    classId: null,
    damageId: null,
    isSeen: false,
    leftOn: '2026-02-01',
    estimateCents: 200_000,
    actualCents: 240_000,
    plannedSeconds: 144_000,
    actualSeconds: 180_000,
    daysHeld: 90,
    keptCents: 150_000,
    proceedsCents: 900_000,
    expectedSaleCents: 900_000,
  };
}

/** The worked example as a kept sheet: it comes to 3,950. */
export function buildBid(change: Partial<Bid> = {}): Bid {
  const { version: _, ...fees } = buildBasis().feeTable;
  const sheet = {
    ...fees,
    name: 'Lot 14',
    year: null,
    make: null,
    model: null,
    vin: null,
    odometer: null,
    titleBrand: null,
    seller: null,
    classId: null,
    damageId: null,
    secondDamageId: null,
    isSeen: false,
    expectedSaleCents: 1_160_000,
    countedSaleCents: null,
    lines: [{ categoryId: idOf('p'), cents: 210_000 }],
    rule: { kind: 'two-part', level: '4/5' } as const,
    days: 83,
    ownSeconds: 216_000,
    paidSeconds: 0,
    paidLaborCents: 70_000,
    wantedCentsPerHour: 2500,
    ticks: [],
    notes: null,
    ...change,
  };
  return {
    ...sheet,
    id: idOf('b'),
    state: 'open',
    reason: null,
    bidMadeCents: null,
    hammerCents: null,
    rebuildId: null,
    rebuildTag: null,
    figures: bidFigures(sheet, buildBasis()),
    madeOn: '2026-06-14',
    madeByName: 'Dana Whitlock',
    version: 4,
    ...change,
  };
}
