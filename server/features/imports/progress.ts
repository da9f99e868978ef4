import { EventEmitter, once } from 'node:events';
import type { ImportState, Progress } from '#shared/contracts/imports.ts';
import type { ShopScope } from '../../books/scope.ts';

/** Share done of the imports under way, by id. Gone after a restart, as they are. */
const shares = new Map<string, number>();
const news = new EventEmitter().setMaxListeners(0);
// Should news ever be missed, the state is looked up all the same.
const QUIET_MS = 2000;
const BUSY: readonly ImportState[] = ['reading', 'committing'];

/** How far an import is, 0–1; null = nothing is being done with it. */
export const progressOf = (importId: string) => shares.get(importId) ?? null;

export function tellProgress(importId: string, share: number): void {
  shares.set(importId, share);
  news.emit(importId);
}

/** Nothing is being done with an import any more. */
export function endProgress(importId: string): void {
  shares.delete(importId);
  news.emit(importId);
}

/** How many wait for news; for the check that nobody is left behind. */
export const waiting = (importId: string) => news.listenerCount(importId);

/** Each step of an import, until it is done or nobody listens. */
export async function* progressEvents(
  scope: ShopScope,
  importId: string,
  closed: AbortSignal,
): AsyncGenerator<Progress> {
  let told = '';
  while (!closed.aborted) {
    const over = new AbortController();
    const signal = AbortSignal.any([closed, over.signal, AbortSignal.timeout(QUIET_MS)]);
    // Listening starts before the state is read: nothing can fall in between.
    const next = once(news, importId, { signal }).catch(() => undefined);
    try {
      const row: { state: ImportState } | undefined = await scope
        .table('imports')
        .where({ id: importId })
        .first('state');
      if (!row) return;
      const isBusy = BUSY.includes(row.state);
      const progress: Progress = { state: row.state, progress: isBusy ? progressOf(importId) : null };
      if (JSON.stringify(progress) !== told) yield progress;
      told = JSON.stringify(progress);
      if (!isBusy) return;
      await next;
    } finally {
      over.abort();
    }
  }
}
