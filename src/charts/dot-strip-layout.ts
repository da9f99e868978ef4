import { scaleLinear } from '@visx/scale';

/** One rebuild in a category: over (+) or under (−) its locked estimate as a fraction. */
export type StripDot = { rate: number; label: string; href?: string | undefined };

export type StripRow = {
  label: string;
  n: number;
  dots: readonly StripDot[];
  /** Middle and the 10th and 90th percentile, as fractions; null: too few. */
  middle: number | null;
  low: number | null;
  high: number | null;
  /** Share of the overrun that nobody foresaw, 0–1; null: none or not known. */
  surpriseShare: number | null;
};

/** Above this many rebuilds in a row, rows are their band and middle only. */
export const DOTS_AT_MOST = 300;
/** Axis ends where figures stop saying more: a category at three times its estimate is simply far over. */
const LOW_END = -1;
const HIGH_END = 2;

export type PlacedDot = StripDot & { x: number; y: number; isCut: boolean };
export type StripSize = { width: number; labelRoom: number; figureRoom: number; rowHeight: number; stripAt: number };

/** Rates to pixels; equal dots are stacked away from the middle line, in order, within the row. */
export function dotStripLayout(rows: readonly StripRow[], size: StripSize) {
  const { low, high } = stripDomain(rows);
  const range: [number, number] = [size.labelRoom + 8, size.width - size.figureRoom - 8];
  const scale = scaleLinear<number>({ domain: [low, high], range });
  const toX = (rate: number) => scale(Math.min(high, Math.max(low, rate)));
  const showDots = rows.every((row) => row.dots.length <= DOTS_AT_MOST);
  const room = Math.max(2, Math.floor((range[1] - range[0]) / 70));
  return {
    scale,
    ticks: scale.ticks(room).map((value) => ({ value, at: scale(value) })),
    rows: rows.map((row, at) => {
      const y = at * size.rowHeight + size.stripAt;
      return {
        ...row,
        y,
        middleX: row.middle === null ? null : toX(row.middle),
        lowX: row.low === null ? null : toX(row.low),
        highX: row.high === null ? null : toX(row.high),
        placed: showDots ? stack(row.dots, y, toX, (rate) => rate < low || rate > high) : [],
      };
    }),
  };
}

/** From the 3rd to the 97th of a hundred dots, every row's own spread included: one far rebuild must not flatten the rest. */
export function stripDomain(rows: readonly StripRow[]): { low: number; high: number } {
  const dots = rows.flatMap((row) => row.dots.map((dot) => dot.rate)).sort((a, b) => a - b);
  const spread = rows.flatMap((row) => [row.low ?? 0, row.high ?? 0]);
  const near = dots[Math.floor(dots.length * 0.03)] ?? 0;
  const far = dots[Math.ceil(dots.length * 0.97) - 1] ?? 0;
  return {
    low: Math.max(LOW_END, Math.min(-0.2, near - 0.05, ...spread)),
    high: Math.min(HIGH_END, Math.max(0.4, far + 0.05, ...spread)),
  };
}

const OFFSETS = [0, -5, 5, -10, 10];

function stack(
  dots: readonly StripDot[],
  y: number,
  toX: (rate: number) => number,
  isCut: (rate: number) => boolean,
): PlacedDot[] {
  const placed: PlacedDot[] = [];
  for (const dot of dots.toSorted((a, b) => a.rate - b.rate)) {
    const x = toX(dot.rate);
    const near = placed.filter((one) => x - one.x < 7);
    const offset = OFFSETS.find((one) => near.every((other) => other.y !== y + one)) ?? 0;
    placed.push({ ...dot, x, y: y + offset, isCut: isCut(dot.rate) });
  }
  return placed;
}
