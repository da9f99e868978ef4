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
  const runs = options.levels.map((level) => ({ level, rules: rules.map((rule) => startOf(rule, outcomes.length)) }));
  // A rule takes in each outcome once, so rebuilds are visited by what was known, not by when they left.
  const visits = [...histories.keys()].sort((a, b) => (histories[a] ?? 0) - (histories[b] ?? 0));
  for (const i of visits) for (const run of runs) visit(run, i, outcomes[i] as PlannedOutcome, histories[i] ?? 0);
  const skippedCount = histories.filter((size) => size < SHORTEST_HISTORY).length;
  return runs.map((run) => {
    const scored = run.rules[0]?.tally.scored ?? 0;
    return {
      level: run.level,
      skippedCount,
      notAttainableCount: outcomes.length - skippedCount - scored,
      scores: Object.fromEntries(run.rules.map(({ name, tally }) => [name, scoreOf(tally)])),
      trials: Object.fromEntries(run.rules.flatMap(({ name, trials }) => (trials ? [[name, trials]] : []))),
    };
  });
}

interface Run {
  readonly level: Level;
  readonly rules: readonly ReturnType<typeof startOf>[];
}

function rulesFor(outcomes: readonly PlannedOutcome[], withTwoPart: boolean): [RuleName, HistoryRule][] {
  const flat = FLAT_PERCENTS.map((percent): [RuleName, HistoryRule] => [`flat${percent}`, flatOverTime(percent)]);
  const twoPart: [RuleName, HistoryRule][] = withTwoPart ? [['twoPart', twoPartOverTime(outcomes)]] : [];
  return [['percent', percentOverTime(outcomes)], ...twoPart, ...flat];
}

/** A rule before its first trial; flat ones keep no trials, only their sums. */
function startOf([name, rule]: [RuleName, HistoryRule], size: number) {
  const tally = { scored: 0, covered: 0, shortCents: 0, unusedCents: 0, reserveCents: 0 };
  const trials = name.startsWith('flat') ? null : Array.from<Trial>({ length: size });
  return { name, rule, tally, trials };
}

function visit({ level, rules }: Run, i: number, outcome: PlannedOutcome, historySize: number): void {
  const { id, exitOn, estimateCents, overrunCents } = outcome;
  const k = rankAt(historySize, level);
  const canAsk = historySize >= SHORTEST_HISTORY && k <= historySize;
  for (const { rule, tally, trials } of rules) {
    const asked = canAsk ? judge(rule(historySize, k, estimateCents), overrunCents) : null;
    if (trials) trials[i] = { id, exitOn, estimateCents, overrunCents, historySize, k, asked };
    if (asked === null) continue;
    tally.scored += 1;
    tally.covered += asked.isCovered ? 1 : 0;
    tally.shortCents += asked.shortCents;
    tally.unusedCents += asked.unusedCents;
    tally.reserveCents += asked.reserveCents;
  }
}

function judge({ reserveCents, uplift }: Asked, overrunCents: number): NonNullable<Trial['asked']> {
  const shortCents = Math.max(0, overrunCents - reserveCents);
  const unusedCents = Math.max(0, reserveCents - Math.max(0, overrunCents));
  return { reserveCents, uplift, isCovered: shortCents === 0, shortCents, unusedCents };
}

function scoreOf({
  scored,
  covered,
  shortCents,
  unusedCents,
  reserveCents,
}: ReturnType<typeof startOf>['tally']): Score {
  return { ...wilson(covered, scored), shortCents, unusedCents, reserveCents };
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
