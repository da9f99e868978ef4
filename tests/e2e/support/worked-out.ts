import { readFileSync } from 'node:fs';

/**
 * The figures that a shop must read after an import, worked out by plain sums over what is truly in the sample files
 * (`NAME.truth.json`, made with the samples by hand). Nothing of the product is used here.
 */
export interface Car {
  readonly ref: string;
  readonly bought: string;
  /** null = still there. */
  readonly sold: string | null;
  readonly purchaseCents: number;
  readonly saleCents: number;
  /** Every cost line, the purchase left out; a credit is negative. */
  costsCents: number;
  /** null = not written down. */
  hours: number | null;
  /** Planned cents by category; empty = no plan. */
  readonly planned: Readonly<Record<string, number>>;
  readonly spent: Record<string, number>;
}

interface Truth {
  readonly canonical: {
    readonly rebuilds: readonly {
      ref: string;
      bought: string;
      sold: string | null;
      purchaseCents: number;
      salePriceCents: number | null;
      hours: number | null;
    }[];
    readonly lines: readonly { rebuildRef: string; category: string; amountCents: number; estimate: boolean }[];
  };
  readonly control: {
    readonly dataRows: number;
    readonly costsCents: number;
    readonly creditsCents: number;
    readonly totalCents: number;
    readonly totalCentsByCategory: Readonly<Record<string, number>>;
    readonly totalSaleCents: number;
    readonly estimateCents: number;
    readonly rebuildHoursTotal: number;
  };
}

/** A sample's file and its truth. */
export function sample(name: string): { file: string; truth: Truth } {
  const file = new URL(`../../fixtures/spreadsheets/${name}`, import.meta.url).pathname;
  return { file, truth: JSON.parse(readFileSync(`${file}.truth.json`, 'utf8')) as Truth };
}

/** The cars of a truth. A sale or purchase line is a fact of the car, not one of its costs. */
export function carsOf({ canonical }: Truth): Car[] {
  return canonical.rebuilds.map((car) => {
    const lines = canonical.lines.filter((line) => line.rebuildRef === car.ref);
    const costs = lines.filter((line) => !line.estimate && !['purchase', 'sale'].includes(line.category));
    return {
      ref: car.ref,
      bought: car.bought,
      sold: car.sold,
      purchaseCents: car.purchaseCents,
      saleCents: car.salePriceCents ?? 0,
      costsCents: sum(costs.map((line) => line.amountCents)),
      hours: car.hours,
      planned: byCategory(lines.filter((line) => line.estimate)),
      spent: byCategory(costs),
    };
  });
}

/** What a car kept: what it was sold for, less its purchase and every cost. */
export const keptOf = (car: Car) => car.saleCents - car.purchaseCents - car.costsCents;

export const sold = (cars: readonly Car[]) => cars.filter((car) => car.sold !== null);
export const soldIn = (cars: readonly Car[], year: number) => cars.filter((car) => car.sold?.startsWith(`${year}-`));

/** Money in what is not sold: purchase and costs. */
export const tiedUp = (cars: readonly Car[]) =>
  sum(cars.filter((car) => car.sold === null).map((car) => car.purchaseCents + car.costsCents));

export const plannedOf = (car: Car) => sum(Object.values(car.planned));

/** How far each sold car with a plan went over it, as a fraction, smallest first. */
export function overruns(cars: readonly Car[]): number[] {
  return sold(cars)
    .filter((car) => plannedOf(car) > 0)
    .map((car) => (car.costsCents - plannedOf(car)) / plannedOf(car))
    .sort((a, b) => a - b);
}

/** Days from bought to sold, the middle one of all sold; of an even number, half way between the two. */
export function middleDaysHeld(cars: readonly Car[]): number {
  const days = sold(cars)
    .map((car) => (Date.parse(car.sold ?? '') - Date.parse(car.bought)) / 86_400_000)
    .sort((a, b) => a - b);
  const half = days.length / 2;
  return ((days[Math.ceil(half) - 1] ?? 0) + (days[Math.floor(half)] ?? 0)) / 2;
}

export function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}

function byCategory(lines: readonly { category: string; amountCents: number }[]): Record<string, number> {
  const found: Record<string, number> = {};
  for (const { category, amountCents } of lines) found[category] = (found[category] ?? 0) + amountCents;
  return found;
}
