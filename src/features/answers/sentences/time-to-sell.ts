import type { TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import type { Formatter } from '#shared/formatter.ts';
import { capital } from '../../../lib/capital.ts';
import { longestStage, whereTheDaysGo } from './stages.ts';
import { counted, mark, type Said, type Sentence, said, say } from './parts.ts';

/** How long until the money is back? The middle, and what is still unsold after 60 days. */
export function sayTimeToSell(answer: TimeToSellAnswer, format: Formatter): Said {
  return { answer: sentence(answer, format), cautions: cautions(answer, format) };
}

function sentence(answer: TimeToSellAnswer, format: Formatter): Sentence {
  const { overall } = answer;
  if (overall.n === 0) return ['Nothing has been listed for sale yet.'];
  if (overall.soldCount === 0) return noneSold(answer, format);
  const days = overall.median.days;
  if (days === null) {
    const longest = overall.longestDays === null ? '' : ` within ${format.days(overall.longestDays)}`;
    return say`More than half have ${mark('not sold')}${longest} of being listed, counting the unsold.`;
  }
  const middle = mark(format.days(days));
  if (overall.isThin) {
    return say`Too few yet to go by: with ${counted(format, overall.soldCount, 'sale')} so far, half were gone within ${middle} of being listed.`;
  }
  return say`Half are sold within ${middle} of being listed${later(answer, format)}.`;
}

function noneSold({ overall }: TimeToSellAnswer, format: Formatter): Sentence {
  const wait = overall.longestDays;
  const waited = wait === null ? '' : say`; the longest has waited ${mark(format.days(wait))}`;
  if (overall.n === 1)
    return say`The one listed has not sold so far${wait === null ? '' : say`, after ${mark(format.days(wait))}`}.`;
  return say`None of the ${counted(format, overall.n, 'listed rebuild')} has sold so far${waited}.`;
}

/** What leaving out the unsold, and every other way out, would have said. null = nothing to say. */
export function oldSheetSelling({ soldOnly, overall }: TimeToSellAnswer, format: Formatter): string | null {
  const left = overall.n - soldOnly.n;
  if (soldOnly.median === null || left <= 0) return null;
  return `An old sheet, with sold ones only, would have said ${format.days(soldOnly.median)}: it leaves out the ${left === 1 ? 'one' : format.number(left)} that did not sell.`;
}

/** The first of 60 and 90 days at which some are still there. */
function later({ overall }: TimeToSellAnswer, format: Formatter): Sentence {
  const share = overall.at60.unsold;
  if (share === null || share <= 0) return [];
  return say`; ${mark(`${format.percent(share)}`)} are still there after 60`;
}

function cautions(answer: TimeToSellAnswer, format: Formatter): string[] {
  const { overall, unsold } = answer;
  const { lower, upper } = overall.median;
  return said(
    overall.n > 0 && basis(answer, format),
    overall.median.days !== null && lower !== null && `The middle lies, 95% sure, ${between(lower, upper, format)}.`,
    unsold.total > 0 &&
      `${capital(counted(format, unsold.total))} in hand ${unsold.total === 1 ? 'holds' : 'hold'} ${format.money(unsold.cents)}.`,
    overall.n > 0 && longestStage(answer.stages) !== null && whereTheDaysGo(answer, format),
    comparison(answer, format),
  );
}

function basis({ overall }: TimeToSellAnswer, format: Formatter): string {
  const parts = said(
    overall.unsoldCount > 0 &&
      `${format.number(overall.unsoldCount)} unsold, counted as still waiting and not left out`,
    overall.otherExitCount > 0 && `${format.number(overall.otherExitCount)} that left otherwise, watched until then`,
  );
  const rest = parts.length === 0 ? '' : `: ${format.number(overall.soldCount)} sold, ${parts.join(', ')}`;
  return `Based on ${counted(format, overall.n, 'listed rebuild')}${rest}.`;
}

export function between(lower: number, upper: number | null, format: Formatter): string {
  if (upper === null) return `at ${format.days(lower)} or later`;
  return `between ${format.number(lower)} and ${format.days(upper)}`;
}

function comparison({ comparison: test }: TimeToSellAnswer, format: Formatter): string | null {
  if (!test || test.p === null) return null;
  const pair = `${test.classA} and ${test.classB}`;
  const p = test.p < 0.001 ? 'p below 0.001' : `p = ${format.number(test.p, 3)}`;
  return test.p < 0.05
    ? `${capital(pair)} do not sell at the same speed: that is hardly luck (log-rank test, ${p}).`
    : `That ${pair} sell at different speeds could be luck (log-rank test, ${p}).`;
}
