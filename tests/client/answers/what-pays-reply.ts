import type { Comparison, WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import { head, idOf, perHour } from './replies.ts';

type Group = Comparison['groups'][number];

/** A group that brings `value` cents an hour (or a fraction on cost) give or take `half`. */
export function group(names: { class?: string; damage?: string }, n: number, value: number, half = 500): Group {
  return {
    classId: names.class ? idOf(names.class.replaceAll(/\W/g, '')) : null,
    className: names.class ?? null,
    damageId: names.damage ? idOf(names.damage.replaceAll(/\W/g, '')) : null,
    damageName: names.damage ?? null,
    n,
    plain: value,
    mean: value,
    deviation: n > 1 ? half : null,
    lower: n > 1 ? value - half : null,
    upper: n > 1 ? value + half : null,
    pulled: { weight: 0.8, value, standardError: half / 1.96, lower: value - half, upper: value + half },
    isThin: n < 5,
    rank: null,
    profitCents: Math.round(value * n * 10),
    laborCents: 0,
    ownSeconds: 36_000 * n,
    allSeconds: 36_000 * n,
    costCents: 100_000 * n,
    withoutOne: null,
  };
}

/** Groups with their ranks by the lower end; `between` 0 = no difference shown. */
export function comparison(groups: readonly Group[], between = 1000): Comparison {
  const order = groups.filter((one) => !one.isThin).toSorted((a, b) => (b.pulled?.lower ?? 0) - (a.pulled?.lower ?? 0));
  const n = groups.reduce((sum, one) => sum + one.n, 0);
  return {
    n,
    ungroupedCount: 0,
    withinVariance: 1000,
    average: { mean: 1900, standardError: 100, lower: 1700, upper: 2100, betweenVariance: between, q: 20 },
    groups: groups.map((one) => ({ ...one, rank: one.isThin ? null : order.indexOf(one) + 1 })),
  };
}

const NONE: Comparison = { n: 0, ungroupedCount: 0, withinVariance: null, average: null, groups: [] };

export function whatPaysReply(
  fits: Partial<WhatPaysAnswer['fits']>,
  n = 20,
  view: WhatPaysAnswer['view'] = 'per-hour',
): WhatPaysAnswer {
  const three = { cells: NONE, classes: NONE, damages: NONE, ...fits };
  return {
    ...head(),
    totals: {
      n,
      purchaseCents: 100_000 * n,
      workCents: 50_000 * n,
      costCents: 150_000 * n,
      proceedsCents: 170_000 * n,
      profitCents: 20_000 * n,
      lossCount: 0,
      returnOnCost: { n, pooled: 0.13, median: 0.12, mean: 0.14 },
    },
    views: perHour(n, 20_000 * n, 10 * n),
    view,
    fits: three,
    withoutOne: null,
    oldSheet: {
      bills: ['parts'],
      old: { n, keptCents: 30_000 * n },
      soldOnly: { n, keptCents: 20_000 * n },
      whole: { n, keptCents: 20_000 * n },
      classes: [],
      damages: [],
    },
  };
}
