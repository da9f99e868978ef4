import type { RebuildFacts } from './facts.ts';
import { type Completed, completed, isOverwritten, planned } from './sets.ts';
import { FEW, mean, median, quantile, ratio, sum } from './statistics.ts';
import { byCodePoint } from './text-order.ts';

export interface Overrun {
  readonly n: number;
  /** (Σ actual − Σ estimate) ÷ Σ estimate, a fraction. */
  readonly pooled: number | null;
  readonly median: number | null;
  readonly mean: number | null;
  readonly q10: number | null;
  readonly q25: number | null;
  readonly q75: number | null;
  readonly q90: number | null;
  readonly isThin: boolean;
  /** Σ estimate and Σ actual, cents. */
  readonly estimateCents: number;
  readonly actualCents: number;
  /** Completed but left out: the estimate was written over; there was none. */
  readonly overwrittenCount: number;
  readonly noEstimateCount: number;
}

export interface CategoryOverrun {
  readonly category: string;
  readonly n: number;
  readonly pooled: number | null;
  readonly median: number | null;
  readonly estimateCents: number;
  readonly actualCents: number;
  /** Rebuilds that spent in this category without having planned to, and what; never part of a ratio. */
  readonly unbudgetedCount: number;
  readonly unbudgetedCents: number;
  readonly isThin: boolean;
}

/** (actual − estimate) ÷ estimate of one rebuild, a fraction. null = no estimate, or one that was written over. */
export function rebuildOverrun(rebuild: RebuildFacts): number | null {
  if (isOverwritten(rebuild)) return null;
  const estimate = rebuild.estimateCents;
  return ratio(rebuild.planningCents - estimate, estimate);
}

/**
 * Cost overrun over completed rebuilds with an estimate (definitions §5): o = (B − E) ÷ E, B being the planning
 * actual and holding categories that nobody planned. Quantiles are type 7. No such rebuild: every ratio null.
 * Example: 100 became 300 and 1,000 became 900: pooled 0.09, mean and median 0.95.
 */
export function overrun(facts: readonly RebuildFacts[]): Overrun {
  const set = planned(facts);
  const each = set.map(rebuildOverrun).filter((value) => value !== null);
  const estimate = sum(set.map((rebuild) => rebuild.estimateCents));
  const actual = sum(set.map((rebuild) => rebuild.planningCents));
  const done = completed(facts);
  const overwrittenCount = done.filter(isOverwritten).length;
  return {
    n: set.length,
    pooled: ratio(actual - estimate, estimate),
    median: median(each),
    mean: mean(each),
    q10: quantile(each, 0.1),
    q25: quantile(each, 0.25),
    q75: quantile(each, 0.75),
    q90: quantile(each, 0.9),
    isThin: set.length < FEW,
    estimateCents: estimate,
    actualCents: actual,
    overwrittenCount,
    noEstimateCount: done.length - set.length - overwrittenCount,
  };
}

/**
 * Overrun per category (definitions §5), categories by name: over the rebuilds that planned for the category
 * (they may have spent nothing in it), with the unbudgeted ones beside it. Written-over estimates are left out.
 */
export function overrunByCategory(facts: readonly RebuildFacts[]): CategoryOverrun[] {
  const set = completed(facts).filter((rebuild) => !isOverwritten(rebuild));
  return categoriesOf(completed(facts)).map((category) => categoryOverrun(category, set));
}

/** Every category in an estimate or an entry of these rebuilds, by name. */
export function categoriesOf(set: readonly Completed[]): string[] {
  const names = new Set<string>();
  for (const { estimates, categories } of set) {
    for (const name of estimates.keys()) names.add(name);
    for (const name of categories.keys()) names.add(name);
  }
  return [...names].sort(byCodePoint);
}

function categoryOverrun(category: string, set: readonly Completed[]): CategoryOverrun {
  const ratios: number[] = [];
  let estimateCents = 0;
  let actualCents = 0;
  let unbudgetedCount = 0;
  let unbudgetedCents = 0;
  for (const rebuild of set) {
    const estimate = rebuild.estimates.get(category) ?? 0;
    const actual = rebuild.categories.get(category)?.planningCents ?? 0;
    if (estimate > 0) {
      ratios.push((actual - estimate) / estimate);
      estimateCents += estimate;
      actualCents += actual;
    } else if (actual !== 0) {
      unbudgetedCount += 1;
      unbudgetedCents += actual;
    }
  }
  return {
    category,
    n: ratios.length,
    pooled: ratio(actualCents - estimateCents, estimateCents),
    median: median(ratios),
    estimateCents,
    actualCents,
    unbudgetedCount,
    unbudgetedCents,
    isThin: ratios.length < FEW,
  };
}
