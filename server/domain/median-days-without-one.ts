import { HALF_TOLERANCE } from './kaplan-meier.ts';
import type { WithoutOne } from './ratio-without-one.ts';
import type { OnMarket } from './sets.ts';

/** What happened after so many days: who sold then, and who was lost sight of. */
interface MarketDay {
  readonly days: number;
  readonly sold: string[];
  readonly lost: string[];
}

/**
 * How far one rebuild moves the middle of the selling curve (definitions §7). Those of one day that fared alike move it
 * alike, so one of each is left out in turn and the curve walked down again to its middle. null = no middle, whether
 * with all or without any one of them. Example: sold after 1, 3, 5 and 9 days, middle 4: without the first it is 5.
 */
export function medianDaysWithoutOne(members: readonly OnMarket[]): WithoutOne | null {
  const days = marketDays(members);
  const middle = middleOf(days, members.length, null);
  if (middle === null) return null;
  let furthest: WithoutOne | null = null;
  for (const day of days) {
    for (const ids of [day.sold, day.lost]) {
      const [id] = ids;
      if (id === undefined) continue;
      const value = middleOf(days, members.length - 1, ids);
      if (value === null) continue;
      if (furthest === null || Math.abs(value - middle) > Math.abs(furthest.value - middle)) furthest = { id, value };
    }
  }
  return furthest;
}

function marketDays(members: readonly OnMarket[]): MarketDay[] {
  const byDays = new Map<number, MarketDay>();
  for (const { id, days, isSold } of members) {
    const day = byDays.get(days) ?? { days, sold: [], lost: [] };
    byDays.set(days, day);
    (isSold ? day.sold : day.lost).push(id);
  }
  return [...byDays.values()].sort((a, b) => a.days - b.days);
}

/** The first day with at most half unsold, `without` being one shorter; half way to the next fall where exactly half. */
function middleOf(days: readonly MarketDay[], count: number, without: readonly string[] | null): number | null {
  let atRisk = count;
  let unsold = 1;
  let halfAt: number | null = null;
  for (const { days: at, sold, lost } of days) {
    const soldCount = sold.length - (sold === without ? 1 : 0);
    if (soldCount > 0) {
      if (halfAt !== null) return (halfAt + at) / 2;
      unsold *= 1 - soldCount / atRisk;
      if (unsold < 0.5 - HALF_TOLERANCE) return at;
      if (unsold <= 0.5 + HALF_TOLERANCE) halfAt = at;
    }
    atRisk -= soldCount + lost.length - (lost === without ? 1 : 0);
  }
  return halfAt;
}
