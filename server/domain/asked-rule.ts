import type { Day } from '#shared/day.ts';
import { contingency, type Level, wholePercent } from './contingency.ts';
import type { RebuildFacts } from './facts.ts';
import { type PlannedOutcome, planned, plannedAndTold, plannedOutcomes } from './sets.ts';
import { twoPartRule } from './two-part-rule.ts';

/** What the books ask for, as it would be adopted. */
export interface AskedRule {
  /** Whole percent on top of the estimate. */
  readonly percent: number;
  /** For surprises, cents, raised to whole units of money. null = a percent rule. */
  readonly flatCents: number | null;
  readonly n: number;
  readonly k: number;
  /** The last day on which one of them left. */
  readonly dataUntil: Day;
  /** Before rounding up: the overrun taken, or the cents. */
  readonly uplift: number | null;
  readonly exactFlatCents: number | null;
}

/**
 * The figure to adopt: the overrun taken raised to a whole percent (§10), or the creep in percent and the flat part
 * raised to a whole unit of money (§11b), over all finished rebuilds. null = too few yet at this level.
 * Example: 23.17 % taken asks for 24; 449.11 for surprises asks for 450.
 */
export function askedRule(
  facts: readonly RebuildFacts[],
  { kind, level }: { readonly kind: 'percent' | 'two-part'; readonly level: Level },
): AskedRule | null {
  const outcomes = plannedOutcomes(kind === 'percent' ? planned(facts) : plannedAndTold(facts));
  const dataUntil = outcomes.at(-1)?.exitOn;
  const figures = kind === 'percent' ? percentFigures(outcomes, level) : twoPartFigures(outcomes, level);
  return figures && dataUntil !== undefined ? { ...figures, n: outcomes.length, dataUntil } : null;
}

function percentFigures(outcomes: readonly PlannedOutcome[], level: Level) {
  const { k, taken, uplift } = contingency(outcomes, level);
  return taken && { percent: wholePercent(taken), flatCents: null, k, uplift, exactFlatCents: null };
}

function twoPartFigures(outcomes: readonly PlannedOutcome[], level: Level) {
  const { k, creepPercent, flatCents } = twoPartRule(outcomes, level);
  if (creepPercent === null || flatCents === null) return null;
  return { percent: creepPercent, flatCents: wholeUnits(flatCents), k, uplift: null, exactFlatCents: flatCents };
}

/** Cents raised to a whole unit of money. */
export function wholeUnits(cents: number): number {
  return Math.ceil(cents / 100) * 100;
}
