import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import * as simple from 'simple-statistics';

/** 97.5 % point of the normal distribution (definitions §0; simple-statistics' own is wrong in the 4th digit). */
export const Z = 1.959963984540054;

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

export interface Rate {
  readonly n: number;
  readonly x: number;
  /** x / n. null = nothing was tried. */
  readonly rate: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
}

/**
 * Share x of n with its 95 % Wilson score interval, no continuity correction (Wilson 1927; Newcombe 1998,
 * method 3): center (p + z²/2n) / (1 + z²/n), half z·√(p(1 − p)/n + z²/4n²) / (1 + z²/n).
 * x = 0 gives a lower end of exactly 0, x = n an upper end of exactly 1. n = 0: all null.
 * Example: 81 of 263 is 0.308, from 0.255 to 0.366.
 */
export function wilson(x: number, n: number): Rate {
  if (n === 0) return { n, x, rate: null, lower: null, upper: null };
  const p = x / n;
  const scale = 1 + (Z * Z) / n;
  const center = (p + (Z * Z) / (2 * n)) / scale;
  const half = (Z * Math.sqrt((p * (1 - p)) / n + (Z * Z) / (4 * n * n))) / scale;
  return { n, x, rate: p, lower: x === 0 ? 0 : center - half, upper: x === n ? 1 : center + half };
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
