import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import { FEW } from './statistics.ts';

/** Sums over some rebuilds from which a ratio Σy ÷ Σx and its spread follow; groups add up by adding these. */
export interface RatioSums {
  readonly n: number;
  readonly x: number;
  readonly y: number;
  readonly xx: number;
  readonly xy: number;
  readonly yy: number;
}

export interface Difference {
  /** First − second. */
  readonly difference: number;
  /** 95 % interval; holds 0 = could be luck. */
  readonly lower: number;
  readonly upper: number;
  /** Fewer than five on one side. */
  readonly isThin: boolean;
}

export const NO_SUMS: RatioSums = { n: 0, x: 0, y: 0, xx: 0, xy: 0, yy: 0 };

/** The sums of rebuilds with what is divided by (x) and what is divided (y). */
export function ratioSums(pairs: Iterable<readonly [x: number, y: number]>): RatioSums {
  let [n, x, y, xx, xy, yy] = [0, 0, 0, 0, 0, 0];
  for (const [one, other] of pairs) {
    n += 1;
    x += one;
    y += other;
    xx += one * one;
    xy += one * other;
    yy += other * other;
  }
  return { n, x, y, xx, xy, yy };
}

/** Two groups together. */
export function joined(a: RatioSums, b: RatioSums): RatioSums {
  return {
    n: a.n + b.n,
    x: a.x + b.x,
    y: a.y + b.y,
    xx: a.xx + b.xx,
    xy: a.xy + b.xy,
    yy: a.yy + b.yy,
  };
}

/**
 * How far two sum-over-sum figures lie apart, with a 95 % interval. A ratio R = Σy/Σx varies as the mean of
 * (y − R·x)/x̄ does (Cochran, Sampling Techniques, ch. 6: the ratio estimator); the two variances are put together as
 * Welch (1947) does for means. With every x the same it is Welch's interval. null = fewer than two on a side, or Σx not
 * above 0. Example: Student's sleep data, x = 1: −1.58, from −3.365 to 0.205.
 */
export function ratioDifference(a: RatioSums, b: RatioSums): Difference | null {
  const [first, second] = [ratioOf(a), ratioOf(b)];
  if (!first || !second) return null;
  const difference = first.ratio - second.ratio;
  const variance = first.variance + second.variance;
  const isThin = Math.min(a.n, b.n) < FEW;
  if (variance === 0) return { difference, lower: difference, upper: difference, isThin };
  const freedom = variance ** 2 / (first.variance ** 2 / (a.n - 1) + second.variance ** 2 / (b.n - 1));
  const half = tQuantile(0.975, freedom) * Math.sqrt(variance);
  return { difference, lower: difference - half, upper: difference + half, isThin };
}

function ratioOf({ n, x, y, xx, xy, yy }: RatioSums): { ratio: number; variance: number } | null {
  if (n < 2 || x <= 0) return null;
  const ratio = y / x;
  const squares = Math.max(0, yy - 2 * ratio * xy + ratio * ratio * xx);
  return { ratio, variance: (squares / (n - 1) / n) * (n / x) ** 2 };
}
