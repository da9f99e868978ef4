import type { z } from 'zod';
import type { yearRateSchema } from '#shared/contracts/answers-overruns.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { FEW, ratio } from '../../domain/statistics.ts';
import { shopYearOf } from '../../domain/years.ts';
import type { AgainstPlan } from './spread.ts';

type YearRate = z.input<typeof yearRateSchema>;

/** The shop year in which each of these left, by id. */
export function exitYears(rebuilds: readonly ShopRebuild[], startMonth: number): Map<string, number> {
  const years = new Map<string, number>();
  for (const { id, exit } of rebuilds) if (exit !== null) years.set(id, shopYearOf(exit.on, startMonth));
  return years;
}

/** (Σ actual − Σ plan) ÷ Σ plan per year, the earliest first; a year without any does not stand. */
export function ratesByYear(each: readonly AgainstPlan[], yearOf: ReadonlyMap<string, number>): YearRate[] {
  const sums = new Map<number, { n: number; plan: number; actual: number }>();
  for (const { id, plan, actual } of each) {
    const year = yearOf.get(id);
    if (year === undefined) continue;
    const known = sums.get(year) ?? { n: 0, plan: 0, actual: 0 };
    sums.set(year, { n: known.n + 1, plan: known.plan + plan, actual: known.actual + actual });
  }
  return [...sums]
    .sort(([a], [b]) => a - b)
    .map(([year, { n, plan, actual }]) => ({ year, n, pooled: ratio(actual - plan, plan), isThin: n < FEW }));
}
