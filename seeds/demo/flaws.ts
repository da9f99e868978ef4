import { addDays } from '#shared/day.ts';
import type { DemoBaseline, DemoCategory, DemoEntry, DemoVehicle } from './demo-book.ts';

/** The books with what goes wrong in real ones planted in them, and where each flaw was put. */
export interface Flawed {
  readonly vehicles: readonly DemoVehicle[];
  readonly planted: ReadonlyMap<string, readonly string[]>;
}

interface Flaw {
  readonly name: string;
  fits(vehicle: DemoVehicle): boolean;
  change(vehicle: DemoVehicle): DemoVehicle;
}

/** Puts each flaw on the first vehicle that fits and carries none yet. A flaw that fits nowhere is planted nowhere, which the checks notice. */
export function withFlaws(vehicles: readonly DemoVehicle[]): Flawed {
  const result = [...vehicles];
  const planted = new Map<string, string[]>();
  const used = new Set<string>();
  for (const flaw of FLAWS) {
    const index = result.findIndex((vehicle) => !used.has(vehicle.tag) && flaw.fits(vehicle));
    const vehicle = result[index];
    if (!vehicle) continue;
    result[index] = flaw.change(vehicle);
    used.add(vehicle.tag);
    planted.set(flaw.name, [vehicle.tag]);
  }
  const moved = movePart(result, used);
  for (const [name, fits] of KEPT_AS_THEY_WERE)
    planted.set(
      name,
      moved.vehicles.filter(fits).map(({ tag }) => tag),
    );
  if (moved.tags.length > 0) planted.set('part moved between vehicles', moved.tags);
  return { vehicles: moved.vehicles, planted };
}

const isSold = ({ source, dates }: DemoVehicle) => source === 'ledger' && dates.soldOn !== null;
const boughtIn = (vehicle: DemoVehicle, year: number) =>
  isSold(vehicle) && vehicle.dates.boughtOn?.startsWith(`${year}`) === true;
const partsOf = (vehicle: DemoVehicle) =>
  vehicle.entries.filter(
    ({ category, cents, foreseen, isExtra }) =>
      category === 'parts' && cents > 0 && foreseen === 'foreseen' && !isExtra,
  );

/** Flaws that the old sheets bring along by themselves, beside the one planted. */
const KEPT_AS_THEY_WERE: readonly (readonly [string, (vehicle: DemoVehicle) => boolean])[] = [
  ['no baseline', ({ baseline }) => baseline === null],
  ['no hours', ({ hours }) => hours.length === 0],
  ['only in old sheets', ({ source }) => source !== 'ledger'],
  ['not settled', ({ source, dates }) => source === 'ledger' && dates.soldOn !== null && dates.settledOn === null],
];

const FLAWS: readonly Flaw[] = [
  {
    name: 'comeback in the next year',
    fits: (vehicle) => isSold(vehicle) && isLateInYear(vehicle.dates.soldOn) && lateEntries(vehicle).length === 0,
    change: (vehicle) => withEntry(vehicle, comeback(vehicle)),
  },
  {
    name: 'baseline overwritten',
    fits: (vehicle) => boughtIn(vehicle, 2023) && lateEntries(vehicle).length === 0 && vehicle.damage !== 'front',
    change: (vehicle) => ({ ...vehicle, baseline: vehicle.baseline && overwritten(vehicle.baseline, vehicle.entries) }),
  },
  {
    name: 'no baseline',
    fits: (vehicle) => boughtIn(vehicle, 2022),
    change: (vehicle) => ({ ...vehicle, baseline: null }),
  },
  {
    name: 'receipt twice',
    fits: (vehicle) => boughtIn(vehicle, 2024) && partsOf(vehicle).length > 1,
    change: (vehicle) => ({ ...vehicle, entries: [...vehicle.entries, ...partsOf(vehicle).slice(0, 1)] }),
  },
  {
    name: 'receipt before the purchase',
    fits: (vehicle) => boughtIn(vehicle, 2024) && partsOf(vehicle).length > 1,
    change: (vehicle) => ({
      ...vehicle,
      entries: vehicle.entries.map((entry) => (entry === partsOf(vehicle)[0] ? predated(entry, vehicle) : entry)),
    }),
  },
  {
    name: 'core refund entered as a cost',
    fits: (vehicle) => boughtIn(vehicle, 2025) && partsOf(vehicle).length > 1,
    change: (vehicle) =>
      withEntry(vehicle, { ...part(vehicle, 'core refund, alternator', 4_500), vendor: 'Junction Parts Counter' }),
  },
  {
    name: 'VIN with a letter O',
    fits: (vehicle) => boughtIn(vehicle, 2025),
    change: (vehicle) => ({ ...vehicle, vin: 'DEM0CAR0000000O42' }),
  },
  {
    name: 'trade-in payment',
    fits: (vehicle) => boughtIn(vehicle, 2025) && (vehicle.saleCents ?? 0) > 500_000,
    change: (vehicle) => ({
      ...vehicle,
      buyerChannel: 'private, with trade-in',
      notes: 'Paid partly with a 2009 hatchback, agreed at 1,400; the rest in cash. The price is both together.',
    }),
  },
  {
    name: 'timer left running 14 hours',
    fits: (vehicle) => boughtIn(vehicle, 2026) && vehicle.hours.some(({ worker }) => worker === 'helper'),
    change: forgottenTimer,
  },
  {
    name: 'maybe kept for own use',
    fits: ({ source, dates }) =>
      source === 'ledger' && dates.listedOn !== null && dates.soldOn === null && dates.listedOn > '2026-07-01',
    change: (vehicle) => ({
      ...vehicle,
      notes: 'Wren has driven it to work since it was listed. Sell it, or take it out as own use?',
    }),
  },
];

