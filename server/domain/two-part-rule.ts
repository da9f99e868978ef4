import { ceilProduct } from '#shared/exact.ts';
import { flatReserve } from '#shared/measures/reserves.ts';
import { type Level, rankAt } from './contingency.ts';
import type { RebuildFacts } from './facts.ts';
import { type PlannedOutcome, planned, plannedAndTold, plannedOutcomes } from './sets.ts';
import { sum } from './statistics.ts';

export interface TwoPartRule {
  readonly n: number;
  readonly level: Level;
  /** Known work costing more, whole percent. null = no past rebuild. */
  readonly creepPercent: number | null;
  readonly k: number;
  /** For surprises, cents ≥ 0. null = too few yet. */
  readonly flatCents: number | null;
}

/**
 * Whole percent by which known work costs more than planned: ceil(100·Σ(B − U − E)/ΣE), 0 if that is negative.
 * `creepCents` = Σ(B − U − E) and `estimateCents` = ΣE > 0, both over the same rebuilds.
 */
export function creepPercent(creepCents: number, estimateCents: number): number {
  return creepCents <= 0 ? 0 : ceilProduct(100, creepCents, estimateCents);
}

/** d = B − E − ceil(a·E): what a rebuild cost above its plan and the creep, cents. */
export function residualCents(outcome: PlannedOutcome, creep: number): number {
  return outcome.overrunCents - flatReserve(creep, outcome.estimateCents);
}

/** The residuals of a set at one creep, the smallest first. A numeric array sorts itself without asking back for each pair. */
export function sortedResiduals(set: readonly PlannedOutcome[], creep: number): Float64Array {
  return new Float64Array(set.map((outcome) => residualCents(outcome, creep))).sort();
}

/**
 * Percent for known work costing more, dollars for surprises (definitions §11b, §18.3): budget = E + ceil(a·E) + b,
 * a = `creepPercent`, b = max(0, k-th of the sorted residuals), k as in §10. a comes from the same rebuilds, so the
 * guarantee is approximate: show it with its back-test. Example: creep 0, overruns 1 to 9 at 4/5: b = 8.
 */
export function twoPartRule(set: readonly PlannedOutcome[], level: Level): TwoPartRule {
  const n = set.length;
  const k = rankAt(n, level);
  if (n === 0) return { n, level, creepPercent: null, k, flatCents: null };
  const creepCents = sum(set.map((outcome) => outcome.overrunCents - outcome.surpriseCents));
  const creep = creepPercent(creepCents, sum(set.map((outcome) => outcome.estimateCents)));
  const taken = sortedResiduals(set, creep)[k - 1];
  return { n, level, creepPercent: creep, k, flatCents: taken === undefined ? null : Math.max(0, taken) };
}

/** `twoPartRule` over the shop (set K2), and how many of K are left out because an entry's foreseen is not known. */
export function twoPartRules(
  facts: readonly RebuildFacts[],
  levels: readonly Level[],
): { readonly rules: readonly TwoPartRule[]; readonly unknownCount: number } {
  const outcomes = plannedOutcomes(plannedAndTold(facts));
  return {
    rules: levels.map((level) => twoPartRule(outcomes, level)),
    unknownCount: planned(facts).length - outcomes.length,
  };
}
