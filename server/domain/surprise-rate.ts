import type { RebuildFacts } from './facts.ts';
import { categoriesOf } from './overrun.ts';
import { completed, paidCents } from './sets.ts';
import { type Rate, ratio, sum, wilson } from './statistics.ts';

export interface SurpriseRate extends Rate {
  /** Completed, but at least one entry whose foreseen nobody said: left out of everything here. */
  readonly unknownCount: number;
  /** Σ cents of surprises, refunds included. */
  readonly unforeseenCents: number;
  /** Unforeseen ÷ all paid, a fraction. null = nothing was paid. */
  readonly shareOfWork: number | null;
  readonly categories: readonly (Rate & { readonly category: string; readonly unforeseenCents: number })[];
}

/**
 * How often a rebuild brings a surprise (definitions §6, §18.1): a rebuild is surprised by at least one entry above 0
 * that nobody foresaw (chosen extras and free things are none). x of n with the 95 % Wilson interval, overall and per
 * category, all over the same n. n = 0: rate and limits null. Example: 4 of 10 is 40 %, from 17 to 69 %.
 */
export function surpriseRate(facts: readonly RebuildFacts[]): SurpriseRate {
  const done = completed(facts);
  const told = done.filter((rebuild) => !rebuild.hasUnknownForeseen);
  const categories = categoriesOf(done).map((category) => {
    const cells = told.map((rebuild) => rebuild.categories.get(category)).filter((cell) => cell !== undefined);
    const surprised = cells.filter((cell) => cell.surpriseCount > 0).length;
    const unforeseenCents = sum(cells.map((cell) => cell.unforeseenCents));
    return { category, ...wilson(surprised, told.length), unforeseenCents };
  });
  const surprised = told.filter((rebuild) => [...rebuild.categories.values()].some((cell) => cell.surpriseCount > 0));
  const unforeseenCents = sum(categories.map((category) => category.unforeseenCents));
  return {
    ...wilson(surprised.length, told.length),
    unknownCount: done.length - told.length,
    unforeseenCents,
    shareOfWork: ratio(unforeseenCents, sum(told.map(paidCents))),
    categories,
  };
}
