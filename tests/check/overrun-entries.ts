import type { RebuildFacts } from '../../server/domain/facts.ts';
import { overrun, overrunByCategory, rebuildOverrun } from '../../server/domain/overrun.ts';
import { daysHeld, rebuildProfit } from '../../server/domain/profit.ts';
import { isOverwritten, priced } from '../../server/domain/sets.ts';
import type { Rate } from '../../server/domain/statistics.ts';
import { surpriseRate } from '../../server/domain/surprise-rate.ts';
import { byCodePoint } from '../../server/domain/text-order.ts';
import type { Entry } from './answers-document.ts';

export function overrunEntry(facts: readonly RebuildFacts[], format: 1 | 2): Entry {
  const one = overrun(facts);
  const total = {
    n: one.n,
    pooled: one.pooled,
    median: one.median,
    q10: one.q10,
    q25: one.q25,
    q75: one.q75,
    q90: one.q90,
    mean: one.mean,
    few_data: one.isThin,
  };
  const leftOut = { n_overwritten: one.overwrittenCount, n_no_estimate: one.noEstimateCount };
  return {
    total: format === 1 ? total : { ...total, ...leftOut },
    by_category: overrunByCategory(facts).map((category) => ({
      category: category.category,
      n: category.n,
      pooled: category.pooled,
      median: category.median,
      unbudgeted_n: category.unbudgetedCount,
      unbudgeted_cents: category.unbudgetedCents,
      few_data: category.isThin,
    })),
  };
}

export function surpriseEntry(facts: readonly RebuildFacts[], format: 1 | 2): Entry {
  const one = surpriseRate(facts);
  return {
    ...rateEntry(one),
    ...(format === 2 && { n_unknown: one.unknownCount }),
    unforeseen_cents: one.unforeseenCents,
    share_of_rebuild_cost: one.shareOfWork,
    by_category: one.categories.map((category) => ({ category: category.category, ...rateEntry(category) })),
  };
}

export function projectEntries(facts: readonly RebuildFacts[], format: 1 | 2): Entry[] {
  const set = priced(facts).toSorted((a, b) => byCodePoint(a.id, b.id));
  return set.map((rebuild) => {
    const money = rebuildProfit(rebuild);
    const entry = {
      id: rebuild.id,
      cost_cents: money.costCents,
      profit_cents: money.profitCents,
      roc: money.returnOnCost,
      xirr: rebuild.xirr,
      days_held: daysHeld(rebuild),
      overrun: rebuildOverrun(rebuild),
    };
    if (format === 1) return entry;
    return {
      ...entry,
      planning_cents: rebuild.planningCents,
      surprise_cents: rebuild.hasUnknownForeseen ? null : rebuild.surprisePlanningCents,
      overwritten: isOverwritten(rebuild),
    };
  });
}

function rateEntry({ n, x, rate, lower, upper }: Rate): Entry {
  return { n, x, rate, lo: lower, hi: upper };
}
