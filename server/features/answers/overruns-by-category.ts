import type { z } from 'zod';
import type { overrunsAnswerSchema } from '#shared/contracts/answers-overruns.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { sum } from '../../domain/statistics.ts';
import { byCodePoint } from '../../domain/text-order.ts';
import type { AnswerInput } from './input.ts';
import { exitYears, ratesByYear } from './overruns-by-year.ts';
import { marksOf, partsOf } from './overruns-parts.ts';
import { type AgainstPlan, spreadOf } from './spread.ts';

type Categories = z.input<typeof overrunsAnswerSchema>['categories'];

interface Found {
  readonly planned: AgainstPlan[];
  /** Of these, the ones where each entry says whether it was foreseen, and the cents of their surprises. */
  readonly told: AgainstPlan[];
  readonly surprises: number[];
  readonly unbudgeted: number[];
  extraCents: number;
}

/**
 * Overrun per category (definitions §5): over the rebuilds that planned for it, with the unbudgeted ones beside it.
 * `rebuilds` are finished and their estimates were not written over.
 */
export function categoryOverruns(input: AnswerInput, rebuilds: readonly ShopRebuild[], isBinned: boolean): Categories {
  const yearOf = exitYears(rebuilds, input.shop.startMonth);
  const found = new Map<string, Found>();
  for (const rebuild of rebuilds) {
    for (const name of rebuild.estimates.keys()) take(categoryIn(found, name), rebuild, name);
    for (const name of rebuild.categories.keys()) {
      if (!rebuild.estimates.has(name)) take(categoryIn(found, name), rebuild, name);
    }
  }
  const idOf = new Map(input.shop.categories.map(({ id, name }) => [name, id]));
  return [...found]
    .sort(([a], [b]) => byCodePoint(a, b))
    .map(([name, { planned, told, surprises, unbudgeted, extraCents }]) => {
      const { planSum, actualSum, ...spread } = spreadOf(planned);
      return {
        categoryId: idOf.get(name) ?? '',
        name,
        ...spread,
        estimateCents: planSum,
        actualCents: actualSum,
        ...marksOf(input, planned, isBinned),
        parts: partsOf(told, sum(surprises)),
        unbudgetedCount: unbudgeted.length,
        unbudgetedCents: sum(unbudgeted),
        extraCents,
        years: ratesByYear(planned, yearOf),
      };
    });
}

function categoryIn(found: Map<string, Found>, name: string): Found {
  const known = found.get(name);
  if (known) return known;
  const category: Found = { planned: [], told: [], surprises: [], unbudgeted: [], extraCents: 0 };
  found.set(name, category);
  return category;
}

function take(category: Found, rebuild: ShopRebuild, name: string): void {
  const plan = rebuild.estimates.get(name) ?? 0;
  const spent = rebuild.categories.get(name);
  const actual = spent?.planningCents ?? 0;
  category.extraCents += spent?.extraCents ?? 0;
  if (plan === 0) {
    if (actual !== 0) category.unbudgeted.push(actual);
    return;
  }
  const one = { id: rebuild.id, plan, actual };
  category.planned.push(one);
  if (rebuild.hasUnknownForeseen) return;
  category.told.push(one);
  category.surprises.push(spent?.unforeseenCents ?? 0);
}
