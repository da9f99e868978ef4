import { type RefObject, useLayoutEffect, useRef, useState } from 'react';

/** Width of an element in pixels, kept up with its box; null until it is first measured. */
export function useWidth<E extends HTMLElement>(): [RefObject<E | null>, number | null] {
  const ref = useRef<E>(null);
  const [width, setWidth] = useState<number | null>(null);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const take = (size: number) => setWidth(Math.floor(size) || null);
    take(element.getBoundingClientRect().width);
    const observer = new ResizeObserver(([entry]) => entry && take(entry.contentRect.width));
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, width];
}
