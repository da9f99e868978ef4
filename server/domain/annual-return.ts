import type { RebuildFacts } from './facts.ts';
import { type NetFlows, type Series, toSeries } from './net-flows.ts';
import { roots } from './return-roots.ts';
import { completed } from './sets.ts';
import { median } from './statistics.ts';

/**
 * Annual return (XIRR, definitions §3): the r with Σ CF·(1 + r)^(−t) = 0, t = days since the first flow ÷ 365,
 * −0.9999 ≤ r ≤ 1,000,000. Several may fit: the one with the smallest |ln(1 + r)|, of two equally far the positive.
 * null = no money in, none out, all on one day, or no such r. Example: −1,000 and 365 days later 1,100: 0.1.
 * One year is 365 days, as in spreadsheets. Under about 60 days held it mostly measures speed.
 */
export function annualReturn(net: NetFlows): number | null {
  const series = toSeries(net);
  const root = series === null ? undefined : roots(series, 1)[0];
  return root === undefined ? null : Math.expm1(root);
}

/** Does more than one annual return fit these flows? */
export function hasSeveralReturns(net: NetFlows): boolean {
  const series = toSeries(net);
  return series !== null && signChanges(series) > 1 && roots(series, 2).length > 1;
}

function signChanges({ cents }: Series): number {
  return cents.filter((value, i) => i > 0 && Math.sign(value) !== Math.sign(cents[i - 1] as number)).length;
}

export interface AnnualReturns {
  /** The return of all flows together; never a mean of the single returns. */
  readonly pooled: number | null;
  /** Rebuilds that have a return of their own, and the median of these. */
  readonly n: number;
  readonly median: number | null;
  /** Completed rebuilds with an undated entry: no return, and their flows are in no pooled one. */
  readonly undatedCount: number;
  /** Completed, all dated, but the purchase or its day is not known: left out as well. */
  readonly noPurchaseCount: number;
}

/**
 * Annual return of the shop (definitions §3, §18.1). `flows` are those of every rebuild for which `hasFlows` holds,
 * netted by day; the single returns are the ones kept with the books.
 */
export function annualReturns(facts: readonly RebuildFacts[], flows: NetFlows): AnnualReturns {
  const set = completed(facts);
  const own = set.map((rebuild) => rebuild.xirr).filter((value) => value !== null);
  return {
    pooled: annualReturn(flows),
    n: own.length,
    median: median(own),
    undatedCount: set.filter((rebuild) => rebuild.hasUndated).length,
    noPurchaseCount: set.filter((rebuild) => !rebuild.hasUndated && !hasFlows(rebuild)).length,
  };
}

/** Do this rebuild's flows count in an annual return: gone, purchase and its day known, every entry dated? */
export function hasFlows(rebuild: RebuildFacts): boolean {
  const { exit, purchaseCents, boughtOn, hasUndated } = rebuild;
  return exit !== null && purchaseCents !== null && boughtOn !== null && !hasUndated;
}
