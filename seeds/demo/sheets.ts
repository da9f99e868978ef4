import type { DemoBaseline, DemoCategory, DemoDates, DemoEntry, DemoVehicle } from './demo-book.ts';
import { IN_CARS_SHEET, IN_RECEIPTS_LIST } from './parameters.ts';

/** What the old sheets have a place for. Money for cover and interest they never held. */
export const SHEET_CATEGORIES = [
  'auction fees',
  'transport',
  'parts',
  'outside labor (sublet)',
  'restraints (SRS)',
  'small systems',
  'title & registration',
  'inspection',
  'selling costs',
  'paid labor',
] as const satisfies readonly DemoCategory[];

const isInSheets = (category: DemoCategory) => (SHEET_CATEGORIES as readonly DemoCategory[]).includes(category);

/** The oldest vehicles, cut down to what their sheets say of them; the others as they are. */
export function asKept(vehicle: DemoVehicle, index: number): DemoVehicle {
  if (index < IN_CARS_SHEET) return fromCarsSheet(vehicle, index % 2 === 1);
  return index < IN_CARS_SHEET + IN_RECEIPTS_LIST ? fromReceiptsList(vehicle) : vehicle;
}

const NEVER_WRITTEN = {
  isSeen: null,
  vin: null,
  color: null,
  titleBrandBought: null,
  titleBrandSold: null,
  boughtFrom: null,
  askingCents: null,
  buyerChannel: null,
  notes: null,
  lessons: null,
};

/** One sum per column, undated, nobody saying what was foreseen; the repair after the sale left out. The haul was often forgotten. */
function fromCarsSheet(vehicle: DemoVehicle, isHaulForgotten: boolean): DemoVehicle {
  const has = (category: DemoCategory) => isInSheets(category) && !(isHaulForgotten && category === 'transport');
  const entries = SHEET_CATEGORIES.filter(has).flatMap((category) => {
    const cents = sum(
      bySale(vehicle)
        .filter((entry) => entry.category === category)
        .map((entry) => entry.cents),
    );
    return cents === 0
      ? []
      : [{ category, datedOn: null, cents, vendor: null, what: null, foreseen: null, isExtra: false }];
  });
  const own = vehicle.hours.filter(({ worker }) => worker === 'owner').map(({ seconds }) => seconds);
  return {
    ...vehicle,
    ...NEVER_WRITTEN,
    source: 'cars sheet',
    dates: only(vehicle.dates, ['boughtOn', 'roadworthyOn', 'listedOn', 'soldOn']),
    baseline: vehicle.baseline && withLines(vehicle.baseline, has),
    entries,
    hours: [{ worker: null, workedOn: null, seconds: sum(own), task: null }],
  };
}

/** Receipts with day, vendor and what; neither plan nor hours. */
function fromReceiptsList(vehicle: DemoVehicle): DemoVehicle {
  return {
    ...vehicle,
    ...NEVER_WRITTEN,
    source: 'receipts list',
    odometer: null,
    dates: only(vehicle.dates, ['boughtOn', 'soldOn']),
    baseline: null,
    entries: bySale(vehicle)
      .filter(({ category }) => isInSheets(category))
      .map((entry) => ({ ...entry, foreseen: null, isExtra: false })),
    hours: [],
  };
}

function bySale({ entries, dates }: DemoVehicle): DemoEntry[] {
  return entries.filter(({ datedOn }) => datedOn === null || dates.soldOn === null || datedOn <= dates.soldOn);
}

function withLines(baseline: DemoBaseline, has: (category: DemoCategory) => boolean): DemoBaseline {
  return {
    madeOn: null,
    plannedSeconds: null,
    expectedSaleCents: null,
    expectedDays: null,
    lines: new Map([...baseline.lines].filter(([category]) => has(category))),
  };
}

function only(dates: DemoDates, kept: readonly (keyof DemoDates)[]): DemoDates {
  return Object.fromEntries(
    Object.entries(dates).map(([name, day]) => [name, (kept as readonly string[]).includes(name) ? day : null]),
  ) as unknown as DemoDates;
}

function sum(values: readonly number[]): number {
  return values.reduce((a, b) => a + b, 0);
}
