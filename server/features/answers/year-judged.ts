import type { z } from 'zod';
import type { yearAnswerSchema } from '#shared/contracts/answers-year.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { profit, rebuildProfit } from '../../domain/profit.ts';
import { worked } from '../../domain/profit-per-hour.ts';
import { ratioWithoutOne } from '../../domain/ratio-without-one.ts';
import { type Priced, priced } from '../../domain/sets.ts';
import { type AnswerInput, namedWithoutOne } from './input.ts';
import { latestFirst, yearlyTrend } from './trends.ts';

type Answer = z.input<typeof yearAnswerSchema>;

/** Is it getting better? Over all years: what each rebuild kept, and by own hour. */
export function yearTrends(rebuilds: readonly ShopRebuild[]): Answer['trends'] {
  const latest = latestFirst(priced(rebuilds));
  const kept = (one: Priced) => rebuildProfit(one).profitCents;
  return {
    perHour: yearlyTrend(latest, (one) => (one.ownSeconds ? (kept(one) * 3600) / one.ownSeconds : null)),
    perRebuild: yearlyTrend(latest, kept),
  };
}

/** What the year would have kept, in all and by own hour, without the rebuild that moves it most. */
export function yearWithoutOne(
  input: AnswerInput,
  exits: readonly ShopRebuild[],
  keptCents: number,
): Answer['withoutOne'] {
  const [furthest] = priced(exits)
    .map(rebuildProfit)
    .sort((a, b) => Math.abs(b.profitCents) - Math.abs(a.profitCents));
  const hours = worked(exits).map((one) => ({
    id: one.id,
    x: one.ownSeconds,
    y: rebuildProfit(one).profitCents * 3600,
  }));
  return {
    kept: namedWithoutOne(input, furthest ? { id: furthest.id, value: keptCents - furthest.profitCents } : null),
    perHour: namedWithoutOne(input, ratioWithoutOne(hours)),
  };
}

/** What the year would be said to have kept if only sales counted. */
export function soldOnlyOf(exits: readonly ShopRebuild[], overheadCents: number): Answer['soldOnly'] {
  const { n, profitCents } = profit(exits.filter(({ exit }) => exit?.kind === 'sold'));
  return { n, keptCents: profitCents - overheadCents };
}
