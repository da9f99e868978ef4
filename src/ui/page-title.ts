import { useEffect } from 'react';

/** Names the window after the page. */
export function usePageTitle(title: string): void {
  useEffect(() => {
    document.title = `${title} · Panelgap`;
  }, [title]);
}
