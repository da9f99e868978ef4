import type { BoardRow, HoursRow } from '#shared/contracts/hours.ts';
import type { EntryRow } from '#shared/contracts/ledger.ts';
import type { Rebuild, RebuildDetail, RebuildRow } from '#shared/contracts/rebuilds.ts';
import type { Lists } from '#shared/contracts/shop.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';
import { idOf } from './fake-server.ts';

/** Replies of the faked server for the pages of the books: one rebuild, B-062, in the shop. */

const item = (letter: string, name: string) => ({ id: idOf(letter), name, position: 0, isRetired: false, version: 1 });

export const LISTS: Lists = {
  classes: [item('c', 'SUV')],
  damages: [item('f', 'front')],
  categories: [
    { ...item('p', 'parts'), isPaidLabor: false },
    { ...item('t', 'tax'), isPaidLabor: false },
  ],
  workers: [{ id: idOf('w'), name: 'Sam Roe', isPaid: true, userId: null, isRetired: false, version: 1 }],
};

export const NAMES = [
  { id: idOf('r'), tag: 'B-062', name: '2014 Orrin Vale', isOpen: true },
  { id: idOf('q'), tag: 'B-061', name: '2012 Orrin Dale', isOpen: false },
];

const NO_SOURCE = { importId: null, importSheet: null, importRow: null };

export function buildEntry(change: Partial<EntryRow> = {}): EntryRow {
  return {
    ...NO_SOURCE,
    id: idOf('e'),
    rebuildId: idOf('r'),
    rebuildTag: 'B-062',
    categoryId: idOf('p'),
    categoryName: 'parts',
    datedOn: '2026-06-01',
    cents: 4500,
    vendor: 'Hobnail Yard',
    what: 'door shell',
    foreseen: 'foreseen',
    isExtra: false,
    freeValueCents: null,
    receipt: null,
    splitId: null,
    isGuess: false,
    importCol: null,
    voidedAt: null,
    voidReason: null,
    version: 1,
    ...change,
  };
}

export function buildHours(change: Partial<HoursRow> = {}): HoursRow {
  return {
    ...NO_SOURCE,
    id: idOf('h'),
    rebuildId: idOf('r'),
    rebuildTag: 'B-062',
    rebuildName: '2014 Orrin Vale',
    workerId: idOf('w'),
    workerName: 'Sam Roe',
    workedOn: '2026-06-01',
    seconds: 9000,
    isPaid: true,
    task: 'Body',
    isGuess: false,
    voidedAt: null,
    voidReason: null,
    version: 1,
    ...change,
  };
}

export function buildBoardRow(change: Partial<BoardRow> = {}): BoardRow {
  return {
    id: idOf('r'),
    tag: 'B-062',
    name: '2014 Orrin Vale',
    damageName: 'front',
    stage: 'in the shop',
    loggedSeconds: 138_600,
    plannedSeconds: 216_000,
    ...change,
  };
}

export function buildRow(change: Partial<RebuildRow> = {}): RebuildRow {
  return {
    id: idOf('r'),
    tag: 'B-062',
    name: '2014 Orrin Vale',
    className: 'SUV',
    damageName: 'front',
    stage: 'in the shop',
    isSeen: true,
    boughtOn: '2026-03-01',
    leftOn: null,
    daysHeld: 106,
    purchaseCents: 500_000,
    costCents: 600_000,
    proceedsCents: null,
    keptCents: null,
    ownSeconds: 138_600,
    keptPerHourCents: null,
    estimateCents: 90_000,
    planningCents: 100_000,
    surpriseCents: 20_000,
    overrunRate: 1 / 9,
    ...change,
  };
}

const NO_DATES = Object.fromEntries(REBUILD_DATES.map(([field]) => [field, null])) as Pick<
  Rebuild,
  (typeof REBUILD_DATES)[number][0]
>;

export function buildDetail(rebuild: Partial<Rebuild> = {}, change: Partial<RebuildDetail> = {}): RebuildDetail {
  const words = { trim: null, vin: null, titleBrandBought: null, titleBrandSold: null, boughtFrom: null };
  return {
    rebuild: {
      ...NO_SOURCE,
      ...NO_DATES,
      ...words,
      id: idOf('r'),
      tag: 'B-062',
      year: 2014,
      make: 'Orrin',
      model: 'Vale',
      classId: idOf('c'),
      damageId: idOf('f'),
      secondDamageId: null,
      isSeen: true,
      odometer: null,
      purchaseCents: 500_000,
      askingCents: null,
      saleCents: null,
      buyerChannel: null,
      boughtOn: '2026-03-01',
      exitKind: null,
      exitOn: null,
      exitCents: null,
      notes: null,
      lessons: null,
      version: 1,
      ...rebuild,
    },
    row: buildRow(),
    secondDamageName: null,
    vinCheck: null,
    warnings: [],
    cautions: [],
    estimates: [],
    categories: [
      {
        categoryId: idOf('p'),
        name: 'parts',
        estimateCents: 90_000,
        paidCents: 100_000,
        planningCents: 100_000,
        surpriseCents: 20_000,
        extraCents: 0,
        freeCents: 0,
        entryCount: 3,
      },
    ],
    stageDays: [],
    paidSeconds: null,
    plannedSeconds: 216_000,
    undatedCount: 0,
    unknownForeseenCount: 0,
    lateCount: 0,
    lateCents: 0,
    source: null,
    ...change,
  };
}
