/**
 * Moves labels apart along one axis: the result keeps the order of the places, at least `gap` between neighbours, within
 * [from, to] where they fit, and as near to their own places as that allows. Returns places in the order given.
 */
export function spreadLabels(places: readonly number[], gap: number, from: number, to: number): number[] {
  const order = places.map((place, index) => ({ place, index })).sort((a, b) => a.place - b.place);
  const settled: number[] = [];
  for (const { place } of order) settled.push(Math.max(place, from, (settled.at(-1) ?? -Infinity) + gap));
  for (let at = settled.length - 1; at >= 0; at--) {
    const limit = at === settled.length - 1 ? to : (settled[at + 1] ?? to) - gap;
    settled[at] = Math.min(settled[at] ?? limit, limit);
  }
  const result = places.slice();
  order.forEach(({ index }, at) => {
    result[index] = settled[at] ?? 0;
  });
  return result;
}

/** Keeps the most important of labels that would overlap. Each has a `from` and `to` on one line and a `weight`. */
export function keepApart<T extends { from: number; to: number; weight: number }>(labels: readonly T[]): T[] {
  const kept: T[] = [];
  for (const label of labels.toSorted((a, b) => b.weight - a.weight)) {
    if (kept.every((one) => label.to < one.from || label.from > one.to)) kept.push(label);
  }
  return kept;
}
