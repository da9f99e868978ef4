import { TREND_AT_MOST, type Trend } from '#shared/contracts/answers-parts.ts';
import { dayNumber } from '#shared/day.ts';
import type { RebuildFacts } from '../../domain/facts.ts';
import { trend, type TrendPoint } from '../../domain/trend.ts';

const DAYS_A_YEAR = 365.25;

type Leaving = Pick<RebuildFacts, 'exit'>;

/** These in the order in which they left, the latest first; those still here stay out. */
export function latestFirst<T extends Leaving>(rebuilds: readonly T[]): T[] {
  const on = ({ exit }: T) => exit?.on ?? '';
  return rebuilds.filter(({ exit }) => exit !== null).sort((a, b) => (on(a) < on(b) ? 1 : on(a) > on(b) ? -1 : 0));
}

/** How a figure of each rebuild changes by the year (definitions of trend: domain), over the latest that have one. */
export function yearlyTrend<T extends Leaving>(latest: readonly T[], figure: (one: T) => number | null): Trend {
  const points: TrendPoint[] = [];
  let isCapped = false;
  for (const one of latest) {
    const y = figure(one);
    if (y === null || one.exit === null) continue;
    isCapped = points.length === TREND_AT_MOST;
    if (isCapped) break;
    points.push({ x: dayNumber(one.exit.on) / DAYS_A_YEAR, y });
  }
  return { ...trend(points), isCapped };
}
