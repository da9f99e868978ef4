import { useEffect, useSyncExternalStore } from 'react';

export type KeyHelp = { keys: string; does: string };

let shown: readonly KeyHelp[] = [];
const listeners = new Set<() => void>();

function show(keys: readonly KeyHelp[]) {
  shown = keys;
  for (const listener of listeners) listener();
}

/** Lists a page's own keys under `?` while the page stands. Give a constant list. */
export function usePageKeys(keys: readonly KeyHelp[]): void {
  useEffect(() => {
    show(keys);
    return () => show([]);
  }, [keys]);
}

/** The keys of the page that stands now. */
export function useShownKeys(): readonly KeyHelp[] {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => shown,
  );
}
