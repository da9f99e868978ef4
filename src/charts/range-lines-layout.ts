import { valueAxis } from './axis.ts';

/** One group: the spread of what happened (10th to 90th percentile), and its own figure, or null with the reason in `note`. */
export type RangeRow = {
  label: string;
  n: number;
  low: number | null;
  high: number | null;
  value: number | null;
  note: string;
};

/** Rates to pixels. Where the words after a line would not fit, they stand before it. */
export function rangeLinesLayout(
  rows: readonly RangeRow[],
  size: { width: number; labelRoom: number; rowHeight: number; lineAt: number; noteRoom: number },
) {
  const values = rows.flatMap((row) => [row.low ?? 0, row.high ?? 0, row.value ?? 0]);
  const axis = valueAxis(values, [size.labelRoom + 18, size.width - size.noteRoom], 64);
  const x = (rate: number | null) => (rate === null ? null : axis.scale(rate));
  return {
    axis,
    rows: rows.map((row, at) => {
      const highX = x(row.high) ?? axis.scale(0);
      return {
        ...row,
        y: at * size.rowHeight + size.lineAt,
        lowX: x(row.low),
        highX: x(row.high),
        valueX: x(row.value),
        noteX: Math.max(highX, x(row.value) ?? highX) + 9,
      };
    }),
  };
}
