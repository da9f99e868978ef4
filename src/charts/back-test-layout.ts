import { valueAxis } from './axis.ts';
import { keepApart } from './spread-labels.ts';

/** One finished rebuild, in order of sale. Rates are fractions of the locked estimate. */
export type BackTestBar = {
  label: string;
  href?: string | undefined;
  /** The year in which it left. */
  year: number;
  /** Over (+) or under (−) the locked estimate. */
  rate: number;
  /** The rule it would have had at the time; null: too few before it to set one. */
  ruleRate: number | null;
  /** What the rule did not cover, cents; null or 0: covered. */
  shortCents: number | null;
};

export const BACK_TEST_MARGIN = { top: 26, right: 8, bottom: 26, left: 46 };
/** Taller bars would flatten the rest; they are cut and say so. */
const HIGHEST = 1.5;
const DRAWN_AT_MOST = 300;

/** Bars, the rule's step band, year marks and the short ones' labels, in pixels; labels that would collide give way to larger ones. */
export function backTestLayout(
  bars: readonly BackTestBar[],
  size: { width: number; height: number },
  write: (cents: number) => string,
) {
  const { top, right, bottom, left } = BACK_TEST_MARGIN;
  const shown = bars.slice(-DRAWN_AT_MOST);
  const values = shown.flatMap((bar) => [Math.min(bar.rate, HIGHEST), bar.ruleRate ?? 0]);
  const y = valueAxis(values, [size.height - bottom, top], 52);
  const slot = (size.width - left - right) / Math.max(1, shown.length);
  const placed = shown.map((bar, at) => ({
    ...bar,
    x: left + at * slot,
    middle: left + (at + 0.5) * slot,
    y: y.scale(Math.max(0, Math.min(bar.rate, HIGHEST))),
    height: Math.abs(y.scale(Math.min(bar.rate, HIGHEST)) - y.scale(0)),
    ruleY: bar.ruleRate === null ? null : y.scale(bar.ruleRate),
    isCut: bar.rate > HIGHEST,
    isShort: (bar.shortCents ?? 0) > 0,
  }));
  const labels = placed.flatMap((bar) => {
    if (!bar.isShort || bar.shortCents === null) return [];
    const text = write(-bar.shortCents);
    const half = text.length * 3.9 + 3;
    const middle = Math.max(left + half, Math.min(size.width - right - half, bar.middle));
    return [{ text, x: middle, y: bar.y - 6, from: middle - half, to: middle + half, weight: bar.shortCents }];
  });
  const years = placed.flatMap((bar, at) =>
    at === 0 || placed[at - 1]?.year !== bar.year
      ? [{ year: bar.year, x: bar.x, from: bar.x, to: bar.x + 36, weight: -at }]
      : [],
  );
  return {
    y,
    slot,
    barWidth: Math.max(1, Math.min(9, slot * 0.62)),
    bars: placed,
    labels: keepApart(labels),
    years: keepApart(years),
  };
}

/** The rule as runs of steps: a new run wherever it was missing before. */
export function ruleRuns(
  bars: readonly { x: number; ruleY: number | null }[],
  slot: number,
): { x: number; y: number }[][] {
  const runs: { x: number; y: number }[][] = [];
  let open = false;
  for (const { x, ruleY } of bars) {
    if (ruleY === null) {
      open = false;
      continue;
    }
    if (!open) runs.push([]);
    open = true;
    runs.at(-1)?.push({ x, y: ruleY }, { x: x + slot, y: ruleY });
  }
  return runs;
}
