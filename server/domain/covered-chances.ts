/**
 * If nothing has changed: chance that exactly 0, 1 … m of `m` new values stay at or below the k-th smallest of `n` past
 * ones, whatever the values' distribution (number of exceedances: Gumbel & von Schelling 1950, Annals of Mathematical
 * Statistics 21). P(j) = C(k − 1 + j, j) · C(n − k + m − j, m − j) / C(n + m, m), for 1 ≤ k ≤ n and values without ties.
 * Example: n 9, k 8, m 1: 2/10 and 8/10.
 */
export function coveredChances({ n, k, m }: { n: number; k: number; m: number }): number[] {
  // Logarithms, each term from the one before: the terms of a large shop are far below what a double holds.
  const logs = [0];
  for (let j = 0; j < m; j += 1) {
    const step = Math.log((k + j) / (j + 1)) + Math.log((m - j) / (n - k + m - j));
    logs.push((logs[j] ?? 0) + step);
  }
  const top = logs.reduce((a, b) => Math.max(a, b));
  const weights = logs.map((log) => Math.exp(log - top));
  const total = weights.reduce((a, b) => a + b);
  return weights.map((weight) => weight / total);
}
