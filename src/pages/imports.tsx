import { useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { DropZone } from '../features/imports/drop-zone.tsx';
import { ImportsTable } from '../features/imports/imports-table.tsx';
import { importsQuery } from '../features/imports/queries.ts';
import { useSession } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';
import { Pager } from '../ui/pager.tsx';
import { EmptyState } from '../ui/states.tsx';

/** Files brought in, and the place to bring another. */
export function ImportsPage() {
  const { shop, role } = useSession();
  const navigate = useNavigate();
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useSuspenseInfiniteQuery(importsQuery());
  const rows = data.pages.flatMap((page) => page.rows);
  const to = (importId: string) => `/s/${shop.id}/import/${importId}`;
  const canWrite = role === 'owner' || role === 'bookkeeper';
  return (
    <>
      <PageHeader
        title="Import"
        note="Bring in the years that lie in old spreadsheets, and see that nothing is lost and nothing counted twice."
      />
      {canWrite && <DropZone onUploaded={(importId) => void navigate(to(importId))} />}
      {rows.length === 0 ? (
        <EmptyState title="Every file that was brought in will stand here">
          With each come its own totals beside what was booked, the rows that were put aside, and a way to take it out
          again.
        </EmptyState>
      ) : (
        <section className="panel">
          <ImportsTable rows={rows} to={to} />
          <Pager
            hasMore={hasNextPage}
            onMore={() => void fetchNextPage()}
            busy={isFetchingNextPage}
            shown={rows.length}
            noun="files"
          />
        </section>
      )}
    </>
  );
}
