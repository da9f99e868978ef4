import { sum, Z } from './statistics.ts';

/** One group's mean and the sampling variance of that mean. */
export interface GroupMean {
  readonly mean: number;
  readonly variance: number;
}

export interface Shrunken {
  /** λ: how far the group's own mean counts, 0 to 1. */
  readonly weight: number;
  /** θ: the mean pulled toward the average of all groups. */
  readonly value: number;
  readonly standardError: number;
  readonly lower: number;
  readonly upper: number;
}

export interface RandomEffects {
  /** μ: the average of the groups. */
  readonly mean: number;
  readonly standardError: number;
  readonly lower: number;
  readonly upper: number;
  /** τ²: variance between the groups; 0 = no difference shown. */
  readonly betweenVariance: number;
  readonly q: number;
  /** One per group, in the order given. */
  readonly groups: readonly Shrunken[];
}

/**
 * Random effects by DerSimonian & Laird (1986), with each group pulled toward the average (definitions §9).
 * w = 1/v, Q = Σ w(ȳ − ȳ_w)², τ² = max(0, (Q − (G − 1)) / (Σw − Σw²/Σw)), w* = 1/(v + τ²), μ = Σw*ȳ/Σw*,
 * λ = τ²/(τ² + v), θ = λȳ + (1 − λ)μ, se² = λv + (1 − λ)²·se(μ)²; limits ± z·se.
 * null = fewer than two groups, or a variance that is not above 0.
 * Example: means 0.1, 0.1, 0.1: τ² 0, every θ 0.1.
 */
export function randomEffects(groups: readonly GroupMean[]): RandomEffects | null {
  if (groups.length < 2 || groups.some((group) => !(group.variance > 0))) return null;
  const weights = groups.map((group) => 1 / group.variance);
  const total = sum(weights);
  const fixed = weighted(groups, weights);
  const q = sum(groups.map((group, i) => (weights[i] ?? 0) * (group.mean - fixed) ** 2));
  const scale = total - sum(weights.map((weight) => weight * weight)) / total;
  const betweenVariance = Math.max(0, (q - (groups.length - 1)) / scale);
  const random = groups.map((group) => 1 / (group.variance + betweenVariance));
  const mean = weighted(groups, random);
  const standardError = 1 / Math.sqrt(sum(random));
  return {
    ...around(mean, standardError),
    mean,
    betweenVariance,
    q,
    groups: groups.map((group) => shrink(group, betweenVariance, mean, standardError)),
  };
}

function shrink(group: GroupMean, betweenVariance: number, mean: number, standardError: number): Shrunken {
  const weight = betweenVariance / (betweenVariance + group.variance);
  const value = weight * group.mean + (1 - weight) * mean;
  const own = Math.sqrt(weight * group.variance + (1 - weight) ** 2 * standardError ** 2);
  return { weight, value, ...around(value, own) };
}

function weighted(groups: readonly GroupMean[], weights: readonly number[]): number {
  return sum(groups.map((group, i) => (weights[i] ?? 0) * group.mean)) / sum(weights);
}

function around(center: number, standardError: number): { standardError: number; lower: number; upper: number } {
  return { standardError, lower: center - Z * standardError, upper: center + Z * standardError };
}
