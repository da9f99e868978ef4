import { contingencies } from '../../server/domain/contingency.ts';
import { daysToSell } from '../../server/domain/days-to-sell.ts';
import type { RebuildFacts } from '../../server/domain/facts.ts';
import { overrun } from '../../server/domain/overrun.ts';
import { profit } from '../../server/domain/profit.ts';
import { profitPerHour, profitPerOwnHour, worked } from '../../server/domain/profit-per-hour.ts';
import { isOverwritten } from '../../server/domain/sets.ts';
import { mean, ratio, sum } from '../../server/domain/statistics.ts';
import { surpriseRate } from '../../server/domain/surprise-rate.ts';
import { DEMO_TODAY } from './parameters.ts';

/** What the demo's figures are read from, whether its own data or the warehouse that was filled with it. */
export interface Measured {
  readonly facts: readonly RebuildFacts[];
  /** Hours in the locked estimate, in seconds, by rebuild. */
  readonly plannedSeconds: ReadonlyMap<string, number>;
}

/** One figure with the bounds that the scenario sets for it. Dollars, fractions, days. */
export interface Band {
  readonly name: string;
  readonly low: number;
  readonly high: number;
  readonly value: number | null;
}

const dollars = (cents: number | null) => (cents === null ? null : cents / 100);

/** Every figure that the scenario bounds, worked out by the product's own measures. */
export function bands({ facts, plannedSeconds }: Measured): Band[] {
  const money = profit(facts);
  const seen = facts.filter((one) => one.seen === true);
  const unseen = facts.filter((one) => one.seen === false);
  const band = (name: string, low: number, high: number, value: number | null): Band => ({ name, low, high, value });
  const perHour = (fits: (one: RebuildFacts) => boolean) =>
    dollars(profitPerHour(facts.filter(fits), null).own.pooledCents);
  const cushion = contingencies(facts, [
    { p: 1, q: 2 },
    { p: 4, q: 5 },
  ]);
  return [
    band('cash kept per finished vehicle', 820, 1_460, ratio(money.profitCents / 100, money.n)),
    band('six years together', 49_000, 88_000, money.profitCents / 100),
    band('share losing', 0.18, 0.33, ratio(money.lossCount, money.n)),
    band(
      'per own hour, all together',
      14,
      25,
      perHour(() => true),
    ),
    band('per own hour, mean of ratios', 24, 42, dollars(mean(worked(facts).map(profitPerOwnHour)))),
    band('overrun, all together', 0.3, 0.41, overrun(facts).pooled),
    band('overrun, even odds', 0.23, 0.34, cushion[0]?.uplift ?? null),
    band('overrun, 4 of 5', 0.43, 0.67, cushion[1]?.uplift ?? null),
    band('parts', 0.14, 0.24, creep(facts, 'parts')),
    band('paint', 0.12, 0.19, creep(facts, 'outside labor (sublet)')),
    band('restraints', 0.13, 0.33, creep(facts, 'restraints (SRS)')),
    band('small systems', 0.32, 0.47, creep(facts, 'small systems')),
    band('hours', 0.43, 0.55, hoursOverrun(facts, plannedSeconds)),
    band('overrun, seen', 0.15, 0.31, overrun(seen).pooled),
    band('overrun, unseen', 0.37, 0.53, overrun(unseen).pooled),
    band('surprise rate, seen', 0.13, 0.38, surpriseRate(seen).rate),
    band('surprise rate, unseen', 0.38, 0.66, surpriseRate(unseen).rate),
    band('days to sell, median', 25, 36, daysToSell(facts, DEMO_TODAY).overall.median.days),
    band(
      'per own hour, hail',
      58,
      133,
      perHour((one) => one.damage === 'hail'),
    ),
    band(
      'per own hour, standard pickup',
      17,
      76,
      perHour((one) => one.class === 'standard pickup'),
    ),
    band(
      'per own hour, compact car',
      -15,
      13,
      perHour((one) => one.class === 'compact car'),
    ),
    band('money in the unsold', 39_000, 57_000, unsoldDollars(facts)),
  ];
}

export function isWithin({ low, high, value }: Band): boolean {
  return value !== null && low <= value && value <= high;
}

/**
 * Known work costing more, per category: (Σ planning actual − Σ surprises) ÷ Σ estimate − 1, over finished rebuilds that
 * planned for it, said what was foreseen, finished the work and did not write the estimate over. null = none.
 */
export function creep(facts: readonly RebuildFacts[], category: string): number | null {
  const set = facts.filter(
    (one) =>
      one.exit?.kind === 'sold' &&
      !one.hasUnknownForeseen &&
      !isOverwritten(one) &&
      (one.estimates.get(category) ?? 0) > 0,
  );
  const cells = set.map((one) => one.categories.get(category));
  const known = sum(cells.map((cell) => (cell ? cell.planningCents - cell.unforeseenCents : 0)));
  const planned = sum(set.map((one) => one.estimates.get(category) ?? 0));
  return ratio(known - planned, planned);
}

/** Hours over plan, own and paid together, as a fraction: over sold rebuilds that have both a plan and both kinds of hours. */
export function hoursOverrun(
  facts: readonly RebuildFacts[],
  plannedSeconds: ReadonlyMap<string, number>,
): number | null {
  const set = facts.filter(
    ({ id, exit, ownSeconds, paidSeconds }) =>
      exit?.kind === 'sold' && plannedSeconds.has(id) && ownSeconds !== null && paidSeconds !== null,
  );
  const planned = sum(set.map(({ id }) => plannedSeconds.get(id) ?? 0));
  return ratio(sum(set.map((one) => (one.ownSeconds ?? 0) + (one.paidSeconds ?? 0))) - planned, planned);
}

function unsoldDollars(facts: readonly RebuildFacts[]): number {
  return sum(facts.filter(({ exit }) => exit === null).map((one) => (one.purchaseCents ?? 0) + one.paidCents)) / 100;
}
