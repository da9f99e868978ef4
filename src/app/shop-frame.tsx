import { useSuspenseQuery } from '@tanstack/react-query';
import { useEffect, useMemo, useState } from 'react';
import { Navigate, useLocation, useParams } from 'react-router-dom';
import type { Session } from '#shared/contracts/session.ts';
import { createFormatter } from '#shared/formatter.ts';
import { sessionQuery, useSwitchShop } from '../lib/session.ts';
import { setShownShop } from '../lib/shown-shop.ts';
import { NotFoundPage } from '../pages/not-found.tsx';
import { FormatterContext } from '../ui/formatter-context.tsx';
import { ErrorState } from '../ui/states.tsx';
import { Doorway, FrameSkeleton } from './doorway.tsx';
import { Shell } from './shell.tsx';

/** Everything below `/s/:shopId`: only for people who are signed in, in that shop, with its way of writing numbers. */
export function ShopFrame() {
  const { shopId = '' } = useParams();
  const { pathname, search } = useLocation();
  const { data: session } = useSuspenseQuery(sessionQuery());
  if (!session) return <Navigate to={`/sign-in?to=${encodeURIComponent(pathname + search)}`} replace />;
  if (session.shop.id !== shopId) {
    const isMember = session.shops.some((shop) => shop.id === shopId);
    if (isMember) return <MoveTo key={shopId} shopId={shopId} />;
    return (
      <Doorway>
        <NotFoundPage />
      </Doorway>
    );
  }
  return <Inside session={session} />;
}

function Inside({ session }: { session: Session }) {
  // Set while rendering, since the pages below send their first requests before any effect of this one runs.
  setShownShop(session.shop.id);
  useEffect(() => {
    setShownShop(session.shop.id);
    return () => setShownShop(null);
  }, [session.shop.id]);
  const { currency, locale } = session.shop;
  const formatter = useMemo(() => createFormatter({ currency, locale }), [currency, locale]);
  return (
    <FormatterContext value={formatter}>
      <Shell session={session} />
    </FormatterContext>
  );
}

/** An address of another of the person's shops opens in that shop. */
function MoveTo({ shopId }: { shopId: string }) {
  const switchShop = useSwitchShop();
  const [problem, setProblem] = useState<unknown>(null);
  const [move] = useState(() => () => switchShop(shopId).catch(setProblem));
  useEffect(() => void move(), [move]);
  if (problem === null) return <FrameSkeleton />;
  return (
    <Doorway>
      <ErrorState error={problem} onRetry={() => location.reload()} />
    </Doorway>
  );
}
