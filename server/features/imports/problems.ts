import { ProblemError } from '../../platform/problems.ts';

/** What was asked does not go with what the import is just now. */
export const wrongState = (detail: string) => new ProblemError(409, { name: 'wrong-state', detail });

/** The reading that a person saw is not the one that would be booked. */
export function refuseStale(seen: number | null, version: number): void {
  if (seen === null || seen === version) return;
  throw new ProblemError(412, {
    name: 'changed-meanwhile',
    detail: 'This file was read again since you looked at it. Look at it as it is now, then book it.',
  });
}
