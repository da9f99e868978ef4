import { type Car, carsOf, sample } from '../support/worked-out.ts';

export const sheet = sample('p01_rebuild_summary_us.csv');
export const list = sample('p02_expense_ledger_us.csv');

/** What is typed by hand, all of it on one car that was sold in 2019; the last entry is voided again. */
export const TYPED = {
  car: 'TC-07',
  day: '2019-02-20',
  entries: ['12.50', '30', '99.99'],
  keptCents: 12_50 + 30_00,
  hours: ['1.5', '2:30'],
  keptHours: 4,
};

/** The sheet's cars, with what is typed by hand. */
export const sheetCars: readonly Car[] = carsOf(sheet.truth).map((car) => {
  if (car.ref !== TYPED.car) return car;
  const spent = { ...car.spent, parts: (car.spent['parts'] ?? 0) + TYPED.keptCents };
  return { ...car, spent, costsCents: car.costsCents + TYPED.keptCents, hours: (car.hours ?? 0) + TYPED.keptHours };
});

/** All cars once both files are in. */
export const cars: readonly Car[] = [...sheetCars, ...carsOf(list.truth)];
