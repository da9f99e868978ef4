import { lazy, Suspense, useEffect } from 'react';
import { useBlocker } from 'react-router-dom';
import { hasUnsaved } from '../lib/unsaved.ts';

const loadDialog = () => import('./leave-dialog.tsx');
const LeaveDialog = lazy(async () => ({ default: (await loadDialog()).LeaveDialog }));

/** Asks before a page is left on which something typed is not saved; the browser asks before the window is. */
export function LeaveGuard() {
  const blocker = useBlocker(({ currentLocation, nextLocation }) => {
    return hasUnsaved() && currentLocation.pathname !== nextLocation.pathname;
  });
  useEffect(() => {
    // Ahead of need: without signal it could not come any more.
    void loadDialog().catch(() => undefined);
    const ask = (event: BeforeUnloadEvent) => {
      if (hasUnsaved()) event.preventDefault();
    };
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, []);
  if (blocker.state !== 'blocked') return null;
  return (
    <Suspense>
      <LeaveDialog onLeave={blocker.proceed} onStay={blocker.reset} />
    </Suspense>
  );
}
