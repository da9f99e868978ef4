import erfc from '@stdlib/math-base-special-erfc';
import type { Observation } from './kaplan-meier.ts';
import { sum } from './statistics.ts';

export interface LogRank {
  readonly observedA: number;
  readonly expectedA: number;
  readonly observedB: number;
  readonly expectedB: number;
  readonly variance: number;
  /** Both null when the variance is 0. */
  readonly chiSquare: number | null;
  readonly p: number | null;
}

/**
 * Do two classes sell at different speeds? Log-rank test (Mantel 1966; definitions §7): over the days with sales
 * E = Σ d·nₐ/n, V = Σ d·(nₐ/n)(1 − nₐ/n)(n − d)/(n − 1), χ² = (O − E)²/V with 1 degree of freedom,
 * p = erfc(√(χ²/2)). null = no sale. Example: the 6-MP trial (9 of 21 against 21 of 21) gives χ² 16.79.
 */
export function logRank(a: readonly Observation[], b: readonly Observation[]): LogRank | null {
  const marked =
    (inA: number) =>
    ({ days, isSold }: Observation) => ({ days, isSold, inA });
  const all = [...a.map(marked(1)), ...b.map(marked(0))];
  all.sort((x, y) => x.days - y.days);
  let atRiskA = a.length;
  let expectedA = 0;
  let variance = 0;
  for (let i = 0; i < all.length; ) {
    const atRisk = all.length - i;
    const end = endOfDay(all, i);
    const day = all.slice(i, end);
    const sold = day.filter((one) => one.isSold).length;
    const share = atRiskA / atRisk;
    expectedA += sold * share;
    if (atRisk > 1) variance += (sold * share * (1 - share) * (atRisk - sold)) / (atRisk - 1);
    atRiskA -= sum(day.map((one) => one.inA));
    i = end;
  }
  const observedA = a.filter((one) => one.isSold).length;
  const observedB = b.filter((one) => one.isSold).length;
  if (observedA + observedB === 0) return null;
  const chiSquare = variance > 0 ? (observedA - expectedA) ** 2 / variance : null;
  return {
    observedA,
    expectedA,
    observedB,
    expectedB: observedA + observedB - expectedA,
    variance,
    chiSquare,
    p: chiSquare === null ? null : chiSquareTail(chiSquare),
  };
}

/** Chance of a χ² with 1 degree of freedom at or above this value, exact far out in the tail too. */
export function chiSquareTail(chiSquare: number): number {
  return erfc(Math.sqrt(chiSquare / 2));
}

function endOfDay(sorted: readonly Observation[], start: number): number {
  let end = start;
  while (sorted[end]?.days === sorted[start]?.days && end < sorted.length) end += 1;
  return end;
}
