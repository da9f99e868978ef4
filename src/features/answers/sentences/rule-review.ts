import type { GradedRule, RuleReview } from '#shared/contracts/answers-rule-review.ts';
import type { Formatter } from '#shared/formatter.ts';
import { capital } from '../../../lib/capital.ts';
import { mark, type Said, type Sentence, said, say, words } from './parts.ts';

/** Did the rule hold? On what was bought under it only. */
export function sayReview({ reviewed, thisYear }: RuleReview, format: Formatter): Said {
  if (!reviewed) {
    return {
      answer: [`No rule has been adopted up to ${thisYear}, so there is none to look back at.`],
      cautions: ['Adopt one for a year, and it is judged on what is bought under it.'],
    };
  }
  return { answer: sentence(reviewed, format), cautions: cautions(reviewed, format) };
}

function sentence(rule: GradedRule, format: Formatter): Sentence {
  const { n, x } = rule.record;
  const which = `The rule for ${rule.year}`;
  if (n === 0) return [`${which} has nothing to be judged on yet: nothing bought under it is finished.`];
  const held = mark(`${format.number(x)} of ${format.number(n)}`);
  const expected = expectedText(rule, format);
  return say`${which} held ${held}, where ${expected}: ${verdictWords(rule)}.`;
}

/** `about 10 were to be expected`. */
export function expectedText({ grade }: GradedRule, format: Formatter): string {
  const expected = Math.round(grade.expectedCount);
  return `about ${format.number(expected)} ${expected === 1 ? 'was' : 'were'} to be expected`;
}

const VERDICTS = {
  luck: 'that could be luck',
  'held less often': 'too few for luck alone',
  'held more often': 'more than luck alone would do',
} as const;

/** What the grade says, in words. */
export function verdictWords({ grade: { verdict } }: GradedRule): string {
  return verdict === null ? 'too few yet to say' : VERDICTS[verdict];
}

function cautions(rule: GradedRule, format: Formatter): string[] {
  const { n, openCount, shortCents, unusedCents, lower, upper } = rule.record;
  const sure = n > 0 && lower !== null && upper !== null;
  return said(
    'Judged only on what was bought after it was adopted; it was not set on any of these.',
    sure &&
      `The share it holds in the long run may lie anywhere between ${format.percent(lower)} and ${format.percent(upper)} (roughly 95% sure).`,
    n > 0 && moneyText(shortCents, unusedCents, format),
    openCount > 0 &&
      `${capital(words(format, openCount))} bought under it ${openCount === 1 ? 'is' : 'are'} not finished and may still change this.`,
    isBelowAsked(rule) && 'It was set below what the books asked for, so fewer were to be expected.',
  );
}

function moneyText(shortCents: number, unusedCents: number, format: Formatter): string {
  const short = shortCents > 0 ? `Short by ${format.money(shortCents)} in all` : 'Never short';
  return `${short}; ${format.money(unusedCents)} of cushion stayed unused.`;
}

function isBelowAsked({ percent, flatCents, evidence }: GradedRule): boolean {
  const { askedPercent, askedFlatCents } = evidence;
  return percent < (askedPercent ?? percent) || (flatCents ?? 0) < (askedFlatCents ?? flatCents ?? 0);
}
