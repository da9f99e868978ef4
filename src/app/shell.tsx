import { useQueryClient } from '@tanstack/react-query';
import { lazy, Suspense, useEffect, useRef, useState } from 'react';
import { Outlet, useLocation } from 'react-router-dom';
import type { Session } from '#shared/contracts/session.ts';
import { formatDayLong } from '#shared/format-day.ts';
import { keptNames, mine } from '../lib/kept.ts';
import { ErrorBoundary } from '../ui/error-boundary.tsx';
import { LoadingState } from '../ui/states.tsx';
import { BottomBar } from './bottom-bar.tsx';
import { Interruptions } from './interruptions.tsx';
import { LeaveGuard } from './leave-guard.tsx';
import { Rail } from './rail.tsx';
import { useGlobalKeys } from './use-global-keys.ts';

const Palette = lazy(async () => ({ default: (await import('./palette.tsx')).Palette }));
const KeysHelp = lazy(async () => ({ default: (await import('./keys-help.tsx')).KeysHelp }));
const SendWaiting = lazy(async () => ({ default: (await import('../features/bids/send-waiting.tsx')).SendWaiting }));
const Toasts = lazy(async () => ({ default: (await import('../ui/toast.tsx')).Toasts }));

/** The frame of a shop's pages: rail or bottom bar, the page, and what may come over it. */
export function Shell({ session }: { session: Session }) {
  const [open, setOpen] = useState<'palette' | 'keys' | null>(null);
  const { pathname } = useLocation();
  const main = useRouteFocus(pathname);
  const client = useQueryClient();
  const openPalette = () => setOpen('palette');
  const home = mine(session);
  useGlobalKeys({ onFind: openPalette, onHelp: () => setOpen('keys') });
  return (
    <div className="frame">
      <a href="#main" className="skip-link">
        To the page
      </a>
      <Rail session={session} onFind={openPalette} />
      <main id="main" ref={main} tabIndex={-1} className="page">
        {session.shop.isDemo && (
          <p className="no-print mb-4 text-label text-soft">
            Demo shop: every figure is invented, from a seed chosen so that there is something to find. Its calendar
            stands at {formatDayLong(session.shop.today)}.
          </p>
        )}
        <ErrorBoundary
          key={pathname}
          onReset={() => void client.resetQueries({ predicate: (query) => query.state.status === 'error' })}
        >
          <Suspense fallback={<LoadingState label="Opening the page" />}>
            <Outlet />
          </Suspense>
        </ErrorBoundary>
      </main>
      <BottomBar session={session} />
      <Interruptions session={session} />
      <LeaveGuard />
      <Suspense>
        <Toasts />
        {keptNames(`${home}waiting`).length > 0 && <SendWaiting home={home} />}
        {open === 'palette' && <Palette session={session} onClose={() => setOpen(null)} />}
        {open === 'keys' && <KeysHelp onClose={() => setOpen(null)} />}
      </Suspense>
    </div>
  );
}

/** After a change of page, reading and tabbing start at the page's top. */
function useRouteFocus(pathname: string) {
  const main = useRef<HTMLElement>(null);
  const last = useRef(pathname);
  useEffect(() => {
    if (last.current === pathname) return;
    last.current = pathname;
    main.current?.focus({ preventScroll: true });
    window.scrollTo(0, 0);
  }, [pathname]);
  return main;
}
