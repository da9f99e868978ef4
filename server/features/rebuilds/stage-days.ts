import type { Rebuild } from '#shared/contracts/rebuilds.ts';
import { daysBetween } from '#shared/day.ts';
import type { RebuildDate } from '#shared/vocabulary.ts';

/** Each names who waits on whom; one figure of days would hide it. */
const STAGES: readonly [name: string, from: RebuildDate, to: RebuildDate][] = [
  ['Fetching', 'boughtOn', 'pickedUpOn'],
  ['Waiting to start', 'pickedUpOn', 'startedOn'],
  ['Building', 'startedOn', 'roadworthyOn'],
  ['Papers', 'roadworthyOn', 'titleIssuedOn'],
  ['Selling', 'listedOn', 'soldOn'],
  ['Money out', 'boughtOn', 'settledOn'],
];

/** Days of each stage; null while one of its two days is not known. Negative when the days are in an odd order. */
export function stageDays(rebuild: Rebuild): { name: string; days: number | null }[] {
  return STAGES.map(([name, fromField, toField]) => {
    const from = rebuild[fromField];
    const to = rebuild[toField];
    return { name, days: from && to ? daysBetween(from, to) : null };
  });
}
