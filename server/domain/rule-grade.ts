import { coveredChances } from './covered-chances.ts';
import { sum } from './statistics.ts';

/** Said of a rule only where chance alone would do it at most this often: 1 in 40 either way. */
const CHANCE_OF_LUCK = 1 / 40;

/** `luck` = chance alone may well do this, which proves neither that the rule holds nor that it does not. */
export type GradeVerdict = 'held less often' | 'held more often' | 'luck';

export interface RuleGrade {
  /** How many of them the rule was to hold: m·k/(n + 1). */
  readonly expectedCount: number;
  /** Chance, if nothing has changed, of as few held or fewer, and of as many or more. */
  readonly chanceOfFew: number;
  readonly chanceOfMany: number;
  /** null = too few yet: not even none held would say anything. */
  readonly verdict: GradeVerdict | null;
}

/**
 * Did an adopted rule hold as often as it was set to? It was taken as the k-th of n sorted overruns; of `m` rebuilds
 * bought after it, if nothing has changed, the number held is distributed as `coveredChances` says, whatever the overruns
 * look like (Gumbel & von Schelling 1950). Exact for the percent rule as computed; one rounded up holds a little more
 * often, and the two-part rule only roughly so often. m 0: expected 0 and no verdict.
 * Example: the 25th of 30; of 12 later ones 9.7 are to be expected, and 9 held is luck.
 */
export function ruleGrade({ n, k, m, held }: { n: number; k: number; m: number; held: number }): RuleGrade {
  const chances = coveredChances({ n, k, m });
  const chanceOfFew = sum(chances.slice(0, held + 1));
  const chanceOfMany = sum(chances.slice(held));
  const canTell = m > 0 && (chances[0] ?? 1) <= CHANCE_OF_LUCK;
  const verdict = canTell ? verdictOf(chanceOfFew, chanceOfMany) : null;
  return { expectedCount: (m * k) / (n + 1), chanceOfFew, chanceOfMany, verdict };
}

function verdictOf(chanceOfFew: number, chanceOfMany: number): GradeVerdict {
  if (chanceOfFew <= CHANCE_OF_LUCK) return 'held less often';
  return chanceOfMany <= CHANCE_OF_LUCK ? 'held more often' : 'luck';
}
