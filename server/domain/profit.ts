import { daysBetween } from '#shared/day.ts';
import type { RebuildFacts } from './facts.ts';
import { type Completed, completed, type Priced, priced } from './sets.ts';
import { mean, median, ratio, sum } from './statistics.ts';

export interface RebuildProfit {
  readonly id: string;
  /** A: what the work cost, cents. */
  readonly workCents: number;
  /** T: purchase + work, cents. */
  readonly costCents: number;
  /** What was kept: proceeds − cost, cents. Own labor is not a cost. */
  readonly profitCents: number;
  /** Profit ÷ cost, a fraction. null = cost not above 0. */
  readonly returnOnCost: number | null;
}

export interface Profit {
  /** Completed rebuilds with a known purchase. */
  readonly n: number;
  /** Left out: completed, but the purchase is not known. */
  readonly noPurchaseCount: number;
  readonly purchaseCents: number;
  readonly workCents: number;
  readonly costCents: number;
  readonly proceedsCents: number;
  readonly profitCents: number;
  /** Rebuilds that lost money; zero is not a loss. */
  readonly lossCount: number;
  readonly returnOnCost: {
    readonly n: number;
    readonly pooled: number | null;
    readonly median: number | null;
    readonly mean: number | null;
  };
}

/**
 * What one rebuild left (definitions §2): A = Σ entries, T = purchase + A, profit = proceeds − T,
 * return on cost = profit ÷ T. Example: bought for 5,000, work 3,000, sold for 10,000: profit 2,000, 25 %.
 */
export function rebuildProfit(rebuild: Priced): RebuildProfit {
  const workCents = rebuild.paidCents;
  const costCents = rebuild.purchaseCents + workCents;
  const profitCents = rebuild.exit.proceedsCents - costCents;
  return {
    id: rebuild.id,
    workCents,
    costCents,
    profitCents,
    returnOnCost: ratio(profitCents, costCents),
  };
}

/** Exit − bought, in days (definitions §2). null = day of purchase not known. */
export function daysHeld({ boughtOn, exit }: Pick<Completed, 'boughtOn' | 'exit'>): number | null {
  return boughtOn === null ? null : daysBetween(boughtOn, exit.on);
}

/**
 * The shop's profit over its completed rebuilds (definitions §2). Pooled return on cost = Σ profit ÷ Σ T,
 * beside the median and the mean of the single returns. With no rebuild the sums are 0 and the returns null.
 */
export function profit(facts: readonly RebuildFacts[]): Profit {
  const set = priced(facts);
  const each = set.map(rebuildProfit);
  const returns = each.map((one) => one.returnOnCost).filter((value) => value !== null);
  const costCents = sum(each.map((one) => one.costCents));
  const profitCents = sum(each.map((one) => one.profitCents));
  return {
    n: set.length,
    noPurchaseCount: completed(facts).length - set.length,
    purchaseCents: sum(set.map((rebuild) => rebuild.purchaseCents)),
    workCents: sum(each.map((one) => one.workCents)),
    costCents,
    proceedsCents: sum(set.map((rebuild) => rebuild.exit.proceedsCents)),
    profitCents,
    lossCount: each.filter((one) => one.profitCents < 0).length,
    returnOnCost: {
      n: returns.length,
      pooled: ratio(profitCents, costCents),
      median: median(returns),
      mean: mean(returns),
    },
  };
}
