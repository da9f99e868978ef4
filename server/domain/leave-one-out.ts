import type { Overran } from '#shared/measures/reserves.ts';
import { byOverrun, type Level, rankAt } from './contingency.ts';
import type { PlannedOutcome } from './sets.ts';
import { sum } from './statistics.ts';
import { creepPercent, residualCents, sortedResiduals } from './two-part-rule.ts';

/** Between what a figure moves when any one rebuild is left out of it. */
export interface Moves<T> {
  readonly lowest: T;
  readonly highest: T;
}

/**
 * How far one rebuild moves the percent rule. Of n sorted overruns the rule of the n − 1 others takes the k-th, k =
 * ceil(n·p/q): that stays the k-th where the one left out stood after it, and is the next where it stood before. So
 * there are two outcomes however many rebuilds there are, and no rule is set anew. null = too few without one of them.
 * Example: overruns 1 to 10 at 4/5 take the ninth; without any one the eighth of nine: 8, or 9.
 */
export function percentWithoutOne(set: readonly Overran[], level: Level): Moves<Overran> | null {
  const k = rankAt(set.length - 1, level);
  const sorted = set.toSorted(byOverrun);
  const [lowest, highest] = [sorted[k - 1], sorted[k]];
  return lowest && highest ? { lowest, highest } : null;
}

/**
 * The same of the two-part rule: its whole percent, and its cents for surprises. The percent takes few values, so the
 * residuals are sorted once for each of them. null = too few without one of them.
 */
export function twoPartWithoutOne(
  set: readonly PlannedOutcome[],
  level: Level,
): { readonly creepPercent: Moves<number>; readonly flatCents: Moves<number> } | null {
  const k = rankAt(set.length - 1, level);
  if (set.length < 2 || k > set.length - 1) return null;
  const creepCents = sum(set.map((one) => one.overrunCents - one.surpriseCents));
  const estimateCents = sum(set.map((one) => one.estimateCents));
  const sortedAt = new Map<number, Float64Array>();
  const [creeps, flats]: [number[], number[]] = [[], []];
  for (const one of set) {
    const creep = creepPercent(creepCents - one.overrunCents + one.surpriseCents, estimateCents - one.estimateCents);
    const sorted = sortedAt.get(creep) ?? sortedResiduals(set, creep);
    sortedAt.set(creep, sorted);
    const [kth, next] = [sorted[k - 1] ?? 0, sorted[k] ?? 0];
    creeps.push(creep);
    flats.push(Math.max(0, residualCents(one, creep) <= kth ? next : kth));
  }
  return { creepPercent: movesOf(creeps), flatCents: movesOf(flats) };
}

function movesOf(values: readonly number[]): Moves<number> {
  const lowest = values.reduce((a, b) => Math.min(a, b));
  return { lowest, highest: values.reduce((a, b) => Math.max(a, b)) };
}
