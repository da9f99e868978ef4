import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import type { Formatter } from '#shared/formatter.ts';
import type { LevelName } from '#shared/vocabulary.ts';
import type { Kind } from '../contingency/kind.ts';
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

/** `8 in 10, could be 7 to 9`: what a level may truly come to with so few rebuilds. */
export function bandWords({ lower, upper }: { lower: number; upper: number }): string {
  const from = Math.round(lower * 10);
  // "10 in 10" would be a promise.
  const to = upper >= 0.95 ? 'nearly 10' : `${Math.round(upper * 10)}`;
  return `${from}` === to ? `about ${to} in 10` : `${from} to ${to} in 10`;
}

/** How much cushion should next year's budgets carry? Of the kind of rule that the page shows. */
export function sayContingency(answer: ContingencyAnswer, format: Formatter, kind: Kind = 'percent'): Said {
  return { answer: sentence(answer, format, kind), cautions: cautions(answer, format, kind) };
}

function sentence(answer: ContingencyAnswer, format: Formatter, kind: Kind): Sentence {
  const { level } = answer;
  const { n } = answer[kind === 'percent' ? 'percent' : 'twoPart'];
  if (answer.percent.n === 0) {
    return ['No finished rebuild has a locked estimate yet, so no cushion can be worked out.'];
  }
  const add = addWords(answer, format, kind);
  if (add === null) return [tooFewWords(n, level, format, kind)];
  const score = scoreOf(kind === 'percent' ? answer.backTest : answer.twoPartBackTest, kind);
  if (!score || score.n === 0) return say`${add}; there are too few rebuilds yet to try out rules set this way.`;
  return say`${add}: rules set this way would have covered ${mark(`${format.number(score.x)} of ${format.number(score.n)}`)} rebuilds.`;
}

/** null = too few yet. */
function addWords({ percent, twoPart }: ContingencyAnswer, format: Formatter, kind: Kind): Sentence | null {
  if (kind === 'two-part') {
    const { creepPercent, adoptFlatCents } = twoPart;
    if (creepPercent === null || adoptFlatCents === null) return null;
    return say`Add ${mark(format.percent(creepPercent / 100))} for known work costing more and ${mark(format.money(adoptFlatCents))} for surprises`;
  }
  if (percent.percent === null) return null;
  if (percent.percent === 0) return say`${mark('No cushion')} is needed on top of the repair estimate`;
  return say`Add ${mark(format.percent(percent.percent / 100))} to the repair estimate`;
}

function tooFewWords(n: number, level: LevelName, format: Formatter, kind: Kind): string {
  const needed = leastFor(level);
  const what = kind === 'percent' ? 'with an estimate' : 'whose entries all say whether they were foreseen';
  const has = n === 0 ? 'none so far' : `${words(format, n)} so far`;
  return `Too few yet for ${levelWords(level)}: it needs ${counted(format, needed, 'finished rebuild')} ${what}. There ${n === 1 ? 'is' : 'are'} ${has}; ${words(format, needed - n)} more will do.`;
}

function cautions(answer: ContingencyAnswer, format: Formatter, kind: Kind): string[] {
  const { percent, level, drift } = answer;
  const figure = answer[kind === 'percent' ? 'percent' : 'twoPart'];
  const score = scoreOf(kind === 'percent' ? answer.backTest : answer.twoPartBackTest, kind);
  const short = score ? score.n - score.x : 0;
  const rough = kind === 'percent' ? 'at least' : 'roughly';
  const band = figure.band ? ` With that many to go by, the true share could be ${bandWords(figure.band)}.` : '';
  return said(
    figure.isAttainable &&
      `With ${counted(format, figure.n, 'finished rebuild')}, a rule set this way covers the next one ${rough} ${levelTimes(level)}, so long as next year's cars are like these.${band}`,
    score && score.n > 0 && short > 0 && shortWords(short, score.shortCents, format),
    (drift.verdict === 'costs more' || drift.verdict === 'costs less') && sayDrift(drift, format),
    kind === 'percent' &&
      percent.uplift !== null &&
      percent.uplift < 0 &&
      'Estimates ran high; the plan itself is never cut.',
  );
}

function shortWords(short: number, cents: number, format: Formatter): string {
  const who = short === 1 ? 'The one not covered' : `The ${words(format, short)} not covered`;
  return `${who} ran short by ${format.money(cents)}${short === 1 ? '' : ' in all'}.`;
}

/** Do the last 24 months agree with the years before, and which did the proposal use? null = too few to say. */
export function sayDrift(drift: ContingencyAnswer['drift'], format: Formatter): string | null {
  const { verdict, withinCount, expectedCount, before, recent, all } = drift;
  if (verdict === null || withinCount === null || expectedCount === null || before.percent === null) return null;
  const held = `Of ${format.count(recent.n, 'rebuild')} in the last 24 months ${words(format, withinCount)} stayed within the ${format.percent(before.percent / 100)} that the years before ask for; about ${format.number(Math.round(expectedCount))} were to be expected`;
  if (verdict === 'agrees') return `${held}: no sign that the past is a poor guide.`;
  const used = `The proposal uses all years${all.percent === null ? '' : ` (${format.percent(all.percent / 100)})`}`;
  const alone =
    recent.percent === null ? '' : `; the last 24 months alone ask for ${format.percent(recent.percent / 100)}`;
  return `${held}. Work ${verdict} now. ${used}${alone}.`;
}
