import { ceilProduct } from '../exact.ts';
import type { Cents } from '../money.ts';

/** Fee table: from this bid on (cents, rising) this fee is paid; a bid below the first row pays none. */
export type FeeSteps = readonly (readonly [fromCents: Cents, feeCents: Cents])[];

/** What a bid must leave room for. Whole cents, days and seconds, none below 0 but the sale and the repair budget. */
export interface BidTerms {
  readonly saleCents: Cents;
  /** Plan and cushion, as `repairBudget` gives it. null = the rule wanted has too few past rebuilds. */
  readonly repairBudgetCents: Cents | null;
  readonly transportCents: Cents;
  readonly sellingCents: Cents;
  readonly holdingCentsPerDay: Cents;
  readonly days: number;
  readonly paidLaborCents: Cents;
  readonly ownSeconds: number;
  readonly wantedCentsPerHour: Cents;
  readonly wantedProfitCents: Cents;
  /** Tax on the bid as the fraction p/q, q > 0: 6.5 % is 13/200. */
  readonly tax: { readonly p: number; readonly q: number };
  readonly feeSteps: FeeSteps;
  /** On top of the table, at a bid of 0 too. */
  readonly feeFlatCents: Cents;
  /** Bids go in steps of this, > 0. */
  readonly bidStepCents: Cents;
}

export interface WalkAwayBid {
  /** What bid, fee and tax may come to, rounded down to the cent; may be negative. null = no repair budget. */
  readonly roomCents: Cents | null;
  /** The highest bid. null = none, not even 0; then no fee, tax or rest either. */
  readonly bidCents: Cents | null;
  readonly feeCents: Cents | null;
  readonly taxCents: Cents | null;
  /** Room − bid − fee − tax: what the next step would need and does not get. */
  readonly leftCents: Cents | null;
}

const SECONDS_PER_HOUR = 3600;
const NO_BID = { bidCents: null, feeCents: null, taxCents: null, leftCents: null };

/**
 * Walk-away bid (definitions §11c, §18.5): the highest whole step M with M + fee(M) + tax(M) ≤ sale − repair budget −
 * transport − selling − days × holding − paid labor − own hours × wanted pay − wanted profit. A fee table may fall, so
 * its rows are tried from the top one down, each by its own bound; a search by halving would miss bids.
 * Example (trade.md §7): room of 4,668.00, steps of 50.00, a fee of 659.00: 3,950.00, and 59.00 is left.
 */
export function walkAwayBid(terms: BidTerms): WalkAwayBid {
  const roomCents = bidRoom(terms);
  if (roomCents === null) return { roomCents, ...NO_BID };
  const { feeSteps, feeFlatCents, bidStepCents, tax } = terms;
  const rows: FeeSteps = [[0, 0], ...feeSteps];
  for (const [i, [from, fee]] of [...rows.entries()].reverse()) {
    const feeCents = fee + feeFlatCents;
    const below = rows[i + 1]?.[0] ?? Number.POSITIVE_INFINITY;
    const top = Math.min(below - 1, mostWithTax(roomCents - feeCents, tax));
    const bidCents = Math.floor(top / bidStepCents) * bidStepCents;
    if (bidCents < Math.max(0, from)) continue;
    const taxCents = bidTax(bidCents, tax);
    return { roomCents, bidCents, feeCents, taxCents, leftCents: roomCents - bidCents - feeCents - taxCents };
  }
  return { roomCents, ...NO_BID };
}

/** Room for bid, fee and tax, rounded down: own pay may come to a part of a cent. null = no repair budget. */
export function bidRoom(terms: Omit<BidTerms, 'tax' | 'feeSteps' | 'feeFlatCents' | 'bidStepCents'>): Cents | null {
  if (terms.repairBudgetCents === null) return null;
  const costs = terms.repairBudgetCents + terms.transportCents + terms.sellingCents + terms.paidLaborCents;
  const ownPay = ceilProduct(terms.ownSeconds, terms.wantedCentsPerHour, SECONDS_PER_HOUR);
  return terms.saleCents - costs - terms.days * terms.holdingCentsPerDay - ownPay - terms.wantedProfitCents;
}

/** Fee of a bid: that of the last row it reaches, and the flat part. */
export function bidFee(
  bidCents: Cents,
  { feeSteps, feeFlatCents }: Pick<BidTerms, 'feeSteps' | 'feeFlatCents'>,
): Cents {
  return feeFlatCents + (feeSteps.findLast(([from]) => from <= bidCents)?.[1] ?? 0);
}

/** Tax of a bid ≥ 0, half a cent up: floor((2·M·p + q)/2q), exactly. */
export function bidTax(bidCents: Cents, { p, q }: BidTerms['tax']): Cents {
  return Number((2n * BigInt(bidCents) * BigInt(p) + BigInt(q)) / (2n * BigInt(q)));
}

/**
 * The most that with its tax stays within `cents`, to the cent: M + floor((2Mp + q)/2q) ≤ cents holds just when
 * 2M(p + q) < q(2·cents + 1). Below 0 for negative cents.
 */
function mostWithTax(cents: Cents, { p, q }: BidTerms['tax']): Cents {
  const bound = BigInt(q) * (2n * BigInt(cents) + 1n);
  return bound <= 0n ? -1 : Number((bound - 1n) / (2n * BigInt(p + q)));
}
