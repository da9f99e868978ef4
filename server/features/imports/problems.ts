import { ProblemError } from '../../platform/problems.ts';

/** What was asked does not go with what the import is just now. */
export const wrongState = (detail: string) => new ProblemError(409, { name: 'wrong-state', detail });
