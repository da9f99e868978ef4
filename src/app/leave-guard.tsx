import { lazy, Suspense, useEffect, useRef, useState } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';
import { guardLeaving } from '../lib/unsaved.ts';
import { placeNow, watchLeaving } from './watch-leaving.ts';

const loadDialog = () => import('./leave-dialog.tsx');
const LeaveDialog = lazy(async () => ({ default: (await loadDialog()).LeaveDialog }));

/** Asks before a page is left on which something typed is not saved; the browser asks before the window is. */
export function LeaveGuard() {
  const navigate = useNavigate();
  const address = useLocation();
  const [go, setGo] = useState<(() => void) | null>(null);
  const shown = useRef(placeNow());
  const latest = useRef(navigate);
  latest.current = navigate;
  useEffect(() => {
    shown.current = placeNow();
  }, [address]);
  useEffect(() => {
    // Ahead of need: without signal it could not come any more.
    void loadDialog().catch(() => undefined);
    const endGuard = guardLeaving((wanted) => setGo(() => wanted));
    const endWatch = watchLeaving(
      (to) => void latest.current(to),
      () => shown.current,
    );
    return () => {
      endGuard();
      endWatch();
    };
  }, []);
  if (!go) return null;
  const onLeave = () => {
    setGo(null);
    go();
  };
  return (
    <Suspense>
      <LeaveDialog onLeave={onLeave} onStay={() => setGo(null)} />
    </Suspense>
  );
}
