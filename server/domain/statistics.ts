import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import * as simple from 'simple-statistics';
import { type Rate, wilson, Z } from '#shared/measures/wilson.ts';

export { type Rate, wilson, Z };

/** Below this many values a figure is given, but marked as thin. */
export const FEW = 5;

export interface Interval {
  readonly lower: number;
  readonly upper: number;
}

/** Arithmetic mean. null = no values. */
export function mean(values: readonly number[]): number | null {
  return values.length === 0 ? null : simple.mean(values);
}

/** Middle value; of an even number the mean of the middle two. null = no values. */
export function median(values: readonly number[]): number | null {
  return values.length === 0 ? null : simple.median(values);
}

/**
 * Quantile by linear interpolation at h = (n − 1)p + 1 (Hyndman & Fan 1996, type 7). null = no values.
 * Example: 1, 2, 3, 4 at 0.25 gives 1.75.
 */
export function quantile(values: readonly number[], p: number): number | null {
  return values.length === 0 ? null : simple.quantile(values, p);
}

/** Several quantiles at once, each as `quantile` gives it, for less than one by one. null = no values. */
export function quantiles(values: readonly number[], ps: readonly number[]): (number | null)[] {
  return values.length === 0 ? ps.map(() => null) : simple.quantile([...values], [...ps]);
}

/** Standard deviation with n − 1. null = fewer than two values; exactly 0 when all are equal. */
export function sampleDeviation(values: readonly number[]): number | null {
  if (values.length < 2) return null;
  return values.every((value) => value === values[0]) ? 0 : simple.sampleStandardDeviation(values);
}

/**
 * 95 % t interval of a mean: mean ± t(0.975; n − 1) · SD / √n (definitions §8). `deviation` is the sample SD.
 * null = one value. Example: mean 1.58, SD 1.23, n 10 gives 0.70 to 2.46.
 */
export function tInterval(center: number, deviation: number | null, n: number): Interval | null {
  if (n < 2 || deviation === null) return null;
  const half = deviation === 0 ? 0 : (tQuantile(0.975, n - 1) * deviation) / Math.sqrt(n);
  return { lower: center - half, upper: center + half };
}

/** Sum of whole numbers (cents, seconds). */
export function sum(values: Iterable<number>): number {
  let total = 0;
  for (const value of values) total += value;
  return total;
}

/** `a / b`, or null when there is nothing to divide by (b ≤ 0). */
export function ratio(a: number, b: number): number | null {
  return b > 0 ? a / b : null;
}
