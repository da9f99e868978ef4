import { scaleLinear } from '@visx/scale';
import { spreadLabels } from './spread-labels.ts';

/** Share still unsold from a day on (days since listed or bought), with its 95 % interval; null: no interval. */
export type SurvivalStep = { day: number; share: number; low: number | null; high: number | null };
export type SurvivalGroup = { label: string; n: number; steps: readonly SurvivalStep[]; medianDays: number | null };

export const SURVIVAL_MARGIN = { top: 12, bottom: 46, left: 46, right: 108 };

type Place = { x: number; y: number };

/** Steps and bands in pixels, and direct labels at the right that never overlap. The first group is all together. */
export function survivalLayout(groups: readonly SurvivalGroup[], size: { width: number; height: number }) {
  const { top, bottom, left, right } = SURVIVAL_MARGIN;
  const lastDay = Math.max(1, ...groups.flatMap((group) => group.steps.map((step) => step.day)));
  const x = scaleLinear<number>({ domain: [0, lastDay], range: [left, size.width - right] });
  const y = scaleLinear<number>({ domain: [0, 1], range: [size.height - bottom, top] });
  const line = (group: SurvivalGroup): Place[] => [
    { x: x(0), y: y(1) },
    ...group.steps.map((step) => ({ x: x(step.day), y: y(step.share) })),
  ];
  const band = (group: SurvivalGroup) =>
    group.steps.flatMap((step) =>
      step.low === null || step.high === null ? [] : [{ x: x(step.day), y0: y(step.low), y1: y(step.high) }],
    );
  const ends = groups.map((group) => line(group).at(-1) ?? { x: left, y: top });
  const labelAt = spreadLabels(
    ends.map((end) => end.y),
    17,
    top + 4,
    size.height - bottom - 2,
  );
  const room = Math.max(2, Math.floor((size.width - left - right) / 46));
  return {
    x,
    y,
    dayTicks: x.ticks(room).map((value) => ({ value, at: x(value) })),
    groups: groups.map((group, at) => ({
      ...group,
      line: line(group),
      band: band(group),
      end: ends[at] ?? { x: left, y: top },
      labelY: labelAt[at] ?? 0,
    })),
  };
}
