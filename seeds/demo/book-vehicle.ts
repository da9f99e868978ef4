import type { Books } from '../../server/books/books.ts';
import type { DemoBaseline, DemoEntry, DemoHours, DemoVehicle } from './demo-book.ts';
import type { Names } from './names.ts';

/** Writes one vehicle of the ledger into the books: the rebuild, its locked estimate, its entries and hours. */
export async function bookVehicle(books: Books, names: Names, vehicle: DemoVehicle): Promise<void> {
  const { id } = await books.rebuilds.create({ ...rebuildFields(vehicle, names) });
  if (vehicle.baseline) await bookBaseline(books, names, id, vehicle.baseline, vehicle.dates.boughtOn);
  for (const entry of vehicle.entries) await books.entries.create({ ...entryFields(entry, names), rebuildId: id });
  for (const row of vehicle.hours) await books.hours.create({ ...hoursFields(row, names), rebuildId: id });
}

function rebuildFields(vehicle: DemoVehicle, names: Names) {
  const { exit } = vehicle;
  return {
    tag: vehicle.tag,
    year: vehicle.year,
    make: vehicle.make,
    model: vehicle.model,
    vin: vehicle.vin,
    classId: names.classId(vehicle.class),
    damageId: names.damageId(vehicle.damage),
    isSeen: vehicle.isSeen,
    titleBrandBought: vehicle.titleBrandBought,
    titleBrandSold: vehicle.titleBrandSold,
    odometer: vehicle.odometer,
    boughtFrom: vehicle.boughtFrom,
    purchaseCents: vehicle.purchaseCents,
    askingCents: vehicle.askingCents,
    saleCents: vehicle.saleCents,
    buyerChannel: vehicle.buyerChannel,
    ...vehicle.dates,
    exitKind: exit?.kind ?? null,
    exitOn: exit?.on ?? null,
    exitCents: exit?.cents ?? null,
    notes: vehicle.notes,
    lessons: vehicle.lessons,
  };
}

async function bookBaseline(
  books: Books,
  names: Names,
  rebuildId: string,
  baseline: DemoBaseline,
  boughtOn: string | null,
): Promise<void> {
  const lines = [...baseline.lines].map(([category, cents]) => ({ categoryId: names.categoryId(category), cents }));
  const { plannedSeconds, expectedSaleCents, expectedDays } = baseline;
  const fields = { lines, plannedSeconds, expectedSaleCents, expectedDays, note: null };
  const estimate = await books.estimates.create(rebuildId, fields, baseline.madeOn ?? boughtOn ?? '');
  await books.estimates.lock(estimate.id, estimate.version);
}

/** What the books take of an entry; without a rebuild it is overhead. */
export function entryFields(entry: DemoEntry, names: Names) {
  const { category, datedOn, cents, vendor, what, foreseen, isExtra } = entry;
  return { categoryId: names.categoryId(category), datedOn, cents, vendor, what, foreseen, isExtra };
}

function hoursFields({ worker, workedOn, seconds, task }: DemoHours, names: Names) {
  const workerId = worker === 'helper' ? names.helperWorkerId : names.ownerWorkerId;
  return { workerId, workedOn, seconds, isPaid: worker === 'helper', task };
}
