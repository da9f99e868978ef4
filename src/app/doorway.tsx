import type { ReactNode } from 'react';
import { Outlet } from 'react-router-dom';
import { Brand } from './brand.tsx';

/** The frame of pages that stand before a shop: sign-in, sign-up, an invitation, an error without a page. */
export function Doorway({ children }: { children?: ReactNode }) {
  return (
    <div className="frame">
      <header className="rail">
        <Brand />
      </header>
      <main className="page" id="main" tabIndex={-1}>
        {children ?? <Outlet />}
      </main>
    </div>
  );
}

/** What stands while the frame itself loads: the same as the page that came without script. */
export function FrameSkeleton() {
  return (
    <div className="frame">
      <header className="rail">
        <Brand />
        <span className="rail-skeleton" aria-hidden="true">
          <i />
          <i />
          <i />
          <i />
          <i />
        </span>
      </header>
      <main className="page" aria-busy="true">
        <p className="sr-only">Opening Panelgap</p>
      </main>
    </div>
  );
}
