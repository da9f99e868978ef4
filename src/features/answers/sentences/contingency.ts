import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import type { Formatter } from '#shared/formatter.ts';
import type { LevelName } from '#shared/vocabulary.ts';
import { counted, mark, type Said, type Sentence, said, say, words } from './parts.ts';

type Score = ContingencyAnswer['backTest']['scores'][number];

/** `4 in 5`. */
export function levelWords(level: LevelName): string {
  return level.replace('/', ' in ');
}

/** `4 times in 5`. */
export function levelTimes(level: LevelName): string {
  const [p = '', q = ''] = level.split('/');
  return `${p === '1' ? 'once' : `${p} times`} in ${q}`;
}

/** How many rebuilds a level p/q needs before it can be said at all: the fewest n with ceil((n + 1)·p/q) ≤ n. */
export function leastFor(level: LevelName): number {
  const [p = 1, q = 2] = level.split('/').map(Number);
  return Math.ceil(p / (q - p));
}

export function scoreOf(test: ContingencyAnswer['backTest'], rule: Score['rule']): Score | null {
  return test.scores.find((score) => score.rule === rule) ?? null;
}

/** How much cushion should next year's budgets carry? */
export function sayContingency(answer: ContingencyAnswer, format: Formatter): Said {
  return { answer: sentence(answer, format), cautions: cautions(answer, format) };
}

function sentence(answer: ContingencyAnswer, format: Formatter): Sentence {
  const { percent, level } = answer;
  if (percent.n === 0) return ['No finished rebuild has a locked estimate yet, so no cushion can be worked out.'];
  if (percent.percent === null) {
    const has = counted(format, percent.n);
    return [
      `Too few yet for ${levelWords(level)}: it needs ${counted(format, leastFor(level), 'finished rebuild')} with an estimate, and there ${percent.n === 1 ? 'is' : 'are'} ${has} so far.`,
    ];
  }
  const add =
    percent.percent === 0
      ? say`${mark('No cushion')} is needed on top of the repair estimate`
      : say`Add ${mark(format.percent(percent.percent / 100))} to the repair estimate`;
  const score = scoreOf(answer.backTest, 'percent');
  if (!score || score.n === 0) return say`${add}; there are too few rebuilds yet to try out rules set this way.`;
  return say`${add}: rules set this way would have covered ${mark(`${format.number(score.x)} of ${format.number(score.n)}`)} rebuilds.`;
}

function cautions(answer: ContingencyAnswer, format: Formatter): string[] {
  const { percent, level, backTest } = answer;
  const score = scoreOf(backTest, 'percent');
  const short = score ? score.n - score.x : 0;
  return said(
    percent.percent !== null &&
      `With ${counted(format, percent.n, 'finished rebuild')}, a rule set this way covers the next one at least ${levelTimes(level)}, so long as next year's cars are like these.`,
    score && score.n > 0 && short > 0 && shortWords(short, score.shortCents, format),
    score &&
      score.lower !== null &&
      score.upper !== null &&
      `The share they cover in the long run may lie anywhere between ${format.percent(score.lower)} and ${format.percent(score.upper)} (roughly 95% sure).`,
    percent.uplift !== null && percent.uplift < 0 && 'Estimates ran high; the plan itself is never cut.',
  );
}

function shortWords(short: number, cents: number, format: Formatter): string {
  const who = short === 1 ? 'The one not covered' : `The ${words(format, short)} not covered`;
  return `${who} ran short by ${format.money(cents)}${short === 1 ? '' : ' in all'}.`;
}
