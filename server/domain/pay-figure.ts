import type { PayView } from '#shared/vocabulary.ts';
import { rebuildProfit } from './profit.ts';
import type { Priced } from './sets.ts';
import { ratio } from './statistics.ts';

const SECONDS_PER_HOUR = 3600;

/** What the rebuilds of a group come to; of a single one n is 1. Money in cents. */
export interface PaySums {
  n: number;
  profitCents: number;
  laborCents: number;
  costCents: number;
  /** 0 = not known: such a rebuild has no figure that needs it. */
  ownSeconds: number;
  /** Own and paid; 0 where either is not known. */
  allSeconds: number;
}

/** The figure of a view, sum over sum; null = the view cannot say it, so a single rebuild is not in it. */
export type PayFigure = (sums: Readonly<PaySums>) => number | null;

/**
 * Profit by a view (definitions §2, §4, §18.2): cents per own hour; paid labor given back, cents per hour of anybody;
 * cents a rebuild after own hours were paid `wantedCentsPerHour` (null = no wage, no figure); fraction of cost.
 * Example: 1,000 kept over 40 own hours at 20 an hour: 25 an hour, 200 after the wage.
 */
export function payFigure(view: PayView, wantedCentsPerHour: number | null): PayFigure {
  switch (view) {
    case 'per-hour':
      return ({ profitCents, ownSeconds }) => ratio(profitCents * SECONDS_PER_HOUR, ownSeconds);
    case 'all-hours':
      return ({ profitCents, laborCents, allSeconds }) =>
        ratio((profitCents + laborCents) * SECONDS_PER_HOUR, allSeconds);
    case 'after-wage':
      return ({ n, profitCents, ownSeconds }) => {
        if (wantedCentsPerHour === null || ownSeconds === 0) return null;
        return ratio(profitCents - (ownSeconds * wantedCentsPerHour) / SECONDS_PER_HOUR, n);
      };
    case 'on-cost':
      return ({ profitCents, costCents }) => ratio(profitCents, costCents);
  }
}

/** What one rebuild adds. */
export function paySums(rebuild: Priced): PaySums {
  const { profitCents, costCents } = rebuildProfit(rebuild);
  const { ownSeconds, paidSeconds, paidLaborCents } = rebuild;
  return {
    n: 1,
    profitCents,
    laborCents: paidLaborCents,
    costCents,
    ownSeconds: ownSeconds ?? 0,
    allSeconds: ownSeconds === null || paidSeconds === null ? 0 : ownSeconds + paidSeconds,
  };
}

export const NO_PAY: Readonly<PaySums> = {
  n: 0,
  profitCents: 0,
  laborCents: 0,
  costCents: 0,
  ownSeconds: 0,
  allSeconds: 0,
};

export function addPay(sums: PaySums, more: Readonly<PaySums>): void {
  sums.n += more.n;
  sums.profitCents += more.profitCents;
  sums.laborCents += more.laborCents;
  sums.costCents += more.costCents;
  sums.ownSeconds += more.ownSeconds;
  sums.allSeconds += more.allSeconds;
}
