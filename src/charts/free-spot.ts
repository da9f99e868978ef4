type Place = { x: number; y: number };
export type Spot = { from: number; to: number; y: number };

const HEIGHT = 15;

/**
 * Where a label of given ends can stand near `wanted` (its base line) without crossing a stepped line or another label:
 * the nearest base line within [top, bottom]; `wanted` where there is none.
 */
export function freeSpot(
  label: { from: number; to: number },
  wanted: number,
  lines: readonly (readonly Place[])[],
  taken: readonly Spot[],
  limits: { top: number; bottom: number },
): Spot {
  const crossed = lines.flatMap((line) => crossings(line, label));
  const isFree = (y: number) =>
    crossed.every(([top, bottom]) => bottom < y - HEIGHT + 1 || top > y + 4) &&
    taken.every((one) => one.to < label.from || one.from > label.to || Math.abs(one.y - y) > HEIGHT + 1);
  const span = limits.bottom - limits.top;
  for (let away = 0; away <= span; away += 3) {
    for (const y of [wanted - away, wanted + away]) {
      if (y >= limits.top && y <= limits.bottom && isFree(y)) return { ...label, y };
    }
  }
  return { ...label, y: wanted };
}

/** Heights that a stepped line takes up between two ends: level at each place up to the next, then straight up or down. */
function crossings(line: readonly Place[], { from, to }: { from: number; to: number }): [number, number][] {
  return line.flatMap((place, at): [number, number][] => {
    const next = line[at + 1];
    if (!next || next.x < from - 3 || place.x > to + 3) return [];
    const rises = next.x <= to + 3;
    return [rises ? [Math.min(place.y, next.y), Math.max(place.y, next.y)] : [place.y, place.y]];
  });
}
