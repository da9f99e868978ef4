/** Chance that the true coverage lies below the band, and above it. */
const TAIL = 0.1;

/** The band's 10th and 90th percentile, as shares. */
export interface CoverageBand {
  readonly lower: number;
  readonly upper: number;
}

/**
 * What "8 in 10" may turn out to be for a rule from few rebuilds: the share that the k-th smallest of `n` values truly
 * covers is Beta(k, n + 1 − k), whatever their distribution (Wilks 1942, Annals of Mathematical Statistics 13), exactly
 * without ties; given are its 10th and 90th percentile. null = too few yet (k > n).
 * Example: n 9, k 8: from 0.63 to 0.94, "8 in 10, could be 6 to 9".
 */
export function coverageBand(n: number, k: number): CoverageBand | null {
  if (k < 1 || k > n) return null;
  let logChoose = 0;
  for (let i = 1; i <= k; i += 1) logChoose += Math.log((n - k + i) / i);
  const chanceBelow = (share: number) => atLeast(share, { n, k, logChoose });
  return { lower: shareWhere(chanceBelow, TAIL), upper: shareWhere(chanceBelow, 1 - TAIL) };
}

/** Share at which a rising chance reaches `wanted`. */
function shareWhere(chanceBelow: (share: number) => number, wanted: number): number {
  let [low, high] = [0, 1];
  for (let i = 0; i < 50; i += 1) {
    const middle = (low + high) / 2;
    if (chanceBelow(middle) < wanted) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

interface Sizes {
  readonly n: number;
  readonly k: number;
  /** ln C(n, k). */
  readonly logChoose: number;
}

/** P(at least k of n) at a share each = P(Beta(k, n + 1 − k) ≤ share), summed outward from k until nothing is added. */
function atLeast(share: number, { n, k, logChoose }: Sizes): number {
  const odds = share / (1 - share);
  const first = Math.exp(logChoose + k * Math.log(share) + (n - k) * Math.log1p(-share));
  if (k > n * share) return outward(first, (i) => (odds * (n - k - i)) / (k + i + 1));
  return 1 - outward((first * k) / (n - k + 1) / odds, (i) => (k - 1 - i) / (n - k + 2 + i) / odds);
}

/** first·(1 + r(0) + r(0)r(1) + …), the factors falling to 0. */
function outward(first: number, factorAt: (i: number) => number): number {
  let [total, term] = [0, first];
  for (let i = 0; term > total * 1e-17; i += 1) {
    total += term;
    term *= factorAt(i);
  }
  return total;
}
