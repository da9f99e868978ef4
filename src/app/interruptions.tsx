import { lazy, Suspense, useEffect, useState } from 'react';
import type { Session } from '#shared/contracts/session.ts';
import { isOtherShop, isSessionEnded, watchProblems } from '../lib/problem-watch.ts';

const SessionEnded = lazy(async () => ({ default: (await import('./session-ended.tsx')).SessionEnded }));
const OtherShop = lazy(async () => ({ default: (await import('./other-shop.tsx')).OtherShop }));

/** What may stand above any page: the session ended, or another tab moved it to another shop. What was typed stays below. */
export function Interruptions({ session }: { session: Session }) {
  const [kind, setKind] = useState<'ended' | 'other-shop' | null>(null);
  useEffect(
    () =>
      watchProblems((problem) => {
        if (isSessionEnded(problem)) setKind('ended');
        else if (isOtherShop(problem)) setKind('other-shop');
      }),
    [],
  );
  const close = () => setKind(null);
  return (
    <Suspense>
      {kind === 'ended' && <SessionEnded email={session.user.email} shopId={session.shop.id} onDone={close} />}
      {kind === 'other-shop' && <OtherShop shop={session.shop} onDone={close} />}
    </Suspense>
  );
}