const COMEBACK_DAYS = 45;

function isLateInYear(soldOn: string | null): boolean {
  return soldOn !== null && soldOn < '2026-01-01' && addDays(soldOn, COMEBACK_DAYS).slice(0, 4) > soldOn.slice(0, 4);
}

function lateEntries({ entries, dates }: DemoVehicle): DemoEntry[] {
  return entries.filter(({ datedOn }) => datedOn !== null && dates.soldOn !== null && datedOn > dates.soldOn);
}

function comeback({ dates }: DemoVehicle): DemoEntry {
  return {
    category: 'outside labor (sublet)',
    datedOn: dates.soldOn === null ? null : addDays(dates.soldOn, COMEBACK_DAYS),
    cents: 38_640,
    vendor: 'Junction Cooling',
    what: 'came back: coolant leak put right',
    foreseen: 'surprise',
    isExtra: false,
  };
}

function part({ dates }: DemoVehicle, what: string, cents: number): DemoEntry {
  return {
    category: 'parts',
    datedOn: dates.roadworthyOn,
    cents,
    vendor: null,
    what,
    foreseen: 'foreseen',
    isExtra: false,
  };
}

function withEntry(vehicle: DemoVehicle, entry: DemoEntry): DemoVehicle {
  return { ...vehicle, entries: [...vehicle.entries, entry] };
}

function predated(entry: DemoEntry, { dates }: DemoVehicle): DemoEntry {
  return { ...entry, datedOn: dates.boughtOn === null ? null : addDays(dates.boughtOn, -11) };
}

/** Every planned figure written over with what it came to. */
function overwritten(baseline: DemoBaseline, entries: readonly DemoEntry[]): DemoBaseline {
  const lines = new Map<DemoCategory, number>();
  for (const { category, cents, isExtra } of entries) {
    if (!isExtra) lines.set(category, (lines.get(category) ?? 0) + cents);
  }
  return { ...baseline, lines };
}

function forgottenTimer(vehicle: DemoVehicle): DemoVehicle {
  const forgotten = vehicle.hours.findLast(({ worker }) => worker === 'helper');
  return {
    ...vehicle,
    hours: vehicle.hours.map((row) => (row === forgotten ? { ...row, seconds: 14 * 3600, task: null } : row)),
  };
}

/** A battery goes from a parted-out vehicle to one on the bench that day: a credit here, a cost there, the same cents. */
function movePart(vehicles: readonly DemoVehicle[], used: ReadonlySet<string>) {
  for (const donor of vehicles) {
    const day = donor.exit?.on;
    const taker = vehicles.find(({ tag, dates }) => day !== undefined && !used.has(tag) && isOnBench(dates, day));
    if (!day || !taker) continue;
    const moved = (cents: number, what: string): DemoEntry => ({
      category: 'parts',
      datedOn: day,
      cents,
      vendor: null,
      what,
      foreseen: 'foreseen',
      isExtra: false,
    });
    const changed = vehicles.map((vehicle) => {
      if (vehicle === donor) return withEntry(vehicle, moved(-9_500, `battery, moved to ${taker.tag}`));
      return vehicle === taker ? withEntry(vehicle, moved(9_500, `battery, from ${donor.tag}`)) : vehicle;
    });
    return { vehicles: changed, tags: [donor.tag, taker.tag] };
  }
  return { vehicles, tags: [] };
}

function isOnBench({ startedOn, roadworthyOn, soldOn }: DemoVehicle['dates'], day: string): boolean {
  return startedOn !== null && startedOn <= day && roadworthyOn !== null && day <= roadworthyOn && soldOn !== null;
}
