import type { Day } from '#shared/day.ts';
import { ruleReserve } from '#shared/measures/rule-reserve.ts';
import type { RebuildFacts } from './facts.ts';
import { completed, planned, plannedOutcomes } from './sets.ts';
import { type Rate, sum, wilson } from './statistics.ts';

/** An adopted rule: whole percent on top of the estimate, and cents for surprises (null = none). */
export interface AdoptedRule {
  readonly percent: number;
  readonly flatCents: number | null;
  readonly adoptedOn: Day;
}

/** One rebuild bought under a rule and finished since. Cents. */
export interface HeldTrial {
  readonly id: string;
  readonly boughtOn: Day | null;
  readonly exitOn: Day;
  readonly estimateCents: number;
  readonly overrunCents: number;
  readonly reserveCents: number;
  readonly isCovered: boolean;
  readonly shortCents: number;
  readonly unusedCents: number;
}

export interface RuleRecord extends Rate {
  /** Σ cents by which cost went past plan and reserve, and of reserve that was not needed. */
  readonly shortCents: number;
  readonly unusedCents: number;
  /** Bought under the rule, not finished yet. */
  readonly openCount: number;
  readonly openIds: readonly string[];
  /** Bought under the rule and finished, but without an estimate to hold it against. */
  readonly noEstimateIds: readonly string[];
  /** Those judged, in the order in which they left. */
  readonly trials: readonly HeldTrial[];
}

/**
 * How an adopted rule has done: only on rebuilds bought after it was adopted, inside its days, and finished with an
 * estimate since (trade: a rule is never judged on the data it was set on). Covered if B ≤ E + reserve.
 * None yet: n 0 and rate null. Example: 10 % on 1,000 covers a cost of 1,100, not one of 1,101.
 */
export function ruleRecord(
  facts: readonly RebuildFacts[],
  rule: AdoptedRule,
  days: { readonly from: Day; readonly to: Day },
): RuleRecord {
  const bought = facts.filter(({ boughtOn }) => {
    return boughtOn !== null && boughtOn > rule.adoptedOn && boughtOn >= days.from && boughtOn <= days.to;
  });
  const judged = planned(bought);
  const trials = plannedOutcomes(judged).map(({ surpriseCents: _, ...outcome }) => {
    const { overrunCents, estimateCents } = outcome;
    const reserveCents = ruleReserve(rule, estimateCents);
    const shortCents = Math.max(0, overrunCents - reserveCents);
    const unusedCents = Math.max(0, reserveCents - Math.max(0, overrunCents));
    return { ...outcome, reserveCents, isCovered: shortCents === 0, shortCents, unusedCents };
  });
  const judgedIds = new Set(judged.map(({ id }) => id));
  const openIds = bought.filter(({ exit }) => exit === null).map(({ id }) => id);
  return {
    ...wilson(trials.filter(({ isCovered }) => isCovered).length, trials.length),
    shortCents: sum(trials.map((one) => one.shortCents)),
    unusedCents: sum(trials.map((one) => one.unusedCents)),
    openCount: openIds.length,
    openIds,
    noEstimateIds: completed(bought).flatMap(({ id }) => (judgedIds.has(id) ? [] : [id])),
    trials,
  };
}

/** Days of a rule: those of its year, but only until a later revision for the same year took its place. */
export function ruleDays(
  rule: { readonly year: number; readonly revision: number },
  all: readonly { readonly year: number; readonly revision: number; readonly adoptedOn: Day }[],
  year: { readonly from: Day; readonly to: Day },
): { readonly from: Day; readonly to: Day } {
  const next = all.find((one) => one.year === rule.year && one.revision === rule.revision + 1);
  return next && next.adoptedOn < year.to ? { from: year.from, to: next.adoptedOn } : year;
}
