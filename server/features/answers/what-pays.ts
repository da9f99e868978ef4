import type { z } from 'zod';
import type { Comparison, WhatPaysQuery, whatPaysAnswerSchema } from '#shared/contracts/answers-what-pays.ts';
import type { Named, ShopRebuild } from '../../books/shop-facts.ts';
import { type OldSheetGroup, oldSheet } from '../../domain/old-sheet.ts';
import { profit, rebuildProfit } from '../../domain/profit.ts';
import { worked } from '../../domain/profit-per-hour.ts';
import { ratioWithoutOne } from '../../domain/ratio-without-one.ts';
import { cellOf, type PaidGroup, type PayFit, whatPays } from '../../domain/what-pays.ts';
import { filtered, filterOptions, otherExitsLeftOut } from './filter.ts';
import { type AnswerInput, countedBy, leftOut, namedWithoutOne } from './input.ts';
import { perHourViews } from './per-hour-views.ts';

type Answer = z.input<typeof whatPaysAnswerSchema>;
type Group = Comparison['groups'][number];

/** Which wrecks pay? A view's figure by class × damage and by each alone (definitions §9, §18.2). */
export function whatPaysAnswer(whole: AnswerInput, query: WhatPaysQuery): Answer {
  const input = countedBy(whole, query.exits);
  const { shop, today } = input;
  const view = query.view ?? 'per-hour';
  const rebuilds = filtered(input, query, 'left');
  const done = rebuilds.filter(({ exit }) => exit !== null);
  const { noPurchaseCount: _, ...totals } = profit(rebuilds);
  const { cells, classes, damages } = whatPays(rebuilds, view, shop.wantedCentsPerHour);
  return {
    asOf: today,
    rebuildCount: rebuilds.length,
    filters: filterOptions(input, 'left'),
    leftOut: leftOut([
      ['not sold yet', rebuilds.filter(({ exit }) => exit === null)],
      ['left otherwise than by sale', otherExitsLeftOut(input, query, 'left')],
      ['purchase not known', done.filter(({ purchaseCents }) => purchaseCents === null)],
      ['own hours not known', view === 'all-hours' ? [] : done.filter(({ ownSeconds }) => !ownSeconds)],
      ['own or paid hours not known', view === 'all-hours' ? done.filter(lacksHours) : []],
      ['class or damage not known', done.filter((one) => cellOf(one) === null)],
    ]),
    totals,
    views: perHourViews(rebuilds, shop.wantedCentsPerHour),
    view,
    fits: {
      cells: comparisonOf(input, cells),
      classes: comparisonOf(input, classes),
      damages: comparisonOf(input, damages),
    },
    withoutOne: namedWithoutOne(
      input,
      ratioWithoutOne(
        worked(rebuilds).map((one) => ({ id: one.id, x: one.ownSeconds, y: rebuildProfit(one).profitCents * 3600 })),
      ),
    ),
    oldSheet: oldSheetOf(whole, query),
  };
}

/** Not in the view of all hours: own or paid ones are unknown, or there are none. */
function lacksHours({ ownSeconds, paidSeconds }: ShopRebuild): boolean {
  return ownSeconds === null || paidSeconds === null || ownSeconds + paidSeconds === 0;
}

/** A fit as the reply shows it: names with their ids, ranked. */
function comparisonOf(input: AnswerInput, { n, withinVariance, pooled, ungroupedCount, groups }: PayFit): Comparison {
  return {
    n,
    withinVariance,
    average: pooled,
    ungroupedCount,
    groups: ranked(groups.map((group) => groupOf(input, group))),
  };
}

function groupOf(input: AnswerInput, group: PaidGroup): Group {
  const { classes, damages } = input.shop;
  const { n, mean, deviation, interval, shrunken, isThin, plain } = group;
  const { n: _, ...sums } = group.sums;
  return {
    classId: idIn(classes, group.class),
    className: group.class,
    damageId: idIn(damages, group.damage),
    damageName: group.damage,
    n,
    plain,
    mean,
    deviation,
    lower: interval?.lower ?? null,
    upper: interval?.upper ?? null,
    pulled: shrunken,
    isThin,
    rank: null,
    ...sums,
    withoutOne: namedWithoutOne(input, group.withoutOne),
  };
}

function idIn(list: readonly Named[], name: string | null): string | null {
  return list.find((item) => item.name === name)?.id ?? null;
}

/** Ranks by the lower end of the pulled interval (decisions 26), the thin ones not at all. */
function ranked(groups: Group[]): Group[] {
  const order = groups
    .filter(({ isThin, pulled }) => !isThin && pulled !== null)
    .sort((a, b) => (b.pulled?.lower ?? 0) - (a.pulled?.lower ?? 0));
  return groups.map((group) => ({ ...group, rank: order.includes(group) ? order.indexOf(group) + 1 : null }));
}

/** The old sheet's claim stands beside the answer whatever the address asks to leave out. */
function oldSheetOf(whole: AnswerInput, query: WhatPaysQuery): Answer['oldSheet'] {
  const { classes, damages, categories } = whole.shop;
  const wages = new Set(categories.filter(({ isPaidLabor }) => isPaidLabor).map(({ name }) => name));
  const found = oldSheet(filtered(whole, query, 'left'), (name) => wages.has(name));
  const withIds = (groups: readonly OldSheetGroup[], list: readonly Named[]) =>
    groups.map((group) => ({ ...group, id: idIn(list, group.name) }));
  return {
    ...found,
    bills: [...found.bills],
    classes: withIds(found.classes, classes),
    damages: withIds(found.damages, damages),
  };
}
