/**
 * Quantile of values that stand in rising order, by linear interpolation at h = (n − 1)p + 1 (Hyndman & Fan 1996, type
 * 7; definitions §8). null = no values. Example: 1, 2, 3, 4 at 0.25 gives 1.75.
 */
export function quantileOfSorted(sorted: ArrayLike<number>, p: number): number | null {
  const place = (sorted.length - 1) * p;
  const below = sorted[Math.floor(place)];
  const above = sorted[Math.ceil(place)];
  if (below === undefined || above === undefined) return null;
  return below + (above - below) * (place - Math.floor(place));
}
