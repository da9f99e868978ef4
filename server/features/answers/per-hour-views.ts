import type { z } from 'zod';
import type { perHourSchema } from '#shared/contracts/answers-parts.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { rebuildProfit } from '../../domain/profit.ts';
import { profitPerHour, worked } from '../../domain/profit-per-hour.ts';
import { priced } from '../../domain/sets.ts';
import { sum } from '../../domain/statistics.ts';

/** The three views of profit per hour, with the sums that each is a quotient of. */
export function perHourViews(
  rebuilds: readonly ShopRebuild[],
  wantedCentsPerHour: number | null,
): z.input<typeof perHourSchema> {
  const { own, all, afterWage } = profitPerHour(rebuilds, wantedCentsPerHour);
  const ownSet = worked(rebuilds);
  const allSet = priced(rebuilds).filter(
    ({ ownSeconds, paidSeconds }) => ownSeconds !== null && paidSeconds !== null && ownSeconds + paidSeconds > 0,
  );
  const profitOf = (set: typeof allSet) => sum(set.map((rebuild) => rebuildProfit(rebuild).profitCents));
  return {
    own: { ...own, profitCents: profitOf(ownSet), ownSeconds: sum(ownSet.map(({ ownSeconds }) => ownSeconds)) },
    all: {
      ...all,
      profitCents: profitOf(allSet),
      seconds: sum(allSet.map(({ ownSeconds, paidSeconds }) => (ownSeconds ?? 0) + (paidSeconds ?? 0))),
    },
    afterWage,
  };
}
