import { useEffect, useRef, useState } from 'react';

/** Takes files that are dropped anywhere on the page. Gives whether something is being held over it. */
export function useFileDrop(onFiles: (files: readonly File[]) => void): boolean {
  const [isOver, setOver] = useState(false);
  const latest = useRef(onFiles);
  latest.current = onFiles;
  useEffect(() => {
    const stop = new AbortController();
    const on = (name: 'dragover' | 'dragleave' | 'drop', hear: (event: DragEvent) => void) =>
      window.addEventListener(name, hear, { signal: stop.signal });
    on('dragover', (event) => {
      event.preventDefault();
      setOver(true);
    });
    on('dragleave', (event) => event.relatedTarget === null && setOver(false));
    on('drop', (event) => {
      event.preventDefault();
      setOver(false);
      const files = [...(event.dataTransfer?.files ?? [])];
      if (files.length > 0) latest.current(files);
    });
    return () => stop.abort();
  }, []);
  return isOver;
}
