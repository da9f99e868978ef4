import type { z } from 'zod';
import { type FilterQuery, MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import { type timeToSellAnswerSchema, WAITS } from '#shared/contracts/answers-time-to-sell.ts';
import { type Day, daysBetween } from '#shared/day.ts';
import type { Stage } from '#shared/vocabulary.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { heldOn } from '../../books/spent-by.ts';
import { daysToSell, type SellingTime } from '../../domain/days-to-sell.ts';
import { hasOddDates } from '../../domain/sets.ts';
import { FEW, median, quantile, sum } from '../../domain/statistics.ts';
import { filtered, filterOptions } from './filter.ts';
import { type AnswerInput, leftOut, refOf } from './input.ts';

type Answer = z.input<typeof timeToSellAnswerSchema>;

/** How long until the money is back? (definitions §7) Years are those of the listing: by exit the unsold would drop out. */
export function timeToSellAnswer(input: AnswerInput, query: FilterQuery): Answer {
  const { shop, today } = input;
  const rebuilds = filtered(input, query, 'listed');
  const selling = daysToSell(rebuilds, today);
  const idOf = new Map(shop.classes.map(({ id, name }) => [name, id]));
  const isSold = ({ exit }: ShopRebuild) => exit?.kind === 'sold';
  return {
    asOf: today,
    rebuildCount: rebuilds.length,
    filters: filterOptions(input, 'listed'),
    leftOut: leftOut([
      ['dates out of order', rebuilds.filter((one) => one.listedOn !== null && hasOddDates(one))],
      ['sold without a listing day', rebuilds.filter((one) => one.listedOn === null && isSold(one))],
      ['not listed yet', rebuilds.filter((one) => one.exit === null && !(one.listedOn && one.listedOn <= today))],
    ]),
    overall: timeOf(selling.overall, MARKS_AT_MOST),
    classes: selling.classes.map(({ class: name, ...one }) => ({
      classId: idOf.get(name) ?? '',
      name,
      ...timeOf(one, CLASS_MARKS_AT_MOST),
    })),
    comparison: selling.comparison,
    waits: WAITS.map((wait) => waitOf(rebuilds, wait)),
    unsold: unsoldOf(input, rebuilds),
  };
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

type Wait = (typeof WAITS)[number];
const ENDS: Record<Wait, (rebuild: ShopRebuild) => readonly [Day | null, Day | null]> = {
  queue: ({ pickedUpOn, startedOn }) => [pickedUpOn, startedOn],
  build: ({ startedOn, readyOn }) => [startedOn, readyOn],
  paper: ({ readyOn, titleIssuedOn }) => [readyOn, titleIssuedOn],
  held: ({ boughtOn, exit }) => [boughtOn, exit?.on ?? null],
};

function waitOf(rebuilds: readonly ShopRebuild[], wait: Wait): Answer['waits'][number] {
  const days: number[] = [];
  for (const rebuild of rebuilds) {
    const [from, to] = ENDS[wait](rebuild);
    if (from !== null && to !== null && to >= from) days.push(daysBetween(from, to));
  }
  const figures = { median: median(days), q10: quantile(days, 0.1), q90: quantile(days, 0.9) };
  return { wait, n: days.length, ...figures, isThin: days.length < FEW };
}

function unsoldOf({ today, spentBy }: AnswerInput, rebuilds: readonly ShopRebuild[]): Answer['unsold'] {
  const held = heldOn(rebuilds, today);
  const spent = spentBy(
    held.map(({ id }) => id),
    today,
  );
  const rows = held.map((one) => {
    const tiedUpCents = (one.purchaseCents ?? 0) + (spent.get(one.id) ?? 0);
    const since = (day: Day | null) => (day === null || day > today ? null : daysBetween(day, today));
    return {
      ...refOf(one),
      stage: stageOf(one),
      boughtOn: one.boughtOn,
      listedOn: one.listedOn,
      daysSinceBought: since(one.boughtOn),
      daysListed: since(one.listedOn),
      askingCents: one.askingCents,
      tiedUpCents,
    };
  });
  return {
    on: today,
    total: rows.length,
    cents: sum(rows.map(({ tiedUpCents }) => tiedUpCents)),
    rebuilds: rows.sort((a, b) => (b.daysSinceBought ?? 0) - (a.daysSinceBought ?? 0)).slice(0, MARKS_AT_MOST),
  };
}

function stageOf({ listedOn, readyOn, startedOn }: ShopRebuild): Stage {
  if (listedOn !== null) return 'listed';
  if (readyOn !== null) return 'ready';
  return startedOn === null ? 'bought' : 'in the shop';
}
