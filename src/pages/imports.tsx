import { useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { DropZone } from '../features/imports/bring/drop-zone.tsx';
import { ImportsTable } from '../features/imports/bring/imports-table.tsx';
import { importsQuery, isUnderWay } from '../features/imports/queries.ts';
import { useSession } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';
import { usePageKeys } from '../ui/page-keys.ts';
import { Pager } from '../ui/pager.tsx';
import { Panel } from '../ui/panel.tsx';
import { EmptyState } from '../ui/states.tsx';

const KEYS = [{ keys: 'Ctrl V', does: 'Bring in cells that were copied from a spreadsheet' }];

/** The place to bring files in, those that wait for a look, and those that were brought in before. */
export function ImportsPage() {
  const { shop, role } = useSession();
  const navigate = useNavigate();
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useSuspenseInfiniteQuery(importsQuery());
  usePageKeys(KEYS);
  const rows = data.pages.flatMap((page) => page.rows);
  const waiting = rows.filter(({ state }) => isUnderWay(state) || state === 'ready');
  const others = rows.filter((row) => !waiting.includes(row));
  const to = (importId: string) => `/s/${shop.id}/import/${importId}`;
  const canWrite = role === 'owner' || role === 'bookkeeper';
  return (
    <>
      <PageHeader
        title="Import"
        note="Bring in the years that lie in old spreadsheets, and see that nothing is lost and nothing counted twice."
      />
      {canWrite && <DropZone onUploaded={(importId) => void navigate(to(importId))} />}
      {waiting.length > 0 && (
        <Panel title="Not booked yet" subtitle="Open a file to go on where you left it." className="mb-6">
          <ImportsTable caption="Files that are not booked yet" rows={waiting} to={to} />
        </Panel>
      )}
      {rows.length === 0 && (
        <EmptyState title="Every file that was brought in will stand here">
          With each come its own totals beside what was booked, the rows that were put aside, and a way to take it out
          again.
        </EmptyState>
      )}
      {others.length > 0 && (
        <section className="panel">
          <ImportsTable caption="Files brought in" rows={others} to={to} />
        </section>
      )}
      <Pager
        hasMore={hasNextPage}
        onMore={() => void fetchNextPage()}
        busy={isFetchingNextPage}
        shown={rows.length}
        noun="files"
      />
    </>
  );
}
