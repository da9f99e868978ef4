import { quickselect } from 'simple-statistics';
import { FEW, Z } from './statistics.ts';

/** One rebuild: when, and its figure. */
export interface TrendPoint {
  readonly x: number;
  readonly y: number;
}

export interface Trend {
  readonly n: number;
  /** Change of y for each unit of x. null = no two points apart in x. */
  readonly slope: number | null;
  /** 95 % interval of the slope; holds 0 = could be luck. */
  readonly lower: number | null;
  readonly upper: number | null;
  readonly isThin: boolean;
}

/**
 * A slope that no single rebuild can pull far (Theil 1950, Sen 1968): the median of the slopes between every two
 * points. Its interval takes the slopes at ranks (N ± z·σ)/2, σ² = (n(n − 1)(2n + 5) − Σ ties)/18, where each tie of t
 * equal x or y counts t(t − 1)(2t + 5). Work grows with n²: give it a few hundred points at most.
 * Example: y 1, 3, 2, 6 at x 1, 2, 3, 4: slope 1.58.
 */
export function trend(points: readonly TrendPoint[]): Trend {
  const n = points.length;
  const slopes = slopesOf(points);
  if (slopes.length === 0) return { n, slope: null, lower: null, upper: null, isThin: true };
  const half = (Z * Math.sqrt(rankVariance(points))) / 2;
  const last = slopes.length - 1;
  const middle = slopes.length / 2;
  return {
    n,
    slope: (ranked(slopes, Math.ceil(middle) - 1) + ranked(slopes, Math.floor(middle))) / 2,
    lower: ranked(slopes, Math.max(roundHalfEven(middle - half) - 1, 0)),
    upper: ranked(slopes, Math.min(roundHalfEven(middle + half), last)),
    isThin: n < FEW,
  };
}

function slopesOf(points: readonly TrendPoint[]): number[] {
  const slopes: number[] = [];
  for (let i = 1; i < points.length; i += 1) {
    const { x = 0, y = 0 } = points[i] ?? {};
    for (let j = 0; j < i; j += 1) {
      const other = points[j];
      if (other && other.x !== x) slopes.push((y - other.y) / (x - other.x));
    }
  }
  return slopes;
}

/** Variance of Kendall's S, with its corrections for ties. */
function rankVariance(points: readonly TrendPoint[]): number {
  const weight = (count: number) => count * (count - 1) * (2 * count + 5);
  const ties = (values: readonly number[]) => {
    const counts = new Map<number, number>();
    for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1);
    return [...counts.values()].reduce((total, count) => total + weight(count), 0);
  };
  const tied = ties(points.map(({ x }) => x)) + ties(points.map(({ y }) => y));
  return (weight(points.length) - tied) / 18;
}

/** The value at a rank, counted from 0. Moves the values about. */
function ranked(values: number[], rank: number): number {
  quickselect(values, rank);
  return values[rank] ?? 0;
}

/** A rank half way between two goes to the even one, so that neither end is favored. */
function roundHalfEven(value: number): number {
  const whole = Math.round(value);
  return Math.abs(value % 1) === 0.5 && whole % 2 !== 0 ? whole - 1 : whole;
}
