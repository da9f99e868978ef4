import { FEW, mean, quantiles, ratio } from '../../domain/statistics.ts';

/** One rebuild against its plan, in cents or seconds; `plan` > 0. */
export interface AgainstPlan {
  readonly id: string;
  readonly plan: number;
  readonly actual: number;
}

/** How far actual ran over plan: pooled = (Σ actual − Σ plan) ÷ Σ plan, quantiles of the single rates (type 7). */
export function spreadOf(each: readonly AgainstPlan[]) {
  const rates = each.map(({ plan, actual }) => (actual - plan) / plan);
  let [planSum, actualSum] = [0, 0];
  for (const { plan, actual } of each) {
    planSum += plan;
    actualSum += actual;
  }
  // At one half type 7 is the median.
  const [q10 = null, q25 = null, middle = null, q75 = null, q90 = null] = quantiles(rates, [0.1, 0.25, 0.5, 0.75, 0.9]);
  return {
    n: each.length,
    pooled: ratio(actualSum - planSum, planSum),
    median: middle,
    mean: mean(rates),
    q10,
    q25,
    q75,
    q90,
    isThin: each.length < FEW,
    planSum,
    actualSum,
  };
}

const LOWEST = -1;
const HIGHEST = 2;
const BINS = 30;

/** Counts of rates in steps of a tenth from −1 to 2, with open ends; empty ones do not stand. */
export function binsOf(each: readonly AgainstPlan[]): { from: number | null; to: number | null; count: number }[] {
  const counts = Array.from({ length: BINS + 2 }, () => 0);
  const width = (HIGHEST - LOWEST) / BINS;
  for (const { plan, actual } of each) {
    const place = Math.floor(((actual - plan) / plan - LOWEST) / width);
    const bin = Math.max(0, Math.min(BINS + 1, place + 1));
    counts[bin] = (counts[bin] ?? 0) + 1;
  }
  const edge = (i: number) => Math.round((LOWEST + i * width) * 10) / 10;
  return counts.flatMap((count, i) => {
    if (count === 0) return [];
    return [{ from: i === 0 ? null : edge(i - 1), to: i === BINS + 1 ? null : edge(i), count }];
  });
}
