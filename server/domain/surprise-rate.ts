import type { RebuildFacts } from './facts.ts';
import { categoriesOf } from './overrun.ts';
import { completed } from './sets.ts';
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
  const found = new Map(categoriesOf(done).map((category) => [category, { surprised: 0, unforeseenCents: 0 }]));
  let surprised = 0;
  for (const rebuild of told) {
    let isSurprised = false;
    for (const [category, { surpriseCount, unforeseenCents: cents }] of rebuild.categories) {
      const counts = found.get(category);
      if (!counts) continue;
      counts.unforeseenCents += cents;
      if (surpriseCount === 0) continue;
      counts.surprised += 1;
      isSurprised = true;
    }
    if (isSurprised) surprised += 1;
  }
  const categories = [...found].map(([category, counts]) => ({
    category,
    ...wilson(counts.surprised, told.length),
    unforeseenCents: counts.unforeseenCents,
  }));
  const unforeseenCents = sum(categories.map((category) => category.unforeseenCents));
  return {
    ...wilson(surprised, told.length),
    unknownCount: done.length - told.length,
    unforeseenCents,
    shareOfWork: ratio(unforeseenCents, sum(told.map((rebuild) => rebuild.paidCents))),
    categories,
  };
}
