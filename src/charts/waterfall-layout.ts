import { scaleLinear } from '@visx/scale';

/** total: where it starts (sold for). less: a cost, positive cents. kept: what is left. */
export type WaterfallRow = { label: string; cents: number; kind: 'total' | 'less' | 'kept' };

/** Bars from the sale down to what was kept: each cost ends where the one before began. Pixels. */
export function waterfallLayout(
  rows: readonly WaterfallRow[],
  size: { width: number; labelRoom: number; figureRoom: number; rowHeight: number },
) {
  let running = 0;
  const spans = rows.map((row) => {
    if (row.kind === 'less') {
      const top = running;
      running -= row.cents;
      return { row, from: Math.min(running, top), to: Math.max(running, top) };
    }
    running = row.cents;
    return { row, from: Math.min(0, row.cents), to: Math.max(0, row.cents) };
  });
  const scale = scaleLinear<number>({
    domain: [Math.min(0, ...spans.map((span) => span.from)), Math.max(1, ...spans.map((span) => span.to))],
    range: [size.labelRoom, size.width - size.figureRoom],
  });
  return {
    zero: scale(0),
    bars: spans.map(({ row, from, to }, at) => ({
      ...row,
      x: scale(from),
      width: Math.max(1.5, scale(to) - scale(from)),
      y: at * size.rowHeight,
    })),
  };
}
