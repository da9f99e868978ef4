import { useSyncExternalStore } from 'react';
import { z } from 'zod';
import { bidFieldsSchema, bidsApi, type keptSchema, shownSchema } from '#shared/contracts/bids.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { call } from '../../lib/api.ts';
import { drop, keep, kept } from '../../lib/kept.ts';

/** A weak signal may never answer; then the sheet waits here. The same key goes with it, so it is never kept twice. */
const PATIENCE_MS = 8000;

const errandSchema = z.object({
  /** Its Idempotency-Key. */
  key: z.string(),
  body: bidFieldsSchema,
  shown: shownSchema.optional(),
  /** The kept sheet that it changes and the version that was read; null = a new sheet. */
  changes: z.object({ bidId: z.string(), version: z.int() }).nullable(),
  /** Why the server refused it; null = it did not get through yet. */
  problem: z.string().nullable(),
});
/** A sheet on its way to the server. */
export type Errand = z.output<typeof errandSchema>;
export type Kept = z.output<typeof keptSchema>;

const NONE: readonly Errand[] = [];
const listeners = new Set<() => void>();
let read: { text: string; errands: readonly Errand[] } = { text: '', errands: NONE };

const nameOf = (home: string) => `${home}waiting`;

/** Sheets kept in this browser that the server does not have yet, the oldest first. */
export function waitingSheets(home: string): readonly Errand[] {
  const found = kept(nameOf(home));
  const text = home + JSON.stringify(found);
  if (read.text !== text) read = { text, errands: z.array(errandSchema).safeParse(found).data ?? NONE };
  return read.errands;
}

/** The same for a component, kept up in every window. */
export function useWaiting(home: string): readonly Errand[] {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      window.addEventListener('storage', listener);
      return () => {
        listeners.delete(listener);
        window.removeEventListener('storage', listener);
      };
    },
    () => waitingSheets(home),
  );
}

function store(home: string, errands: readonly Errand[]): boolean {
  const isKept = errands.length === 0 ? (drop(nameOf(home)), true) : keep(nameOf(home), errands);
  for (const listener of listeners) listener();
  return isKept;
}

/** Lets a sheet wait for a signal; false when this browser keeps nothing. */
export function letWait(home: string, errand: Errand): boolean {
  return store(home, [...waitingSheets(home).filter(({ key }) => key !== errand.key), errand]);
}

export function dropWaiting(home: string, key: string): void {
  store(
    home,
    waitingSheets(home).filter((one) => one.key !== key),
  );
}

/** Sends one sheet. Throws ApiProblem; status 0 = it did not get through. */
export function deliver({ key, body, shown, changes }: Errand): Promise<Kept> {
  const whole = { ...body, ...(shown ? { shown } : {}) };
  const signal = AbortSignal.timeout(PATIENCE_MS);
  if (changes === null) return call(bidsApi.create, { body: whole, idempotencyKey: key, signal });
  const { bidId, version } = changes;
  return call(bidsApi.change, { params: { bidId }, version, body: whole, signal });
}

/**
 * Sends what waits and was not refused, one after the other, in one window only. Stops where there is no signal; resolves
 * to how many arrived.
 */
export async function sendWaiting(home: string): Promise<number> {
  const send = async () => {
    let arrived = 0;
    for (const errand of waitingSheets(home).filter(({ problem }) => problem === null)) {
      const problem = await deliver(errand).then(
        () => null,
        (refused: unknown) => refused,
      );
      if (problem === null) {
        arrived++;
        dropWaiting(home, errand.key);
      } else if (!(problem instanceof ApiProblem)) throw problem;
      else if (isPassing(problem)) break;
      else letWait(home, { ...errand, problem: problem.message });
    }
    return arrived;
  };
  return 'locks' in navigator ? navigator.locks.request(`panelgap ${nameOf(home)}`, send) : send();
}

/** No signal, a server that is away, or a session that ended: it waits on as it is. */
export function isPassing({ status }: ApiProblem): boolean {
  return status === 0 || status === 401 || status === 429 || status >= 500;
}
