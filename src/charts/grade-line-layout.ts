import { scaleLinear } from '@visx/scale';

/** How one rule held: the share held with its interval, beside the share that it was set to hold. */
export type Grade = {
  /** The year, with the revision where there are several. */
  label: string;
  /** `13 of 14`, or why there is nothing. */
  note: string;
  href?: string | undefined;
  share: number;
  rate: number | null;
  low: number | null;
  high: number | null;
};

export const GRADE_MARGIN = { top: 12, right: 12, bottom: 46, left: 46 };
const SLOT_AT_MOST = 150;

/** Grades in pixels, side by side in the order given; the axis is always the whole of 0 to 100 %. */
export function gradeLineLayout(grades: readonly Grade[], size: { width: number; height: number }) {
  const { top, right, bottom, left } = GRADE_MARGIN;
  const y = scaleLinear<number>({ domain: [0, 1], range: [size.height - bottom, top] });
  const slot = Math.min(SLOT_AT_MOST, Math.max(1, size.width - left - right) / Math.max(1, grades.length));
  const at = (value: number | null) => (value === null ? null : y(value));
  const placed = grades.map((grade, index) => ({
    ...grade,
    x: left + (index + 0.5) * slot,
    shareY: y(grade.share),
    rateY: at(grade.rate),
    lowY: at(grade.low),
    highY: at(grade.high),
  }));
  const line = placed.flatMap(({ x, rateY }) => (rateY === null ? [] : [{ x, y: rateY }]));
  const ticks = [0, 0.25, 0.5, 0.75, 1].map((value) => ({ value, at: y(value) }));
  return { y, ticks, dash: Math.min(26, slot * 0.6), grades: placed, line };
}
