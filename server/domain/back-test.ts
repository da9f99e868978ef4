import { type Level, rankAt } from './contingency.ts';
import type { RebuildFacts } from './facts.ts';
import { type Asked, flatOverTime, type HistoryRule, percentOverTime, twoPartOverTime } from './history-rules.ts';
import { type PlannedOutcome, planned, plannedAndTold, plannedOutcomes } from './sets.ts';
import { type Rate, wilson } from './statistics.ts';

/** A history shorter than this is not scored (§11). */
const SHORTEST_HISTORY = 5;

/** Flat percentages scored beside the rules. */
export const FLAT_PERCENTS = [10, 15, 20, 25] as const;

/**
 * What the rule may look at: `asKnown` = rebuilds that had left the shop before this one was bought (show this one);
 * `sequence` = every earlier one, though its outcome may not have been known yet (for comparison).
 */
export type Knowledge = 'asKnown' | 'sequence';

export type RuleName = 'percent' | 'twoPart' | `flat${(typeof FLAT_PERCENTS)[number]}`;

/** How a rule did. `rate` = covered ÷ scored; overlapping histories make its interval approximate. */
export interface Score extends Rate {
  /** Σ cents by which cost went past plan and reserve. */
  readonly shortCents: number;
  /** Σ cents of reserve that were not needed. */
  readonly unusedCents: number;
  readonly reserveCents: number;
}

/** One rebuild in the back-test. */
export interface Trial {
  readonly id: string;
  readonly exitOn: string;
  readonly estimateCents: number;
  readonly overrunCents: number;
  readonly historySize: number;
  readonly k: number;
  /** null = too few yet: fewer than five known, or k above their number. */
  readonly asked:
    | (Asked & { readonly isCovered: boolean; readonly shortCents: number; readonly unusedCents: number })
    | null;
}

export interface BackTestLevel {
  readonly level: Level;
  /** Fewer than five rebuilds known: not scored at any level. */
  readonly skippedCount: number;
  /** Enough known to look, too few for this level. */
  readonly notAttainableCount: number;
  /** Per rule that was run, all over the same rebuilds. */
  readonly scores: Partial<Record<RuleName, Score>>;
  /** Per rule made from the past, each rebuild in exit order: for the picture and the rows behind it. */
  readonly trials: Partial<Record<RuleName, readonly Trial[]>>;
}

/** The percent rule and the flat ones over set K (back-test 1 of §18.3). */
export function backTest(
  facts: readonly RebuildFacts[],
  levels: readonly Level[],
  knowledge: Knowledge,
): BackTestLevel[] {
  return walkForward(plannedOutcomes(planned(facts)), { levels, knowledge, withTwoPart: false });
}

/** The same with the two-part rule, over set K2, so that all are scored on the same rebuilds (back-test 2). */
export function backTestTwoPart(
  facts: readonly RebuildFacts[],
  levels: readonly Level[],
  knowledge: Knowledge,
): BackTestLevel[] {
  return walkForward(plannedOutcomes(plannedAndTold(facts)), { levels, knowledge, withTwoPart: true });
}

/**
 * Would the rule have covered the next rebuild? (definitions §11, §18.3) For each rebuild in exit order the rule is set
 * from its history only: covered if B ≤ E + r, short = Σ max(0, B − E − r), unused = Σ max(0, r − max(0, B − E)).
 * `outcomes` are in exit order. Nothing scored: rate null, sums 0. Say "rules set this way would have covered 29 of 35".
 */
export function walkForward(
  outcomes: readonly PlannedOutcome[],
  options: { readonly levels: readonly Level[]; readonly knowledge: Knowledge; readonly withTwoPart: boolean },
): BackTestLevel[] {
  const histories = outcomes.map((outcome, i) =>
    options.knowledge === 'sequence' ? i : knownBefore(outcomes, outcome, i),
  );
  const rules = rulesFor(outcomes, options.withTwoPart);
  const trials = options.levels.map(() => new Map<RuleName, Trial[]>(rules.map(([name]) => [name, []])));
  // A rule takes in each outcome once, so rebuilds are visited by what was known, not by when they left.
  for (const i of [...histories.keys()].sort((a, b) => (histories[a] ?? 0) - (histories[b] ?? 0))) {
    for (const [l, level] of options.levels.entries()) {
      for (const [name, rule] of rules) {
        const list = trials[l]?.get(name);
        if (list) list[i] = trial(outcomes[i] as PlannedOutcome, histories[i] ?? 0, level, rule);
      }
    }
  }
  const skippedCount = histories.filter((size) => size < SHORTEST_HISTORY).length;
  return options.levels.map((level, l) => summary(level, skippedCount, trials[l] ?? new Map()));
}

function rulesFor(outcomes: readonly PlannedOutcome[], withTwoPart: boolean): [RuleName, HistoryRule][] {
  const flat = FLAT_PERCENTS.map((percent): [RuleName, HistoryRule] => [`flat${percent}`, flatOverTime(percent)]);
  const twoPart: [RuleName, HistoryRule][] = withTwoPart ? [['twoPart', twoPartOverTime(outcomes)]] : [];
  return [['percent', percentOverTime(outcomes)], ...twoPart, ...flat];
}

function summary(level: Level, skippedCount: number, trials: ReadonlyMap<RuleName, readonly Trial[]>): BackTestLevel {
  const unasked = (trials.get('percent') ?? []).filter((one) => one.asked === null).length;
  return {
    level,
    skippedCount,
    notAttainableCount: unasked - skippedCount,
    scores: Object.fromEntries([...trials].map(([name, list]) => [name, score(list)])),
    trials: Object.fromEntries(trials),
  };
}

/** How many of the outcomes before place `i` had left the shop before this one was bought. No day: nothing known. */
function knownBefore(outcomes: readonly PlannedOutcome[], { boughtOn }: PlannedOutcome, i: number): number {
  if (boughtOn === null) return 0;
  let [low, high] = [0, i];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((outcomes[middle]?.exitOn ?? boughtOn) < boughtOn) low = middle + 1;
    else high = middle;
  }
  return low;
}

function trial(outcome: PlannedOutcome, historySize: number, level: Level, rule: HistoryRule): Trial {
  const { id, exitOn, estimateCents, overrunCents } = outcome;
  const k = rankAt(historySize, level);
  const base = { id, exitOn, estimateCents, overrunCents, historySize, k };
  if (historySize < SHORTEST_HISTORY || k > historySize) return { ...base, asked: null };
  const { reserveCents, uplift } = rule(historySize, k, estimateCents);
  const shortCents = Math.max(0, overrunCents - reserveCents);
  const unusedCents = Math.max(0, reserveCents - Math.max(0, overrunCents));
  return { ...base, asked: { reserveCents, uplift, isCovered: shortCents === 0, shortCents, unusedCents } };
}

function score(trials: readonly Trial[]): Score {
  let [scored, covered, shortCents, unusedCents, reserveCents] = [0, 0, 0, 0, 0];
  for (const { asked } of trials) {
    if (asked === null) continue;
    scored += 1;
    covered += asked.isCovered ? 1 : 0;
    shortCents += asked.shortCents;
    unusedCents += asked.unusedCents;
    reserveCents += asked.reserveCents;
  }
  return { ...wilson(covered, scored), shortCents, unusedCents, reserveCents };
}
