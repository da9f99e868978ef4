import { useInfiniteQuery, useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { rebuildsQuerySchema } from '#shared/contracts/rebuilds.ts';
import { Board } from '../features/hours/board.tsx';
import { AddRebuild } from '../features/rebuilds/add-rebuild.tsx';
import { rebuildsQuery } from '../features/rebuilds/queries.ts';
import { RebuildFilterBar } from '../features/rebuilds/rebuild-filters.tsx';
import { RebuildsAnswer } from '../features/rebuilds/rebuilds-answer.tsx';
import { RebuildsTable } from '../features/rebuilds/rebuilds-table.tsx';
import { useAddressFilters } from '../lib/address-filters.ts';
import { listsQuery, optionsOf } from '../lib/lists.ts';
import { useSession } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';
import { Button, LinkButton } from '../ui/button.tsx';
import { Pager } from '../ui/pager.tsx';
import { EmptyState, ErrorState, LoadingState } from '../ui/states.tsx';

/** All rebuilds; for a mechanic, the open ones with their hours. */
export function RebuildsPage() {
  const { role, shop } = useSession();
  if (role === 'partner') {
    return (
      <>
        <PageHeader title="Rebuilds" />
        <EmptyState title="Your rebuilds will stand here">
          The ones you put money in, with your statement. The shop has not shared any with you yet.
        </EmptyState>
      </>
    );
  }
  if (role === 'mechanic') {
    return (
      <>
        <PageHeader title="Open rebuilds" note="Press one to log hours on it." />
        <Board to={(rebuildId) => `/s/${shop.id}/hours?rebuild=${rebuildId}`} />
      </>
    );
  }
  return <RebuildList />;
}

function RebuildList() {
  const { role, shop } = useSession();
  const navigate = useNavigate();
  const { data: lists } = useSuspenseQuery(listsQuery());
  const { filters, set, isFiltered } = useAddressFilters(rebuildsQuerySchema);
  const rebuilds = useInfiniteQuery(rebuildsQuery(filters));
  const [isAdding, setAdding] = useState(false);
  const rows = rebuilds.data?.pages.flatMap((page) => page.rows) ?? [];
  const classes = optionsOf(lists.classes, filters.class ?? null);
  const damages = optionsOf(lists.damages, filters.damage ?? null);
  const canWrite = role === 'owner' || role === 'bookkeeper';
  const clear = () => set(Object.fromEntries(Object.keys(filters).map((name) => [name, null])));
  const addButton = canWrite && (
    <Button kind="main" onClick={() => setAdding(true)}>
      Add a rebuild
    </Button>
  );
  return (
    <>
      <RebuildsAnswer filters={filters} isFiltered={isFiltered} actions={addButton} />
      {rebuilds.isSuccess && rows.length === 0 && !isFiltered ? (
        <EmptyState
          title="Every vehicle from purchase to sale will stand here"
          action={
            canWrite && (
              <LinkButton kind="main" to={`/s/${shop.id}/import`}>
                Import a spreadsheet
              </LinkButton>
            )
          }
        >
          With what it cost, what it kept, by the hour, and how far it ran over its plan. Bring in what you have kept so
          far, or add the one that stands in the shop now.
        </EmptyState>
      ) : (
        <section className="panel">
          <RebuildFilterBar
            filters={filters}
            set={set}
            classes={classes}
            damages={damages}
            thisYear={Number(shop.today.slice(0, 4))}
          />
          {rebuilds.isPending && <LoadingState label="Loading rebuilds" />}
          {rebuilds.isError && <ErrorState error={rebuilds.error} onRetry={() => void rebuilds.refetch()} />}
          {rebuilds.isSuccess && rows.length === 0 && (
            <EmptyState title="Nothing matches" action={<Button onClick={clear}>Show everything</Button>}>
              No rebuild fits all that is chosen above.
            </EmptyState>
          )}
          {rows.length > 0 && <RebuildsTable rows={rows} shopId={shop.id} />}
          <Pager
            hasMore={rebuilds.hasNextPage}
            busy={rebuilds.isFetchingNextPage}
            shown={rows.length}
            noun="rebuilds"
            onMore={() => void rebuilds.fetchNextPage()}
          />
        </section>
      )}
      {isAdding && (
        <AddRebuild
          classes={classes}
          damages={damages}
          onAdded={(id) => void navigate(`/s/${shop.id}/rebuilds/${id}`)}
          onClose={() => setAdding(false)}
        />
      )}
    </>
  );
}
