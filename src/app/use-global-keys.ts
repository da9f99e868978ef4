import { useEffect, useRef } from 'react';

type Keys = { onFind: () => void; onHelp: () => void };

/** Ctrl/⌘-K finds, `?` lists the keys; `?` stays a letter wherever someone types. */
export function useGlobalKeys(keys: Keys): void {
  const latest = useRef(keys);
  useEffect(() => {
    latest.current = keys;
  });
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if ((event.ctrlKey || event.metaKey) && event.key.toLowerCase() === 'k') {
        event.preventDefault();
        latest.current.onFind();
      } else if (event.key === '?' && !isTyping(event.target)) {
        latest.current.onHelp();
      }
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, []);
}

function isTyping(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && target.closest('input, textarea, select, [contenteditable="true"]') !== null;
}
