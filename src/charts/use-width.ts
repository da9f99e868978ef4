import { type RefObject, useLayoutEffect, useRef, useState } from 'react';

/** Width of an element in pixels, kept up with its box; null until it is first measured. */
export function useWidth<E extends HTMLElement>(): [RefObject<E | null>, number | null] {
  const ref = useRef<E>(null);
  const [width, setWidth] = useState<number | null>(null);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const measure = () => setWidth(Math.floor(element.getBoundingClientRect().width) || null);
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, width];
}
