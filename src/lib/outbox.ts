import { useRef, useState } from 'react';
import { ApiProblem } from './api-problem.ts';
import { newIdempotencyKey } from './api.ts';
import { useUnsaved } from './unsaved.ts';

/** One thing typed and sent but not yet known to be saved. `problem` = it was refused or did not get through. */
export type Unsent<Typed> = { readonly key: string; readonly typed: Typed; readonly problem: ApiProblem | null };

/**
 * Lets a form go on at once while what was typed is being saved. What fails stays listed, with everything typed, to be
 * sent again (with the same key, so never twice) or taken back into the form.
 */
export function useOutbox<Typed>(save: (typed: Typed, idempotencyKey: string) => Promise<void>) {
  const [unsent, setUnsent] = useState<readonly Unsent<Typed>[]>([]);
  const latest = useRef(save);
  latest.current = save;
  useUnsaved(unsent.some(({ problem }) => problem !== null));

  const drop = (key: string) => setUnsent((all) => all.filter((one) => one.key !== key));
  const mark = (key: string, problem: ApiProblem | null) =>
    setUnsent((all) => all.map((one) => (one.key === key ? { ...one, problem } : one)));

  async function deliver(key: string, typed: Typed): Promise<void> {
    try {
      await latest.current(typed, key);
      drop(key);
    } catch (problem) {
      if (!(problem instanceof ApiProblem)) throw problem;
      mark(key, problem);
    }
  }

  return {
    unsent,
    send: (typed: Typed): void => {
      const key = newIdempotencyKey();
      setUnsent((all) => [{ key, typed, problem: null }, ...all]);
      void deliver(key, typed);
    },
    retry: (key: string): void => {
      const one = unsent.find((candidate) => candidate.key === key);
      if (!one) return;
      mark(key, null);
      void deliver(key, one.typed);
    },
    drop,
  };
}
