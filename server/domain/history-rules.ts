import { flatReserve, reserve, twoPartReserve } from '#shared/measures/reserves.ts';
import { byOverrun } from './contingency.ts';
import { RankTree } from './rank-tree.ts';
import type { PlannedOutcome } from './sets.ts';
import { creepPercent, residualCents, sortedResiduals } from './two-part-rule.ts';

/** What a rule asked for, at the time. `uplift` is the overrun taken, unrounded; a two-part rule has none. */
export interface Asked {
  readonly reserveCents: number;
  readonly uplift: number | null;
}

/**
 * A rule as it stood when the first `historySize` outcomes were known, k being its rank there. Calls must come with
 * a history that never shrinks: each outcome is then taken in once.
 */
export type HistoryRule = (historySize: number, k: number, estimateCents: number) => Asked;

/** The percent rule (§10) over growing histories of `outcomes`, which are in the order they became known. */
export function percentOverTime(outcomes: readonly PlannedOutcome[]): HistoryRule {
  const sorted = outcomes.map((outcome, index) => ({ outcome, index })).sort((a, b) => byOverrun(a.outcome, b.outcome));
  const rankOf = new Int32Array(outcomes.length);
  for (const [rank, { index }] of sorted.entries()) rankOf[index] = rank;
  const seen = growing(rankOf);
  return (historySize, k, estimateCents) => {
    const taken = sorted[seen(historySize, k)]?.outcome;
    if (taken === undefined) throw new RangeError('rank beyond the history');
    return { reserveCents: reserve(taken, estimateCents), uplift: taken.overrunCents / taken.estimateCents };
  };
}

/**
 * The two-part rule (§11b) over growing histories. The creep is a whole percent and moves little: one tree for each, over
 * no more outcomes than were known when it last came up, since most come up only while few are known.
 */
export function twoPartOverTime(outcomes: readonly PlannedOutcome[]): HistoryRule {
  const creepSums = prefixSums(outcomes.map((outcome) => outcome.overrunCents - outcome.surpriseCents));
  const estimateSums = prefixSums(outcomes.map((outcome) => outcome.estimateCents));
  const creeps = creepSums.map((creepCents, size) => creepPercent(creepCents, estimateSums[size] ?? 0));
  const lastSize = new Map(creeps.map((creep, size) => [creep, size]));
  const byCreep = new Map<number, (historySize: number, k: number) => number>();
  return (historySize, k, estimateCents) => {
    const creep = creeps[historySize] ?? 0;
    const kth = byCreep.get(creep) ?? residualsOverTime(outcomes.slice(0, lastSize.get(creep)), creep);
    byCreep.set(creep, kth);
    const flatCents = Math.max(0, kth(historySize, k));
    return { reserveCents: twoPartReserve(creep, flatCents, estimateCents), uplift: null };
  };
}

/** A flat percentage, whatever was known. */
export function flatOverTime(percent: number): HistoryRule {
  return (_historySize, _k, estimateCents) => ({ reserveCents: flatReserve(percent, estimateCents), uplift: null });
}

/** Equal residuals share the rank of the first of them: whichever of them is the k-th, it is the same sum. */
function residualsOverTime(outcomes: readonly PlannedOutcome[], creep: number): (size: number, k: number) => number {
  const sorted = sortedResiduals(outcomes, creep);
  const rankOf = new Int32Array(outcomes.map((outcome) => placeIn(sorted, residualCents(outcome, creep))));
  const seen = growing(rankOf);
  return (size, k) => sorted[seen(size, k)] ?? 0;
}

/** How many of the sorted values are below this one. */
function placeIn(sorted: Float64Array, value: number): number {
  let [low, high] = [0, sorted.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((sorted[middle] ?? value) < value) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Rank of the k-th smallest among the first `size` items, `size` never shrinking. */
function growing(rankOf: Int32Array): (size: number, k: number) => number {
  const tree = new RankTree(rankOf.length);
  let taken = 0;
  return (size, k) => {
    for (; taken < size; taken += 1) tree.add(rankOf[taken] ?? 0);
    return tree.kth(k);
  };
}

function prefixSums(values: readonly number[]): number[] {
  const sums = [0];
  for (const value of values) sums.push((sums[sums.length - 1] ?? 0) + value);
  return sums;
}
