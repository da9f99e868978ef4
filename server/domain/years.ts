import { addDays, calendarYearOf, type Day, monthOf } from '#shared/day.ts';
import type { RebuildFacts } from './facts.ts';
import { rebuildProfit } from './profit.ts';
import { completed, priced } from './sets.ts';
import { sum } from './statistics.ts';

/** Money in rebuilds still in the shop's hands on a day: how many, and purchase + what was paid on them by then. */
export interface TiedUp {
  readonly on: Day;
  readonly rebuildCount: number;
  readonly cents: number;
}

/** One shop year: `from` to `to`, both inside, named by the calendar year in which it begins. */
export interface YearSpan {
  readonly year: number;
  readonly from: Day;
  readonly to: Day;
  /** The day for which money tied up is given: `to`, or the as-of day if that is earlier. */
  readonly tiedUpOn: Day;
}

export interface ShopYear extends YearSpan {
  readonly exitCount: number;
  readonly soldCount: number;
  /** Exits whose purchase is not known: counted, in no money figure. */
  readonly noPurchaseCount: number;
  /** Σ whole profit of the rebuilds that left in the year, cents. */
  readonly profitCents: number;
  readonly overheadCents: number;
  /** profit − overhead. */
  readonly keptCents: number;
  /** Entries on these rebuilds dated after they left: count and net cents, already in the profit. */
  readonly lateCount: number;
  readonly lateCents: number;
  /** null = not fed in for that day. */
  readonly tiedUp: TiedUp | null;
}

/** An overhead sum on its day, cents. */
export interface Overhead {
  readonly on: Day;
  readonly cents: number;
}

export interface YearsInput {
  readonly facts: readonly RebuildFacts[];
  readonly overhead: readonly Overhead[];
  readonly asOf: Day;
  /** 1–12. */
  readonly startMonth: number;
}

/** The shop year, by its name, that a day falls in. */
export function shopYearOf(day: Day, startMonth: number): number {
  return calendarYearOf(day) - (monthOf(day) < startMonth ? 1 : 0);
}

/** First and last day of a shop year. */
export function yearSpan(year: number, startMonth: number): { from: Day; to: Day } {
  const month = String(startMonth).padStart(2, '0');
  return { from: `${year}-${month}-01`, to: addDays(`${year + 1}-${month}-01`, -1) };
}

/**
 * The shop's years without a gap (definitions §18.6): from that of the earliest bought, exit, overhead or as-of day to
 * that of the as-of day.
 */
export function yearSpans({ facts, overhead, asOf, startMonth }: YearsInput): YearSpan[] {
  let first = asOf;
  for (const { boughtOn, exit } of facts) {
    for (const day of [boughtOn, exit?.on]) if (day && day < first) first = day;
  }
  for (const { on } of overhead) if (on < first) first = on;
  const start = shopYearOf(first, startMonth);
  const count = shopYearOf(asOf, startMonth) - start + 1;
  return Array.from({ length: count }, (_, i) => {
    const { from, to } = yearSpan(start + i, startMonth);
    return { year: start + i, from, to, tiedUpOn: to < asOf ? to : asOf };
  });
}

/**
 * What each shop year left (definitions §18.6, decisions 6): profit of the rebuilds that left in it − overhead dated in
 * it; a late bill counts in the year of the exit. A year without exits shows 0. `tiedUp` is fed in for the days of
 * `yearSpans`. Example: two exits with 3,000 and −500, overhead 700: kept 1,800.
 */
export function shopYears(input: YearsInput, tiedUp: readonly TiedUp[]): ShopYear[] {
  const { facts, overhead, startMonth } = input;
  const yearOf = (day: Day): number => shopYearOf(day, startMonth);
  const profits = priced(facts).map((one) => ({ year: yearOf(one.exit.on), cents: rebuildProfit(one).profitCents }));
  const costs = overhead.map(({ on, cents }) => ({ year: yearOf(on), cents }));
  const done = completed(facts).map((rebuild) => ({ year: yearOf(rebuild.exit.on), rebuild }));
  return yearSpans(input).map((span) => {
    const exits = done.filter(({ year }) => year === span.year).map(({ rebuild }) => rebuild);
    const profitCents = sum(profits.filter(({ year }) => year === span.year).map(({ cents }) => cents));
    const overheadCents = sum(costs.filter(({ year }) => year === span.year).map(({ cents }) => cents));
    return {
      ...span,
      exitCount: exits.length,
      soldCount: exits.filter((rebuild) => rebuild.exit.kind === 'sold').length,
      noPurchaseCount: exits.filter((rebuild) => rebuild.purchaseCents === null).length,
      profitCents,
      overheadCents,
      keptCents: profitCents - overheadCents,
      lateCount: sum(exits.map((rebuild) => rebuild.lateCount)),
      lateCents: sum(exits.map((rebuild) => rebuild.lateCents)),
      tiedUp: tiedUp.find(({ on }) => on === span.tiedUpOn) ?? null,
    };
  });
}
