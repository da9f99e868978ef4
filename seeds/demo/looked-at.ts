import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { FeeTableFields } from '#shared/contracts/bids-parts.ts';
import type { BidFields } from '#shared/contracts/bids.ts';
import type { Day } from '#shared/day.ts';
import { startFor } from '#shared/measures/like-cars.ts';
import type { BidOutcome } from '../../server/books/bid-sheets.ts';
import type { DemoClass, DemoDamage } from './parameters.ts';

/** A car that the yard looked at, in dollars. */
export interface Looked {
  readonly on: Day;
  readonly fields: Pick<BidFields, 'name' | 'year' | 'make' | 'model' | 'isSeen'> & Partial<BidFields>;
  readonly class: DemoClass;
  readonly damage: DemoDamage;
  readonly expectedSale: number;
  readonly outcome: Partial<BidOutcome>;
}

export const LOOKED: readonly Looked[] = [
  {
    on: '2026-11-27',
    fields: { name: 'Lot 212, silver, front', year: 2017, make: 'Mazda', model: 'CX-5', isSeen: true, notes: null },
    class: 'small SUV',
    damage: 'front',
    expectedSale: 13_900,
    outcome: {
      state: 'not bought',
      reason: 'Went above our walk-away bid.',
      bidMadeCents: 530_000,
      hammerCents: 640_000,
    },
  },
  {
    on: '2026-12-05',
    fields: {
      name: 'Lot 67, blue, water to the seats',
      year: 2018,
      make: 'Toyota',
      model: 'Camry',
      isSeen: true,
      ticks: ['flood-wiring', 'any-paper'],
      notes: 'Silt behind the left lamp, damp under the rear carpet.',
    },
    class: 'midsize car',
    damage: 'flood',
    expectedSale: 11_200,
    outcome: { state: 'not bought', reason: 'Silt in the fuse box.', hammerCents: 265_000 },
  },
  {
    on: '2026-12-14',
    fields: { name: 'Lot 9, white, hail all over', year: 2019, make: 'Ford', model: 'F-150', isSeen: false },
    class: 'standard pickup',
    damage: 'hail',
    expectedSale: 19_500,
    outcome: {},
  },
];

/** A sheet on which nothing is said yet. */
export const EMPTY = {
  vin: null,
  odometer: null,
  titleBrand: 'salvage',
  seller: null,
  secondDamageId: null,
  countedSaleCents: null,
  rule: { kind: 'in force' },
  ticks: [],
  notes: null,
} as const satisfies Partial<BidFields>;

/** The sheet as the owner fills it in: planned as such cars were, with the hours that they took. */
export function lookedSheet(
  { fields, expectedSale, ...car }: Looked,
  fees: FeeTableFields,
  basis: BidBasis,
): BidFields {
  const idOf = (list: readonly { id: string; name: string }[], name: string) =>
    list.find((one) => one.name === name)?.id ?? null;
  const [classId, damageId] = [idOf(basis.classes, car.class), idOf(basis.damages, car.damage)];
  const start = startFor(basis.starts, { classId, damageId, isSeen: fields.isSeen });
  const ownHours = Math.round((start?.hours.ownSeconds ?? 0) / 3600);
  const paidHours = Math.round((start?.hours.actualSeconds ?? 0) / 3600) - ownHours;
  return {
    ...EMPTY,
    ticks: [],
    ...fees,
    ...fields,
    classId,
    damageId,
    expectedSaleCents: expectedSale * 100,
    lines: plannedLines(basis, start),
    days: DAYS,
    ownSeconds: ownHours * 3600,
    paidSeconds: paidHours * 3600,
    paidLaborCents: paidHours * HELPER_CENTS_PER_HOUR,
    wantedCentsPerHour: basis.wantedCentsPerHour ?? 0,
  };
}

/** What most such cars planned for, to the nearest ten dollars; what the sheet asks for elsewhere left out. */
function plannedLines({ categories }: BidBasis, start: ReturnType<typeof startFor>): BidFields['lines'] {
  const usual = (start?.lines ?? []).filter(({ n }) => n * 2 >= (start?.n ?? 0));
  return usual
    .filter(({ categoryId }) => categories.some(({ id, place }) => id === categoryId && place === null))
    .map(({ categoryId, planCents }) => ({ categoryId, cents: Math.round(planCents / 1_000) * 1_000 }));
}

const DAYS = 110;
const HELPER_CENTS_PER_HOUR = 2_300;
