import type { Day } from '#shared/day.ts';
import { twoPartReserve } from '#shared/measures/reserves.ts';
import type { RebuildFacts } from './facts.ts';
import { plannedOutcomes, planned } from './sets.ts';
import { type Rate, wilson } from './statistics.ts';

/** An adopted rule: whole percent on top of the estimate, and cents for surprises (null = none). */
export interface AdoptedRule {
  readonly percent: number;
  readonly flatCents: number | null;
  readonly adoptedOn: Day;
}

export interface RuleRecord extends Rate {
  /** Σ cents by which cost went past plan and reserve, and of reserve that was not needed. */
  readonly shortCents: number;
  readonly unusedCents: number;
  /** Bought under the rule, not finished yet. */
  readonly openCount: number;
}

/**
 * How an adopted rule has done: only on rebuilds bought after it was adopted, inside its year, and finished with an
 * estimate since (trade: a rule is never judged on the data it was set on). Covered if B ≤ E + reserve.
 * None yet: n 0 and rate null. Example: 10 % on 1,000 covers a cost of 1,100, not one of 1,101.
 */
export function ruleRecord(
  facts: readonly RebuildFacts[],
  rule: AdoptedRule,
  year: { readonly from: Day; readonly to: Day },
): RuleRecord {
  const bought = facts.filter(({ boughtOn }) => {
    return boughtOn !== null && boughtOn > rule.adoptedOn && boughtOn >= year.from && boughtOn <= year.to;
  });
  const over = plannedOutcomes(planned(bought)).map(({ overrunCents, estimateCents }) => {
    return { overrunCents, reserveCents: twoPartReserve(rule.percent, rule.flatCents ?? 0, estimateCents) };
  });
  const total = (part: (one: (typeof over)[number]) => number) => over.reduce((sum, one) => sum + part(one), 0);
  return {
    ...wilson(over.filter((one) => one.overrunCents <= one.reserveCents).length, over.length),
    shortCents: total((one) => Math.max(0, one.overrunCents - one.reserveCents)),
    unusedCents: total((one) => Math.max(0, one.reserveCents - Math.max(0, one.overrunCents))),
    openCount: bought.filter(({ exit }) => exit === null).length,
  };
}
