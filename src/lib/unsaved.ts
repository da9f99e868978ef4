import { useEffect } from 'react';

const open = new Set<symbol>();
let guard: ((go: () => void) => void) | null = null;

/** While `isUnsaved`, this part of the page holds something typed that would be gone if the page were left. */
export function useUnsaved(isUnsaved: boolean): void {
  useEffect(() => {
    if (!isUnsaved) return;
    const one = Symbol('unsaved');
    open.add(one);
    return () => void open.delete(one);
  }, [isUnsaved]);
}

/** Does any part of the page hold something typed and not saved? */
export function hasUnsaved(): boolean {
  return open.size > 0;
}

/** Leaves the page by `go`: at once, or after a person said so where something is not saved. */
export function leaveBy(go: () => void): void {
  if (guard && hasUnsaved()) guard(go);
  else go();
}

/** Who asks before a page is left. Returns what ends it. */
export function guardLeaving(ask: (go: () => void) => void): () => void {
  guard = ask;
  return () => {
    guard = null;
  };
}
