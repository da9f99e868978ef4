import { type RandomEffects, randomEffects, type Shrunken } from './random-effects.ts';
import { FEW, type Interval, mean, sampleDeviation, sum, tInterval } from './statistics.ts';
import { byCodePoint } from './text-order.ts';

/** One rebuild's number and the group it belongs to. */
export interface GroupedValue {
  readonly group: string;
  readonly value: number;
}

export interface ComparedGroup {
  readonly group: string;
  readonly n: number;
  readonly mean: number;
  /** Sample SD; null = one rebuild. */
  readonly deviation: number | null;
  /** 95 % t interval of the plain mean; null = one rebuild. */
  readonly interval: Interval | null;
  /** Sampling variance of the mean; null where the groups cannot be pooled. */
  readonly variance: number | null;
  /** The mean pulled toward the shop's average; null where the groups cannot be pooled. */
  readonly shrunken: Shrunken | null;
  readonly isThin: boolean;
}

export interface GroupComparison {
  readonly n: number;
  /** s²: variance within groups; null = no group has two rebuilds. */
  readonly withinVariance: number | null;
  /** null = one group, one rebuild per group, or no spread at all. */
  readonly pooled: Omit<RandomEffects, 'groups'> | null;
  /** By name. Rank and color them by the shrunken value, never by the mean. */
  readonly groups: readonly ComparedGroup[];
}

/**
 * Groups side by side (definitions §9), each pulled toward the shop's average as far as its few rebuilds demand:
 * s² = Σ(y − ȳ_g)²/(N − G), v = s²/n_g, then random effects. A group of one takes part with v = s².
 * Nothing to compare: no groups. The best of many small groups is mostly luck; do not test pairs.
 */
export function groupComparison(values: readonly GroupedValue[]): GroupComparison {
  const groups = new Map<string, number[]>();
  for (const { group, value } of values) {
    const members = groups.get(group);
    if (members) members.push(value);
    else groups.set(group, [value]);
  }
  return compareGroups(groups);
}

/** The same of values that are grouped already. */
export function compareGroups(groups: ReadonlyMap<string, readonly number[]>): GroupComparison {
  const plain = [...groups]
    .sort(([a], [b]) => byCodePoint(a, b))
    .map(([group, members]) => ({ group, members, mean: mean(members) ?? 0 }));
  const withinVariance = pooledVariance(plain);
  const variances = plain.map(({ members }) => (withinVariance === null ? null : withinVariance / members.length));
  const fit = withinVariance
    ? randomEffects(plain.map((one, i) => ({ mean: one.mean, variance: variances[i] ?? 0 })))
    : null;
  return {
    n: sum(plain.map(({ members }) => members.length)),
    withinVariance,
    pooled: fit && withoutGroups(fit),
    groups: plain.map(({ group, members, mean: center }, i) => {
      const deviation = sampleDeviation(members);
      return {
        group,
        n: members.length,
        mean: center,
        deviation,
        interval: tInterval(center, deviation, members.length),
        variance: fit && (variances[i] ?? null),
        shrunken: fit?.groups[i] ?? null,
        isThin: members.length < FEW,
      };
    }),
  };
}

function pooledVariance(groups: readonly { members: readonly number[]; mean: number }[]): number | null {
  const free = sum(groups.map(({ members }) => members.length - 1));
  if (free === 0) return null;
  const squares = groups.map(({ members, mean: center }) =>
    sampleDeviation(members) === 0 ? 0 : sum(members.map((value) => (value - center) ** 2)),
  );
  return sum(squares) / free;
}

function withoutGroups({ groups: _, ...pooled }: RandomEffects): Omit<RandomEffects, 'groups'> {
  return pooled;
}
