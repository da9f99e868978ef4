import { useEffect } from 'react';

const open = new Set<symbol>();

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
