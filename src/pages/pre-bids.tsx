import { useInfiniteQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useSearchParams } from 'react-router-dom';
import { BID_STATES, type BidState } from '#shared/contracts/bids.ts';
import { BidsTable } from '../features/bids/bids-table.tsx';
import { sayBids } from '../features/bids/say-bids.ts';
import { bidsQuery } from '../features/bids/queries.ts';
import { WaitingList } from '../features/bids/waiting-list.tsx';
import { useWaiting } from '../features/bids/waiting.ts';
import { mine } from '../lib/kept.ts';
import { keepSession, useSession } from '../lib/session.ts';
import { AnswerHeader } from '../ui/answer-header.tsx';
import { LinkButton } from '../ui/button.tsx';
import { useFormatter } from '../ui/formatter-context.tsx';
import { Pager } from '../ui/pager.tsx';
import { Segmented } from '../ui/segmented.tsx';
import { EmptyState, ErrorState, LoadingState } from '../ui/states.tsx';

const STATES = [
  { value: 'all', label: 'All' },
  { value: 'open', label: 'Open' },
  { value: 'bought', label: 'Bought' },
  { value: 'not bought', label: 'Not bought' },
] as const;

/** Kept pre-bid sheets: what was bid on, bought or not and why, and what they came to. */
export function PreBidsPage() {
  const format = useFormatter();
  const session = useSession();
  const { shop, role } = session;
  const home = mine(session);
  const [search, setSearch] = useSearchParams();
  const state = BID_STATES.find((one) => one === search.get('state')) ?? null;
  const result = useInfiniteQuery(bidsQuery(state));
  const waiting = useWaiting(home);
  useEffect(() => keepSession(session), [session]);
  const mayWrite = role === 'owner' || role === 'bookkeeper';
  const rows = result.data?.pages.flatMap((page) => page.rows) ?? [];
  const isComplete = result.data !== undefined && !result.hasNextPage;
  const onState = (value: BidState | 'all') => setSearch(value === 'all' ? {} : { state: value }, { replace: true });
  const isEmpty = isComplete && rows.length === 0 && state === null;
  return (
    <>
      <AnswerHeader
        question="Which ones did I weigh, and what became of them?"
        title="Kept sheets"
        filters={
          !isEmpty && <Segmented label="Which sheets" options={STATES} value={state ?? 'all'} onChange={onState} />
        }
        answer={sayBids({ rows, state, total: result.data?.pages[0]?.total ?? null, isComplete }, format)}
        caution="A sheet that was not bought is worth keeping too: the lots that you let go show how your bids stand."
      >
        {mayWrite && !isEmpty && (
          <div className="mt-2">
            <LinkButton kind="main" to={`/s/${shop.id}/pre-bid`} className="touch">
              New sheet
            </LinkButton>
          </div>
        )}
      </AnswerHeader>
      <WaitingList home={home} shopId={shop.id} waiting={waiting} />
      {result.error && !result.data && <ErrorState error={result.error} onRetry={() => void result.refetch()} />}
      {!result.error && !result.data && <LoadingState label="Opening the kept sheets" />}
      {isEmpty && (
        <EmptyState
          title="Every sheet that you keep will stand here"
          action={
            mayWrite && (
              <LinkButton kind="main" to={`/s/${shop.id}/pre-bid`}>
                Begin a sheet
              </LinkButton>
            )
          }
        >
          With each the bid to walk away above, whether you bought it or not and why, and the rebuild that it became.
        </EmptyState>
      )}
      {result.data && rows.length === 0 && state !== null && <p className="panel text-soft">No sheet is {state}.</p>}
      {rows.length > 0 && (
        <section className="panel">
          <BidsTable rows={rows} shopId={shop.id} />
          <Pager
            hasMore={result.hasNextPage}
            onMore={() => void result.fetchNextPage()}
            busy={result.isFetchingNextPage}
            shown={rows.length}
            noun="sheets"
          />
        </section>
      )}
    </>
  );
}
