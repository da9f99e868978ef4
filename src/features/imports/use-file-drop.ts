import { useEffect, useRef, useState } from 'react';

/** Takes a file that is dropped anywhere on the page. Gives whether one is being held over it. */
export function useFileDrop(onFile: (file: File) => void): boolean {
  const [isOver, setOver] = useState(false);
  const latest = useRef(onFile);
  latest.current = onFile;
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
      const file = event.dataTransfer?.files[0];
      if (file) latest.current(file);
    });
    return () => stop.abort();
  }, []);
  return isOver;
}
