import type { z } from 'zod';
import type { overrunsAnswerSchema } from '#shared/contracts/answers-overruns.ts';
import { type FilterQuery, MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { isOverwritten } from '../../domain/sets.ts';
import { sum, wilson } from '../../domain/statistics.ts';
import { surpriseRate } from '../../domain/surprise-rate.ts';
import { shopYearOf } from '../../domain/years.ts';
import { filtered, filterOptions } from './filter.ts';
import { type AnswerInput, leftOut } from './input.ts';
import { categoryOverruns } from './overruns-by-category.ts';
import { exitYears, ratesByYear } from './overruns-by-year.ts';
import { marksOf, partsOf } from './overruns-parts.ts';
import { type AgainstPlan, spreadOf } from './spread.ts';

type Answer = z.input<typeof overrunsAnswerSchema>;

/** Where does the money run over? (definitions §5, §6) */
export function overrunsAnswer(input: AnswerInput, query: FilterQuery): Answer {
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
    seen: [true, false, null].map((seen) => {
      const some = (list: readonly ShopRebuild[]) => list.filter((one) => one.seen === seen);
      return { seen, ...inCents(some(set).map(againstPlan)), surprises: surpriseShare(some(done)) };
    }),
    years: byYear(set, shop.startMonth),
  };
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

function hoursOf(input: AnswerInput, timed: readonly ShopRebuild[], isBinned: boolean): Answer['hours'] {
  const each = timed.map(({ id, plannedSeconds, ownSeconds, paidSeconds }) => {
    return { id, plan: plannedSeconds ?? 0, actual: (ownSeconds ?? 0) + (paidSeconds ?? 0) };
  });
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

function surpriseShare(done: readonly ShopRebuild[]): Answer['seen'][number]['surprises'] {
  const told = done.filter(({ hasUnknownForeseen }) => !hasUnknownForeseen);
  const surprised = told.filter(({ categories }) => [...categories.values()].some((one) => one.surpriseCount > 0));
  return wilson(surprised.length, told.length);
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
