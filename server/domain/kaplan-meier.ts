import { Z } from './statistics.ts';

/** One vehicle on the market: days watched, and whether it sold on the last of them. */
export interface Observation {
  readonly days: number;
  readonly isSold: boolean;
}

export interface CurvePoint {
  readonly days: number;
  readonly atRiskCount: number;
  readonly soldCount: number;
  /** S: share still unsold after this day. */
  readonly unsold: number;
  /** Greenwood's standard error of S; null where S is 0. */
  readonly standardError: number | null;
  /** 95 % log-log limits of S; null where S is 0 or 1. */
  readonly lower: number | null;
  readonly upper: number | null;
}

export interface Curve {
  readonly n: number;
  readonly soldCount: number;
  /** One point per day with a sale, rising. */
  readonly points: readonly CurvePoint[];
  /** The longest time watched; null = nothing watched. */
  readonly longestDays: number | null;
}

/** A share unsold at some day, with its limits. */
export interface UnsoldAt {
  readonly unsold: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
}

/** Within this of one half counts as one half (definitions §7). */
export const HALF_TOLERANCE = 1.5e-8;

/**
 * Share still unsold by days on the market, unsold vehicles included (Kaplan & Meier 1958; definitions §7):
 * S(t) = Π (1 − d/n) over the days with sales. One that is still unsold on day t counts as at risk on day t.
 * Variance by Greenwood, G = Σ d/(n(n − d)); log-log limits S^exp(±z·√G/|ln S|). Nothing watched: no points.
 * Example: sold after 1, 3 and 4 days, one lost sight of at 2: S(1) = 0.75, S(3) = 0.375.
 */
export function kaplanMeier(observations: readonly Observation[]): Curve {
  const sorted = [...observations].sort((a, b) => a.days - b.days);
  const points: CurvePoint[] = [];
  let unsold = 1;
  let greenwood = 0;
  for (let i = 0; i < sorted.length; ) {
    const days = sorted[i]?.days ?? 0;
    const atRiskCount = sorted.length - i;
    let soldCount = 0;
    for (; sorted[i]?.days === days; i += 1) if (sorted[i]?.isSold) soldCount += 1;
    if (soldCount === 0) continue;
    unsold *= 1 - soldCount / atRiskCount;
    greenwood += soldCount / (atRiskCount * (atRiskCount - soldCount));
    points.push({ days, atRiskCount, soldCount, unsold, ...spread(unsold, greenwood) });
  }
  const soldCount = points.reduce((total, point) => total + point.soldCount, 0);
  return { n: sorted.length, soldCount, points, longestDays: sorted[sorted.length - 1]?.days ?? null };
}

function spread(unsold: number, greenwood: number): Pick<CurvePoint, 'standardError' | 'lower' | 'upper'> {
  if (unsold === 0) return { standardError: null, lower: null, upper: null };
  const root = Math.sqrt(greenwood);
  const q = (Z * root) / Math.abs(Math.log(unsold));
  return { standardError: unsold * root, lower: unsold ** Math.exp(q), upper: unsold ** Math.exp(-q) };
}

/**
 * Share unsold after `days` days. Beyond the longest time watched it is 0 if all had sold, else null: nobody knows.
 */
export function unsoldAt(curve: Curve, days: number): UnsoldAt {
  const last = curve.points.findLast((point) => point.days <= days);
  const isBeyond = curve.longestDays === null || days > curve.longestDays;
  if (isBeyond && last?.unsold !== 0) return { unsold: null, lower: null, upper: null };
  return { unsold: last?.unsold ?? 1, lower: last?.lower ?? null, upper: last?.upper ?? null };
}

/**
 * Median days to sell: the first day with at most half unsold; if exactly half and it falls further, the middle of
 * that day and the day it falls. null = half never sold. The interval (Brookmeyer & Crowley 1982) applies the same
 * rule to the lower and upper limits; null = not reached.
 */
export function medianDays(curve: Curve): { days: number | null; lower: number | null; upper: number | null } {
  const { points } = curve;
  return {
    days: halfwayDay(points.map((point) => [point.days, point.unsold])),
    lower: halfwayDay(points.map((point) => [point.days, point.lower])),
    upper: halfwayDay(points.map((point) => [point.days, point.upper])),
  };
}

function halfwayDay(steps: readonly (readonly [number, number | null])[]): number | null {
  const known = steps.filter((step): step is readonly [number, number] => step[1] !== null);
  const first = known.findIndex(([, share]) => share <= 0.5 + HALF_TOLERANCE);
  const at = known[first];
  if (at === undefined) return null;
  const next = known.slice(first + 1).find(([, share]) => share < at[1]);
  return Math.abs(at[1] - 0.5) < HALF_TOLERANCE && next !== undefined ? (at[0] + next[0]) / 2 : at[0];
}
