import type { Difference, Trend } from '#shared/contracts/answers-parts.ts';
import type { Formatter } from '#shared/formatter.ts';

/** How a change or a gap is written: always with its sign. */
export type Write = (value: number) => string;

/** Points of a percentage, signed: `+17 points`. */
export function points(rate: number, format: Formatter): string {
  const text = format.signedPercent(rate).replace('%', '');
  return `${text} ${Math.abs(Math.round(rate * 100)) === 1 ? 'point' : 'points'}`;
}

/** Is it getting better? `better` says which way is good. An interval that holds 0 says nothing either way. */
export function trendVerdict({ slope, lower, upper, isThin }: Trend, better: 'up' | 'down'): string {
  if (slope === null || lower === null || upper === null || isThin) return 'too few yet';
  if (lower <= 0 && upper >= 0) return 'could be luck';
  return slope > 0 === (better === 'up') ? 'getting better' : 'getting worse';
}

/** `+2 points a year, could be luck (−1 point to +6 points)`. */
export function trendWords(trend: Trend, better: 'up' | 'down', write: Write): string {
  const { slope, lower, upper } = trend;
  if (slope === null || lower === null || upper === null) return 'too few yet';
  return `${write(slope)} a year, ${trendVerdict(trend, better)} (${write(lower)} to ${write(upper)})`;
}

/** Does an interval hold 0? Then the gap could be luck. */
export function couldBeLuck({ lower, upper }: Difference): boolean {
  return lower <= 0 && upper >= 0;
}

/** `+17 points (+1 point to +32 points), hardly luck`. null = too few to compare. */
export function differenceWords(gap: Difference | null, write: Write): string {
  if (gap === null) return 'too few to compare';
  const verdict = gap.isThin ? 'too few yet' : couldBeLuck(gap) ? 'could be luck' : 'hardly luck';
  return `${write(gap.difference)} (${write(gap.lower)} to ${write(gap.upper)}): ${verdict}`;
}
