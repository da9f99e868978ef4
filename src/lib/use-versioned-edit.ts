import { useState } from 'react';
import { ApiProblem } from './api-problem.ts';

type Wish<T, Change> = {
  /** Saves the change over the version that `before` carries. */
  send: (before: T, change: Change) => Promise<T>;
  /** What stands on the server now. */
  latest: (before: T) => Promise<T>;
};

/**
 * Saves changes of things that carry a version. When someone else was quicker (412), `conflict` holds what was wanted
 * and what stands; `edit` then gives null and nothing was saved. Every other refusal is thrown.
 */
export function useVersionedEdit<T, Change>({ send, latest }: Wish<T, Change>) {
  const [conflict, setConflict] = useState<{ mine: Change; theirs: T } | null>(null);
  const edit = async (before: T, change: Change): Promise<T | null> => {
    try {
      const after = await send(before, change);
      setConflict(null);
      return after;
    } catch (refused) {
      if (!(refused instanceof ApiProblem) || refused.status !== 412) throw refused;
      setConflict({ mine: change, theirs: await latest(before) });
      return null;
    }
  };
  return { edit, conflict, dismiss: () => setConflict(null) };
}
