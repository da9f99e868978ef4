import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { basisQuery, bidQuery } from '../features/bids/queries.ts';
import { OfflineLine } from '../features/bids/offline-line.tsx';
import { Sheet } from '../features/bids/sheet.tsx';
import type { Arrived } from '../features/bids/use-keeping.tsx';
import { mine } from '../lib/kept.ts';
import { keepSession, useSession } from '../lib/session.ts';
import { usePageTitle } from '../ui/page-title.ts';
import { ErrorState, LoadingState } from '../ui/states.tsx';
import { notify } from '../ui/toast.tsx';

/** What is the most I should bid on this one? A new sheet, or a kept one; once opened it works without signal. */
export function PreBidPage() {
  const { bidId } = useParams();
  const session = useSession();
  usePageTitle('Pre-bid sheet');
  useEffect(() => keepSession(session), [session]);
  return (
    <>
      <header className="no-print flex min-h-9 items-center justify-between gap-x-6">
        <h1 className="font-semibold text-soft">What is the most I should bid on this one?</h1>
        <Link to={`/s/${session.shop.id}/pre-bids`} className="inline-flex min-h-11 flex-none items-center">
          Kept sheets
        </Link>
      </header>
      <Opened key={bidId ?? 'new'} bidId={bidId ?? null} />
    </>
  );
}

function Opened({ bidId }: { bidId: string | null }) {
  const session = useSession();
  const { shop, role } = session;
  const home = mine(session);
  const navigate = useNavigate();
  const basis = useQuery(basisQuery(home));
  const bid = useQuery({ ...bidQuery(bidId ?? '', home), enabled: bidId !== null });
  const failed = [basis, ...(bidId ? [bid] : [])].find((one) => one.error && !one.data);
  if (failed) return <ErrorState error={failed.error} onRetry={() => void failed.refetch()} />;
  if (!basis.data || (bidId !== null && !bid.data)) return <LoadingState label="Opening the sheet" lines={6} />;
  const onKept = (arrived: Arrived) => {
    const to = (path: string, replace: boolean) => void navigate(`/s/${shop.id}/${path}`, { replace });
    if (!arrived) {
      notify('Kept in this browser', { detail: 'There is no signal. It is sent when there is.' });
      return to('pre-bids', false);
    }
    const isOther = arrived.agrees === false;
    notify(
      'Sheet kept',
      isOther ? { detail: 'The books have changed meanwhile: its figures are worked out anew.' } : {},
    );
    if (isOther) void basis.refetch();
    if (bidId === null) to(`pre-bid/${arrived.bid.id}`, true);
  };
  return (
    <>
      <OfflineLine basis={basis.data} isOld={basis.error !== null} />
      <Sheet
        basis={basis.data}
        bid={bidId === null ? null : (bid.data ?? null)}
        home={home}
        shop={shop}
        mayWrite={role === 'owner' || role === 'bookkeeper'}
        onKept={onKept}
        onBought={(rebuildId) => void navigate(`/s/${shop.id}/rebuilds/${rebuildId}`)}
      />
    </>
  );
}
