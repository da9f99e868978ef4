import { FEWEST_ON_RUNG, LADDER_RUNGS, type Rung } from '#shared/measures/ladder-rungs.ts';
import { contingency, type Level, rankAt } from './contingency.ts';
import type { RebuildFacts } from './facts.ts';
import { type Completed, type PlannedOutcome, planned, plannedAndTold, plannedOutcomes } from './sets.ts';
import { twoPartRule } from './two-part-rule.ts';

export { FEWEST_ON_RUNG, type Rung };

/** The car that a rule is wanted for. */
export type Car = Pick<RebuildFacts, 'class' | 'damage' | 'seen'>;

/** A rung as the car found it, whether or not it carries the rule. */
export interface TriedRung {
  readonly rung: Rung;
  readonly n: number;
  readonly k: number;
  /** n ≥ 9 and k ≤ n: the rule could stand on it. */
  readonly carries: boolean;
}

/** What the rule for a car is based on. */
export interface Footing {
  /** null = too few yet on every rung; `n` and `k` are then those of "all", so that the page can say how many lack. */
  readonly rung: Rung | null;
  readonly n: number;
  readonly k: number;
  /** The rebuilds on the rung, in the order in which they left the shop. None = too few yet. */
  readonly outcomes: readonly PlannedOutcome[];
  /** Every rung, from the finest to the widest: why it was this one. */
  readonly tried: readonly TriedRung[];
}

/** The percent rule on the rung that carries it. `taken`, `uplift` and `guarantee` as in `contingency`; null = too few yet. */
export type PercentFooting = Footing & Pick<ReturnType<typeof contingency>, 'taken' | 'uplift' | 'guarantee'>;

/** The two-part rule on the rung that carries it. Percent and cents are both null = too few yet. */
export type TwoPartFooting = Footing & Pick<ReturnType<typeof twoPartRule>, 'creepPercent' | 'flatCents'>;

/**
 * The percent rule for a car from the finest rung that carries it (definitions §18.4): class + damage + seen, then
 * damage + seen, seen, all; n ≥ 9 and k ≤ n. Over set K. Example: eight like cars and nine of that damage, all unseen:
 * based on "damage+seen".
 */
export function percentOnLadder(facts: readonly RebuildFacts[], car: Car, level: Level): PercentFooting {
  const footing = footingOf(planned(facts), car, level);
  const { taken, uplift, guarantee } = contingency(footing.outcomes, level);
  return { ...footing, taken, uplift, guarantee };
}

/** The two-part rule for a car in the same way, over set K2; its percent and its cents are those of the rung alone. */
export function twoPartOnLadder(facts: readonly RebuildFacts[], car: Car, level: Level): TwoPartFooting {
  const footing = footingOf(plannedAndTold(facts), car, level);
  const { creepPercent, flatCents } = twoPartRule(footing.outcomes, level);
  return { ...footing, creepPercent, flatCents };
}

function footingOf(set: readonly Completed[], car: Car, level: Level): Footing {
  const rungs = LADDER_RUNGS.map((rung) => {
    const members = set.filter((rebuild) => isOnRung(rung, rebuild, car));
    const [n, k] = [members.length, rankAt(members.length, level)];
    return { members, tried: { rung, n, k, carries: n >= FEWEST_ON_RUNG && k <= n } };
  });
  const tried = rungs.map((one) => one.tried);
  const found = rungs.find((one) => one.tried.carries);
  if (!found) return { rung: null, n: set.length, k: rankAt(set.length, level), outcomes: [], tried };
  const { rung, n, k } = found.tried;
  return { rung, n, k, outcomes: plannedOutcomes(found.members), tried };
}

/** Is the past rebuild like the car in what the rung looks at? What is not known of either is like nothing. */
function isOnRung(rung: Rung, rebuild: Completed, car: Car): boolean {
  if (rung === 'all') return true;
  if (car.seen === null || rebuild.seen !== car.seen) return false;
  if (rung === 'seen') return true;
  if (car.damage === null || rebuild.damage !== car.damage) return false;
  return rung === 'damage+seen' || (car.class !== null && rebuild.class === car.class);
}
