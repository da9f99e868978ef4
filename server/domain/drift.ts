import { type Day, isDay } from '#shared/day.ts';
import { byOverrun, type Contingency, contingency, type Level } from './contingency.ts';
import { coveredChances } from './covered-chances.ts';
import type { PlannedOutcome } from './sets.ts';
import { sum } from './statistics.ts';

/** A warning either way is right at most this often when nothing has changed: 1 in 40, and so 1 in 20 for both. */
const CHANCE_OF_FALSE_WARNING = 1 / 40;

/** How the last 24 months compare with the time before. `agrees` = no sign of a change, which is no proof that there is none. */
export type DriftVerdict = 'costs more' | 'costs less' | 'agrees';

export interface Drift {
  /** The last 24 months are the days after this one. */
  readonly after: Day;
  /** The figure over all years, over the last 24 months alone, and over the years before them. */
  readonly all: Contingency;
  readonly recent: Contingency;
  readonly before: Contingency;
  /** Recent rebuilds that stayed within the figure of the years before. null = no such figure. */
  readonly withinCount: number | null;
  /** How many of them would if nothing had changed: m·k/(n + 1). null = no such figure. */
  readonly expectedCount: number | null;
  /** Chance, if nothing has changed, of as few within or fewer, and of as many below or more. null = no such figure. */
  readonly chanceOfFew: number | null;
  readonly chanceOfMany: number | null;
  /** null = too few yet: not even a recent time with no rebuild within would say anything. */
  readonly verdict: DriftVerdict | null;
}

const NO_FIGURE = { withinCount: null, expectedCount: null, chanceOfFew: null, chanceOfMany: null, verdict: null };

/**
 * Do the last 24 months still agree with the years before? The rule is set on the years before and held
 * against the recent rebuilds, which took no part in it; how many of those stay within has a known distribution as long
 * as nothing changes, whatever the overruns look like (`coveredChances`). Few within: rebuilds cost more now. Ties count
 * against a warning either way. `outcomes` are those of the rule's rung, `asOf` the day of looking.
 * Example: figure of 30 at 4/5 and 3 of 12 recent ones within, where 9.7 were to be expected: costs more.
 */
export function drift(outcomes: readonly PlannedOutcome[], level: Level, asOf: Day): Drift {
  const after = twoYearsBefore(asOf);
  const recentOnes = outcomes.filter(({ exitOn }) => exitOn > after);
  const before = contingency(
    outcomes.filter(({ exitOn }) => exitOn <= after),
    level,
  );
  const figures = { after, all: contingency(outcomes, level), recent: contingency(recentOnes, level), before };
  const { taken, n, k } = before;
  if (taken === null) return { ...figures, ...NO_FIGURE };
  const m = recentOnes.length;
  const withinCount = recentOnes.filter((outcome) => byOverrun(outcome, taken) <= 0).length;
  const belowCount = recentOnes.filter((outcome) => byOverrun(outcome, taken) < 0).length;
  const chances = coveredChances({ n, k, m });
  const chanceOfFew = sum(chances.slice(0, withinCount + 1));
  const chanceOfMany = sum(chances.slice(belowCount));
  const canTell = (chances[0] ?? 1) <= CHANCE_OF_FALSE_WARNING;
  const verdict = canTell ? verdictOf(chanceOfFew, chanceOfMany) : null;
  return { ...figures, withinCount, expectedCount: (m * k) / (n + 1), chanceOfFew, chanceOfMany, verdict };
}

function verdictOf(chanceOfFew: number, chanceOfMany: number): DriftVerdict {
  if (chanceOfFew <= CHANCE_OF_FALSE_WARNING) return 'costs more';
  return chanceOfMany <= CHANCE_OF_FALSE_WARNING ? 'costs less' : 'agrees';
}

/** The same day two years earlier; 29 February has 28 February. */
function twoYearsBefore(day: Day): Day {
  const earlier = `${String(Number(day.slice(0, 4)) - 2).padStart(4, '0')}${day.slice(4)}`;
  return isDay(earlier) ? earlier : `${earlier.slice(0, 8)}28`;
}
