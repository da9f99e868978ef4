import { useState } from 'react';

export type Scheme = 'system' | 'light' | 'dark';

export const SCHEMES: readonly { value: Scheme; label: string }[] = [
  { value: 'system', label: 'Light as the system' },
  { value: 'light', label: 'Always light' },
  { value: 'dark', label: 'Always dark' },
];

/** The same name stands in public/theme.js, which applies the choice before the first paint. */
const KEY = 'panelgap-theme';

/** The chosen scheme and a way to choose another; it is kept in this browser. */
export function useScheme(): [Scheme, (scheme: Scheme) => void] {
  const [scheme, setScheme] = useState<Scheme>(() => {
    const set = document.documentElement.dataset['theme'];
    return set === 'light' || set === 'dark' ? set : 'system';
  });
  const choose = (next: Scheme) => {
    if (next === 'system') {
      delete document.documentElement.dataset['theme'];
      localStorage.removeItem(KEY);
    } else {
      document.documentElement.dataset['theme'] = next;
      localStorage.setItem(KEY, next);
    }
    setScheme(next);
  };
  return [scheme, choose];
}
