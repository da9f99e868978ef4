import type { z } from 'zod';
import { MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import type { yearAnswerSchema } from '#shared/contracts/answers-year.ts';
import type { ShopFacts, ShopRebuild } from '../../books/shop-facts.ts';
import { annualReturns, hasSeveralReturns } from '../../domain/annual-return.ts';
import { daysHeld, profit, rebuildProfit } from '../../domain/profit.ts';
import { type Completed, priced } from '../../domain/sets.ts';
import type { NetFlows } from '../../domain/net-flows.ts';
import { median, sum } from '../../domain/statistics.ts';
import { gapOf } from './gap.ts';
import { refOf } from './input.ts';

type Answer = z.input<typeof yearAnswerSchema>;

/** Where the sale money of these rebuilds went; only those whose purchase is known. */
export function moneyOf(
  { categories }: ShopFacts,
  exits: readonly ShopRebuild[],
  overheadCents: number,
): Answer['money'] {
  const set = priced(exits);
  const spent = new Map<string, number>();
  for (const rebuild of set) {
    for (const [name, { paidCents: cents }] of rebuild.categories) spent.set(name, (spent.get(name) ?? 0) + cents);
  }
  const { proceedsCents, purchaseCents, profitCents } = profit(exits);
  return {
    proceedsCents,
    purchaseCents,
    categories: categories
      .map(({ id, name }) => ({ categoryId: id, name, cents: spent.get(name) ?? 0 }))
      .filter(({ cents }) => cents !== 0),
    overheadCents,
    keptCents: profitCents - overheadCents,
  };
}

/** Entries dated after their rebuild had left. */
export function lateOf(exits: readonly ShopRebuild[]): Answer['late'] {
  const late = exits.filter(({ lateCount }) => lateCount > 0);
  return {
    count: sum(late.map(({ lateCount }) => lateCount)),
    cents: sum(late.map(({ lateCents }) => lateCents)),
    rebuilds: late
      .slice(0, MARKS_AT_MOST)
      .map((one) => ({ ...refOf(one), count: one.lateCount, cents: one.lateCents })),
  };
}

/** Annual returns (of these flows together), days held and return on cost of these rebuilds. */
export function returnsOf(exits: readonly ShopRebuild[], flows: NetFlows): Answer['returns'] {
  const { pooled, n, median: middle, undatedCount } = annualReturns(exits, flows);
  const money = profit(exits);
  const days = priced(exits)
    .map(daysHeld)
    .filter((value) => value !== null);
  return {
    pooled,
    n,
    median: middle,
    hasSeveral: hasSeveralReturns(flows),
    undatedCount,
    daysHeld: { n: days.length, median: median(days) },
    onCost: {
      n: money.returnOnCost.n,
      pooled: money.returnOnCost.pooled,
      median: money.returnOnCost.median,
      profitCents: money.profitCents,
      costCents: money.costCents,
    },
  };
}

/** One rebuild as the year's table shows it. */
export function rowOf(rebuild: ShopRebuild, exit: Completed['exit']): Answer['rebuilds'][number] {
  const [money] = priced([rebuild]).map(rebuildProfit);
  const { purchaseCents, ownSeconds, boughtOn, lateCents } = rebuild;
  const keptCents = money?.profitCents ?? null;
  return {
    ...refOf(rebuild),
    className: rebuild.class,
    damageName: rebuild.damage,
    isSeen: rebuild.seen,
    exitKind: exit.kind,
    exitOn: exit.on,
    boughtOn,
    daysHeld: purchaseCents === null ? null : daysHeld({ boughtOn, exit }),
    purchaseCents,
    workCents: rebuild.paidCents,
    costCents: money?.costCents ?? null,
    proceedsCents: exit.proceedsCents,
    keptCents,
    ownSeconds,
    keptPerHourCents: keptCents !== null && ownSeconds ? (keptCents * 3600) / ownSeconds : null,
    annualReturn: rebuild.xirr,
    lateCents,
    gap: gapOf(rebuild),
  };
}
