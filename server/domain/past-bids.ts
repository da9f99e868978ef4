import { ceilProduct } from '#shared/exact.ts';
import { sum } from './statistics.ts';

/** A rebuild as it stood when its estimate was locked, what was paid for it, and how it ended. Cents and seconds. */
export interface PastBid {
  readonly id: string;
  /** null = not known, here and below. */
  readonly purchaseCents: number | null;
  /** 0 = none was put in either. */
  readonly expectedSaleCents: number | null;
  readonly plannedSeconds: number | null;
  readonly estimateCents: number;
  /** What the rule known when it was bought puts on top of the estimate. */
  readonly reserveCents: number;
  /** What it left in the end, and the own hours that took. */
  readonly profitCents: number;
  readonly ownSeconds: number | null;
}

export interface JudgedBid {
  readonly id: string;
  readonly paidCents: number;
  /** The most that the sheet of that day allows to pay, with the cushion. May be negative. */
  readonly limitCents: number;
  readonly reserveCents: number;
  readonly profitCents: number;
  readonly ownSeconds: number | null;
}

export interface PastBids {
  /** Rebuilds that could be judged. */
  readonly n: number;
  /** Σ of the cushions: by so much the bids on them would have been lower in all. */
  readonly reserveCents: number;
  /** Paid for above the limit with the cushion, but not without it: the rule would have skipped them. */
  readonly skipped: readonly JudgedBid[];
  /** Paid for above the limit even without a cushion: no matter of the rule. */
  readonly aboveAnyway: readonly JudgedBid[];
  /** Not judged, each under the first reason that holds. */
  readonly noPurchaseIds: readonly string[];
  readonly noSaleIds: readonly string[];
  readonly noHoursIds: readonly string[];
}

const SECONDS_PER_HOUR = 3600;

/**
 * What the rule of the day would have done to past bids (trade: yearly review). A car's limit is what its own locked
 * estimate allowed to pay: expected sale − estimate − cushion − planned hours × wanted pay. It would have been skipped
 * where more was paid than that, and not more than the limit without the cushion. Nothing learned later takes part: the
 * cushion is that of the rule known when it was bought, and the profit is only looked at afterwards. `wantedCentsPerHour`
 * null = own hours ask for nothing, and need not be planned.
 * Example: expected 9,000, estimate 3,000, cushion 700, nothing an hour: limit 5,300; paid 5,500: skipped.
 */
export function pastBids(bids: readonly PastBid[], wantedCentsPerHour: number | null): PastBids {
  const judged: (JudgedBid & { readonly withoutCents: number })[] = [];
  const out = { noPurchaseIds: [] as string[], noSaleIds: [] as string[], noHoursIds: [] as string[] };
  for (const bid of bids) {
    const { id, purchaseCents, expectedSaleCents, reserveCents, profitCents, ownSeconds } = bid;
    const payCents = ownPay(bid.plannedSeconds, wantedCentsPerHour);
    if (purchaseCents === null) out.noPurchaseIds.push(id);
    else if (!expectedSaleCents) out.noSaleIds.push(id);
    else if (payCents === null) out.noHoursIds.push(id);
    else {
      const withoutCents = expectedSaleCents - bid.estimateCents - payCents;
      const limitCents = withoutCents - reserveCents;
      judged.push({ id, paidCents: purchaseCents, limitCents, reserveCents, profitCents, ownSeconds, withoutCents });
    }
  }
  return {
    n: judged.length,
    reserveCents: sum(judged.map((one) => one.reserveCents)),
    skipped: judged.filter((one) => one.paidCents > one.limitCents && one.paidCents <= one.withoutCents),
    aboveAnyway: judged.filter((one) => one.paidCents > one.withoutCents),
    ...out,
  };
}

function ownPay(plannedSeconds: number | null, wantedCentsPerHour: number | null): number | null {
  if (wantedCentsPerHour === null) return 0;
  return plannedSeconds && ceilProduct(plannedSeconds, wantedCentsPerHour, SECONDS_PER_HOUR);
}
