import type { z } from 'zod';
import type { overrunsAnswerSchema } from '#shared/contracts/answers-overruns.ts';
import { type AnswerQuery, MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { isOverwritten } from '../../domain/sets.ts';
import { rebuildOverrun } from '../../domain/overrun.ts';
import { ratioWithoutOne } from '../../domain/ratio-without-one.ts';
import { ratio, sum, wilson } from '../../domain/statistics.ts';
import { surpriseRate } from '../../domain/surprise-rate.ts';
import { shopYearOf } from '../../domain/years.ts';
import { filtered, filterOptions, otherExitsLeftOut } from './filter.ts';
import { type AnswerInput, countedBy, leftOut, namedWithoutOne } from './input.ts';
import { categoryOverruns } from './overruns-by-category.ts';
import { exitYears, ratesByYear } from './overruns-by-year.ts';
import { marksOf, partsOf } from './overruns-parts.ts';
import { byDamage, keptByHour, lookedAt, seenDifference } from './overruns-seen.ts';
import { type AgainstPlan, spreadOf } from './spread.ts';
import { latestFirst, yearlyTrend } from './trends.ts';

type Answer = z.input<typeof overrunsAnswerSchema>;

/** Where does the money run over? (definitions §5, §6) */
export function overrunsAnswer(whole: AnswerInput, query: AnswerQuery): Answer {
  const input = countedBy(whole, query.exits);
  const { shop, today } = input;
  const rebuilds = filtered(input, query, 'left');
  const done = rebuilds.filter(({ exit }) => exit !== null);
  const overwritten = done.filter(isOverwritten);
  const kept = done.filter((one) => !isOverwritten(one));
  const set = kept.filter((one) => one.estimateCents > 0);
  const told = set.filter(({ hasUnknownForeseen }) => !hasUnknownForeseen);
  const timed = done.filter(hasBothHours);
  const isBinned = set.length > MARKS_AT_MOST;
  const total = set.map(againstPlan);
  return {
    asOf: today,
    rebuildCount: rebuilds.length,
    filters: filterOptions(input, 'left'),
    leftOut: leftOut([
      ['not sold yet', rebuilds.filter(({ exit }) => exit === null)],
      ['left otherwise than by sale', otherExitsLeftOut(input, query, 'left')],
      ['no estimate', kept.filter((one) => one.estimateCents === 0)],
      ['estimate written over with what it came to', overwritten],
      ['foreseen or surprise not said', done.filter(({ hasUnknownForeseen }) => hasUnknownForeseen)],
      ['planned or worked hours not known', done.filter((one) => !hasBothHours(one))],
    ]),
    marks: isBinned ? 'binned' : 'each',
    total: {
      ...inCents(total),
      ...marksOf(input, total, isBinned),
      parts: partsOf(told.map(againstPlan), sum(told.map((one) => one.surprisePlanningCents))),
    },
    categories: categoryOverruns(input, kept, isBinned),
    hours: hoursOf(input, timed, isBinned),
    surprises: surprisesOf(input, done),
    extras: extrasOf(done),
    seen: seenRows(set, done),
    seenDifference: seenDifference(set, done),
    damages: byDamage(input, set, done),
    years: byYear(set, shop.startMonth),
    trends: trendsOf(set, timed),
    withoutOne: namedWithoutOne(
      input,
      ratioWithoutOne(total.map(({ id, plan, actual }) => ({ id, x: plan, y: actual - plan }))),
    ),
    soldOnly: soldOnlyOf(set),
  };
}

function seenRows(set: readonly ShopRebuild[], done: readonly ShopRebuild[]): Answer['seen'] {
  return [true, false, null].map((seen) => {
    const some = (list: readonly ShopRebuild[]) => list.filter((one) => one.seen === seen);
    const finished = some(done);
    const { told, surprised } = lookedAt([], finished);
    return {
      seen,
      ...inCents(some(set).map(againstPlan)),
      surprises: wilson(surprised, told),
      perHour: keptByHour(finished),
    };
  });
}

function extrasOf(done: readonly ShopRebuild[]): Answer['extras'] {
  let [rebuildCount, cents] = [0, 0];
  for (const { categories } of done) {
    let own = 0;
    for (const { extraCents } of categories.values()) own += extraCents;
    if (own === 0) continue;
    rebuildCount += 1;
    cents += own;
  }
  return { rebuildCount, cents };
}

function trendsOf(set: readonly ShopRebuild[], timed: readonly ShopRebuild[]): Answer['trends'] {
  return {
    overrun: yearlyTrend(latestFirst(set), rebuildOverrun),
    hours: yearlyTrend(latestFirst(timed), (one) => {
      const { plan, actual } = hoursAgainstPlan(one);
      return (actual - plan) / plan;
    }),
  };
}

function soldOnlyOf(set: readonly ShopRebuild[]): Answer['soldOnly'] {
  const sold = set.filter(({ exit }) => exit?.kind === 'sold');
  const plan = sum(sold.map((one) => one.estimateCents));
  return { n: sold.length, pooled: ratio(sum(sold.map((one) => one.planningCents)) - plan, plan) };
}

function againstPlan(rebuild: ShopRebuild): AgainstPlan {
  return { id: rebuild.id, plan: rebuild.estimateCents, actual: rebuild.planningCents };
}

function inCents(each: readonly AgainstPlan[]) {
  const { planSum, actualSum, ...spread } = spreadOf(each);
  return { ...spread, estimateCents: planSum, actualCents: actualSum };
}

function hasBothHours({ plannedSeconds, ownSeconds, paidSeconds }: ShopRebuild): boolean {
  return !!plannedSeconds && ownSeconds !== null && paidSeconds !== null;
}

function hoursAgainstPlan({ id, plannedSeconds, ownSeconds, paidSeconds }: ShopRebuild): AgainstPlan {
  return { id, plan: plannedSeconds ?? 0, actual: (ownSeconds ?? 0) + (paidSeconds ?? 0) };
}

function hoursOf(input: AnswerInput, timed: readonly ShopRebuild[], isBinned: boolean): Answer['hours'] {
  const each = timed.map(hoursAgainstPlan);
  const { planSum, actualSum, ...spread } = spreadOf(each);
  const years = ratesByYear(each, exitYears(timed, input.shop.startMonth));
  return { ...spread, plannedSeconds: planSum, actualSeconds: actualSum, ...marksOf(input, each, isBinned), years };
}

function surprisesOf({ shop }: AnswerInput, done: readonly ShopRebuild[]): Answer['surprises'] {
  const { categories, ...rate } = surpriseRate(done);
  const idOf = new Map(shop.categories.map(({ id, name }) => [name, id]));
  return {
    ...rate,
    workCents: paidOn(done.filter(({ hasUnknownForeseen }) => !hasUnknownForeseen)),
    categories: categories.map(({ category, ...one }) => ({
      ...one,
      categoryId: idOf.get(category) ?? '',
      name: category,
    })),
  };
}

function paidOn(rebuilds: readonly ShopRebuild[]): number {
  return sum(rebuilds.map(({ categories }) => sum([...categories.values()].map(({ paidCents }) => paidCents))));
}

function byYear(set: readonly ShopRebuild[], startMonth: number): Answer['years'] {
  const years = new Map<number, AgainstPlan[]>();
  for (const rebuild of set) {
    if (rebuild.exit === null) continue;
    const year = shopYearOf(rebuild.exit.on, startMonth);
    const members = years.get(year) ?? [];
    members.push(againstPlan(rebuild));
    years.set(year, members);
  }
  return [...years].sort(([a], [b]) => a - b).map(([year, members]) => ({ year, ...inCents(members) }));
}
