import { useEffect, useState, useSyncExternalStore } from 'react';

/** Does the browser think that it has a connection? A weak one counts as one. */
export function useIsOnline(): boolean {
  return useSyncExternalStore(
    (listener) => {
      window.addEventListener('online', listener);
      window.addEventListener('offline', listener);
      return () => {
        window.removeEventListener('online', listener);
        window.removeEventListener('offline', listener);
      };
    },
    () => navigator.onLine,
  );
}

/** Address of the worker that keeps the pages' own files; the build writes it. */
const WORKER = '/offline-worker.js';

/**
 * Lets the browser keep this page's files. `ready` = it opens without signal from now on; `never` = this browser, or an
 * address without https, keeps none.
 */
export function useKeptPages(): 'asked' | 'ready' | 'never' {
  const [state, setState] = useState<'asked' | 'ready' | 'never'>(isPossible() ? 'asked' : 'never');
  useEffect(() => {
    if (!isPossible()) return;
    navigator.serviceWorker.register(WORKER).then(
      () => navigator.serviceWorker.ready.then(() => setState('ready')),
      () => setState(navigator.serviceWorker.controller ? 'ready' : 'never'),
    );
  }, []);
  return state;
}

function isPossible(): boolean {
  return import.meta.env.PROD && 'serviceWorker' in navigator;
}
