import type { z } from 'zod';
import { type AnswerQuery, MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import type { timeToSellAnswerSchema } from '#shared/contracts/answers-time-to-sell.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { daysToSell, type SellingTime } from '../../domain/days-to-sell.ts';
import { hasOddDates, marketSet } from '../../domain/sets.ts';
import { medianDaysWithoutOne } from '../../domain/median-days-without-one.ts';
import { median } from '../../domain/statistics.ts';
import { filtered, filterOptions, otherExitsLeftOut } from './filter.ts';
import { type AnswerInput, countedBy, leftOut, namedWithoutOne } from './input.ts';
import { stagesOf } from './time-to-sell-stages.ts';
import { unsoldOf } from './unsold.ts';

type Answer = z.input<typeof timeToSellAnswerSchema>;

/** How long until the money is back? (definitions §7) Years are those of the listing: by exit the unsold would drop out. */
export function timeToSellAnswer(whole: AnswerInput, query: AnswerQuery): Answer {
  const input = countedBy(whole, query.exits);
  const { today } = input;
  const inHand = filtered(whole, query, 'listed');
  const rebuilds = query.exits === undefined ? inHand : inHand.filter(isSold);
  const selling = daysToSell(rebuilds, today);
  const { members } = marketSet(rebuilds, today);
  const sold = members.filter((one) => one.isSold).map(({ days }) => days);
  return {
    asOf: today,
    rebuildCount: rebuilds.length,
    filters: filterOptions(whole, 'listed'),
    leftOut: leftOut([
      ['dates out of order', rebuilds.filter((one) => one.listedOn !== null && hasOddDates(one))],
      ['sold without a listing day', rebuilds.filter((one) => one.listedOn === null && isSold(one))],
      ['not listed yet', rebuilds.filter((one) => one.exit === null && !(one.listedOn && one.listedOn <= today))],
      ['left otherwise than by sale', otherExitsLeftOut(input, query, 'listed')],
      ['not sold yet', query.exits === undefined ? [] : inHand.filter(({ exit }) => exit === null)],
    ]),
    overall: timeOf(selling.overall, MARKS_AT_MOST),
    classes: selling.classes.map(({ class: name, ...one }) => ({
      classId: idOf(input, name),
      name,
      ...timeOf(one, CLASS_MARKS_AT_MOST),
    })),
    comparison: selling.comparison,
    ...stagesOf(input, rebuilds, selling),
    withoutOne: namedWithoutOne(input, medianDaysWithoutOne(members)),
    soldOnly: { n: sold.length, median: median(sold) },
    unsold: unsoldOf(input, inHand),
  };
}

function isSold({ exit }: ShopRebuild): boolean {
  return exit?.kind === 'sold';
}

function idOf({ shop }: AnswerInput, className: string): string {
  return shop.classes.find(({ name }) => name === className)?.id ?? '';
}

/** Several curves share one picture; none of them needs more steps than this. */
const CLASS_MARKS_AT_MOST = 100;

function timeOf({ curve, ...time }: SellingTime, most: number): Answer['overall'] {
  const every = Math.ceil(curve.points.length / most);
  const steps = curve.points.filter((_, i) => i % every === 0 || i === curve.points.length - 1);
  return {
    ...time,
    unsoldCount: time.n - time.soldCount - time.otherExitCount,
    longestDays: curve.longestDays,
    steps,
    isThinned: every > 1,
  };
}
