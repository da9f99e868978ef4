/** 97.5 % point of the normal distribution (definitions §0). */
export const Z = 1.959963984540054;

export interface Rate {
  readonly n: number;
  readonly x: number;
  /** x / n. null = nothing was tried. */
  readonly rate: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
}

/**
 * Share x of n with its 95 % Wilson score interval, no continuity correction (Wilson 1927; Newcombe 1998,
 * method 3): center (p + z²/2n) / (1 + z²/n), half z·√(p(1 − p)/n + z²/4n²) / (1 + z²/n).
 * x = 0 gives a lower end of exactly 0, x = n an upper end of exactly 1. n = 0: all null.
 * Example: 81 of 263 is 0.308, from 0.255 to 0.366.
 */
export function wilson(x: number, n: number): Rate {
  if (n === 0) return { n, x, rate: null, lower: null, upper: null };
  const p = x / n;
  const scale = 1 + (Z * Z) / n;
  const center = (p + (Z * Z) / (2 * n)) / scale;
  const half = (Z * Math.sqrt((p * (1 - p)) / n + (Z * Z) / (4 * n * n))) / scale;
  return { n, x, rate: p, lower: x === 0 ? 0 : center - half, upper: x === n ? 1 : center + half };
}
