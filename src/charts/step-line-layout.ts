import { type Day, dayNumber } from '#shared/day.ts';
import { formatMonth } from '#shared/format-day.ts';
import { addDays } from '#shared/day.ts';
import { valueAxis } from './axis.ts';

/** A running total after something happened on a day. */
export type StepPoint = { on: Day; cents: number; label: string; href?: string | undefined };

/** One year's steps: its first day, the first day after it, and how far it is known (null: to its end). */
export type StepSeries = { points: readonly StepPoint[]; start: Day; end: Day; knownTo: Day | null };

export type Size = { width: number; height: number };
export const STEP_MARGIN = { top: 42, right: 14, bottom: 26, left: 52 };

/** Both years laid over each other by day of the year; the axis holds both and zero. */
export function stepLineLayout(now: StepSeries, before: StepSeries | null, size: Size) {
  const { top, right, bottom, left } = STEP_MARGIN;
  const values = [...now.points, ...(before?.points ?? [])].map((point) => point.cents);
  const y = valueAxis(values, [size.height - bottom, top], Math.max(44, size.height / 6));
  const toX = (series: StepSeries, day: Day) => {
    const length = dayNumber(series.end) - dayNumber(series.start);
    return left + ((dayNumber(day) - dayNumber(series.start)) / length) * (size.width - left - right);
  };
  const steps = (series: StepSeries) => {
    const path = [{ x: left, y: y.scale(0) }];
    for (const point of series.points) path.push({ x: toX(series, point.on), y: y.scale(point.cents) });
    const last = path.at(-1);
    if (last) path.push({ x: toX(series, series.knownTo ?? series.end), y: last.y });
    return path;
  };
  return {
    y,
    now: steps(now),
    before: before && steps(before),
    points: now.points.map((point) => ({ ...point, x: toX(now, point.on), y: y.scale(point.cents) })),
    months: monthTicks(now, size.width).map((day) => ({ x: toX(now, day), label: formatMonth(day) })),
  };
}

/** First days of months from the start of the year; every second or third where the room is small. */
function monthTicks(series: StepSeries, width: number): Day[] {
  const every = width < 420 ? 3 : width < 640 ? 2 : 1;
  const days: Day[] = [];
  for (let month = 0; month < 12; month += every) {
    const middle = addDays(series.start, Math.round(month * 30.44) + 14);
    days.push(`${middle.slice(0, 8)}01` < series.start ? series.start : `${middle.slice(0, 8)}01`);
  }
  return days;
}
