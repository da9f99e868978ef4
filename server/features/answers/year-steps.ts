import type { z } from 'zod';
import { MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import type { yearAnswerSchema } from '#shared/contracts/answers-year.ts';
import { addDays, type Day } from '#shared/day.ts';
import type { ShopFacts, ShopRebuild } from '../../books/shop-facts.ts';
import { rebuildProfit } from '../../domain/profit.ts';
import { priced } from '../../domain/sets.ts';
import { refOf } from './input.ts';

type Steps = z.input<typeof yearAnswerSchema>['steps'];
type Step = Steps['now'][number];
type Change = Omit<Step, 'totalCents'>;

interface Span {
  readonly from: Day;
  readonly to: Day;
}

/** The running total of two years. A year of more than 300 changes is drawn by day, or by month if that is too much too. */
export function yearSteps(shop: ShopFacts, byId: ReadonlyMap<string, ShopRebuild>, now: Span, before: Span): Steps {
  const years = [changes(shop, byId, now), changes(shop, byId, before)];
  const most = (lists: readonly (readonly Change[])[]) => Math.max(...lists.map((list) => list.length));
  if (most(years) <= MARKS_AT_MOST) return steps('change', years);
  const days = years.map((list) => merged(list, (on) => on));
  if (most(days) <= MARKS_AT_MOST) return steps('day', days);
  return steps(
    'month',
    years.map((list) => merged(list, monthEnd)),
  );
}

/** Profit on the day that each rebuild left, overhead on the day it was paid; in order. */
function changes({ rebuilds, overhead }: ShopFacts, byId: ReadonlyMap<string, ShopRebuild>, span: Span): Change[] {
  const isIn = (on: Day) => on >= span.from && on <= span.to;
  const left = priced(rebuilds).filter(({ exit }) => isIn(exit.on));
  const list: Change[] = left.map((one) => {
    const rebuild = byId.get(one.id);
    const ref = rebuild ? refOf(rebuild) : null;
    return { on: one.exit.on, kind: 'rebuild', changeCents: rebuildProfit(one).profitCents, rebuild: ref };
  });
  for (const { on, cents } of overhead) {
    if (isIn(on)) list.push({ on, kind: 'overhead', changeCents: -cents, rebuild: null });
  }
  return list.sort((a, b) => (a.on < b.on ? -1 : a.on > b.on ? 1 : 0));
}

function merged(list: readonly Change[], dayOf: (on: Day) => Day): Change[] {
  const sums = new Map<Day, number>();
  for (const { on, changeCents } of list) sums.set(dayOf(on), (sums.get(dayOf(on)) ?? 0) + changeCents);
  return [...sums].map(([on, changeCents]) => ({ on, kind: 'several', changeCents, rebuild: null }));
}

function monthEnd(on: Day): Day {
  return addDays(`${addDays(`${on.slice(0, 7)}-01`, 31).slice(0, 7)}-01`, -1);
}

function steps(every: Steps['every'], [now = [], before = []]: readonly Change[][]): Steps {
  return { every, now: runningTotal(now), before: runningTotal(before) };
}

function runningTotal(list: readonly Change[]): Step[] {
  let totalCents = 0;
  return list.map((change) => {
    totalCents += change.changeCents;
    return { ...change, totalCents };
  });
}
