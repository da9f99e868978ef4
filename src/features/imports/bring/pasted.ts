import { useEffect, useRef } from 'react';

/** How many rows and cells stand in text copied out of a spreadsheet; a line end within quotes starts no row. */
export function sizeOf(text: string): { rows: number; cells: number } {
  const lines = text
    .replace(/"(?:[^"]|"")*"/g, 'x')
    .split(/\r\n|\r|\n/)
    .filter((line) => line.trim() !== '');
  return { rows: lines.length, cells: Math.max(0, ...lines.map((line) => line.split('\t').length)) };
}

/** Pasted cells as the file that they would make, saved as text with tabs. */
export const pastedFile = (text: string) => new File([text], 'Pasted cells.tsv', { type: 'text/tab-separated-values' });

/** Takes text that is pasted anywhere on the page, except into a field. */
export function usePaste(onText: (text: string) => void): void {
  const latest = useRef(onText);
  latest.current = onText;
  useEffect(() => {
    const onPaste = (event: ClipboardEvent) => {
      const isInField = event.target instanceof Element && event.target.closest('input, textarea, [contenteditable]');
      const text = event.clipboardData?.getData('text/plain') ?? '';
      if (isInField || text.trim() === '') return;
      event.preventDefault();
      latest.current(text);
    };
    document.addEventListener('paste', onPaste);
    return () => document.removeEventListener('paste', onPaste);
  }, []);
}
