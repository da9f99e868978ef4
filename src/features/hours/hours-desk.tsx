import { useInfiniteQuery } from '@tanstack/react-query';
import { type ReactNode, useMemo, useState } from 'react';
import type { HoursQuery, HoursRow } from '#shared/contracts/hours.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { useOutbox } from '../../lib/outbox.ts';
import { Pager } from '../../ui/pager.tsx';
import type { PickOption } from '../../ui/pick-field.tsx';
import { ErrorState, LoadingState } from '../../ui/states.tsx';
import type { Option } from '../../ui/text-field.tsx';
import { UnsentList } from '../../ui/unsent-list.tsx';
import { ChangeHours } from './change-hours.tsx';
import { HoursDialog } from './hours-dialog.tsx';
import { EMPTY_HOURS, type HoursForm, hoursFormSchema } from './hours-form.ts';
import { HoursRowForm } from './hours-row-form.tsx';
import { HoursTable } from './hours-table.tsx';
import { useHoursWrites } from './mutations.ts';
import { hoursQuery } from './queries.ts';
import { VoidHours } from './void-hours.tsx';

type Props = {
  filters: HoursQuery;
  shopId: string;
  today: string;
  /** Set on the page of one rebuild: new lines are its own. */
  rebuildId?: string;
  canWrite: boolean;
  rebuilds: readonly PickOption[];
  workers: readonly Option[];
  /** Stands between the fast line and the list. */
  filterBar?: ReactNode;
  empty: ReactNode;
};

type Open = { kind: 'change' | 'void'; hours: HoursRow } | { kind: 'again'; typed: HoursForm };

/** The fast line of hours, what is not saved yet, and the rows that match, a hundred at a time. */
export function HoursDesk({ filters, shopId, today, rebuildId, canWrite, rebuilds, workers, filterBar, empty }: Props) {
  const hours = useInfiniteQuery(hoursQuery(filters));
  const { add } = useHoursWrites();
  const [open, setOpen] = useState<Open | null>(null);
  const close = () => setOpen(null);
  const outbox = useOutbox<HoursForm>(async (typed, key) => {
    await add(hoursFormSchema.parse(typed), key);
  });
  const rows = useMemo(() => hours.data?.pages.flatMap((page) => page.rows) ?? [], [hours.data]);
  const onChange = useMemo(
    () => (canWrite ? (row: HoursRow) => setOpen({ kind: 'change', hours: row }) : null),
    [canWrite],
  );
  const [onVoid] = useState(() => (row: HoursRow) => setOpen({ kind: 'void', hours: row }));
  const start = { ...EMPTY_HOURS, workedOn: today, rebuildId: rebuildId ?? '' };

  return (
    <>
      {canWrite && (
        <div className="entry-desk no-print">
          <h2 className="mb-3 text-lead font-[660]">Add hours</h2>
          <HoursRowForm start={start} rebuilds={rebuildId ? null : rebuilds} workers={workers} onSend={outbox.send} />
        </div>
      )}
      <UnsentList
        unsent={outbox.unsent}
        words={(typed) => [typed.workedOn, `${typed.seconds} h`, typed.task].filter(Boolean).join(' · ')}
        onRetry={outbox.retry}
        onDrop={outbox.drop}
        onEdit={(key, typed) => {
          outbox.drop(key);
          setOpen({ kind: 'again', typed });
        }}
      />
      {(rows.length > 0 || Object.keys(filters).length > 0) && filterBar}
      {hours.isPending && <LoadingState label="Loading hours" />}
      {hours.isError && <ErrorState error={hours.error} onRetry={() => void hours.refetch()} />}
      {hours.isSuccess && rows.length === 0 && empty}
      {rows.length > 0 && (
        <HoursTable rows={rows} shopId={shopId} ofOne={rebuildId !== undefined} onChange={onChange} onVoid={onVoid} />
      )}
      <Pager
        hasMore={hours.hasNextPage}
        busy={hours.isFetchingNextPage}
        shown={rows.length}
        onMore={() => void hours.fetchNextPage()}
      />
      {open?.kind === 'change' && (
        <ChangeHours hours={open.hours} rebuilds={rebuilds} workers={workers} onClose={close} />
      )}
      {open?.kind === 'void' && <VoidHours hours={open.hours} onClose={close} />}
      {open?.kind === 'again' && (
        <HoursDialog
          title="Add these hours"
          start={open.typed}
          {...{ rebuilds, workers }}
          onSave={async (body) => {
            await add(body, newIdempotencyKey());
            close();
          }}
          onClose={close}
        />
      )}
    </>
  );
}
