import { useInfiniteQuery } from '@tanstack/react-query';
import { type ReactNode, useMemo, useState } from 'react';
import type { EntryRow, LedgerQuery } from '#shared/contracts/ledger.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { useOutbox } from '../../lib/outbox.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Menu } from '../../ui/menu.tsx';
import { Pager } from '../../ui/pager.tsx';
import type { PickOption } from '../../ui/pick-field.tsx';
import { ErrorState, LoadingState } from '../../ui/states.tsx';
import { UnsentList } from '../../ui/unsent-list.tsx';
import { ChangeEntry } from './change-entry.tsx';
import { EntriesTable } from './entries-table.tsx';
import { EntryDialog } from './entry-dialog.tsx';
import { EMPTY_ENTRY, type EntryForm, entryFormSchema } from './entry-form.ts';
import { EntryRowForm } from './entry-row-form.tsx';
import { useLedgerWrites } from './mutations.ts';
import { entriesQuery } from './queries.ts';
import { SplitDialog } from './split-dialog.tsx';
import { VoidEntry } from './void-entry.tsx';

export type LedgerDeskProps = {
  filters: LedgerQuery;
  shopId: string;
  today: string;
  /** Set on the page of one rebuild: new lines are its own. */
  rebuildId?: string;
  canWrite: boolean;
  rebuilds: readonly PickOption[];
  categories: readonly PickOption[];
  /** Stands between the fast line and the list. */
  filterBar?: ReactNode;
  /** What stands here when nothing matches. */
  empty: ReactNode;
};

type Open =
  | { kind: 'change' | 'void'; entry: EntryRow }
  | { kind: 'split' }
  | { kind: 'free' }
  | { kind: 'again'; typed: EntryForm };

/** The fast line, what is not saved yet, and the lines that match, a hundred at a time. */
export function LedgerDesk(props: LedgerDeskProps) {
  const { filters, shopId, today, rebuildId, canWrite, rebuilds, categories, filterBar, empty } = props;
  const { decimal } = useFormatter();
  const entries = useInfiniteQuery(entriesQuery(filters));
  const { add } = useLedgerWrites();
  const [open, setOpen] = useState<Open | null>(null);
  const close = () => setOpen(null);
  const outbox = useOutbox<EntryForm>(async (typed, key) => {
    await add(entryFormSchema(decimal).parse(typed), key);
  });
  const rows = useMemo(() => entries.data?.pages.flatMap((page) => page.rows) ?? [], [entries.data]);
  const vendors = useMemo(() => [...new Set(rows.flatMap((row) => row.vendor ?? []))].sort(), [rows]);
  const onChange = useMemo(
    () => (canWrite ? (entry: EntryRow) => setOpen({ kind: 'change', entry }) : null),
    [canWrite],
  );
  const [onVoid] = useState(() => (entry: EntryRow) => setOpen({ kind: 'void', entry }));
  const start = { ...EMPTY_ENTRY, datedOn: today, rebuildId: rebuildId ?? '' };

  return (
    <>
      {canWrite && (
        <div className="entry-desk no-print">
          <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
            <h2 className="text-lead font-[660]">Add an entry</h2>
            <Menu
              label="Another kind of entry"
              items={[
                { label: 'Split a bill over rebuilds', onSelect: () => setOpen({ kind: 'split' }) },
                { label: 'Something that came free', onSelect: () => setOpen({ kind: 'free' }) },
              ]}
            />
          </div>
          <EntryRowForm
            start={start}
            rebuilds={rebuildId ? null : rebuilds}
            categories={categories}
            vendors={vendors}
            onSend={outbox.send}
          />
        </div>
      )}
      <UnsentList
        unsent={outbox.unsent}
        words={(typed) => [typed.datedOn, typed.cents, typed.what, typed.vendor].filter(Boolean).join(' · ')}
        onRetry={outbox.retry}
        onDrop={outbox.drop}
        onEdit={(key, typed) => {
          outbox.drop(key);
          setOpen({ kind: 'again', typed });
        }}
      />
      {(rows.length > 0 || Object.keys(filters).length > 0) && filterBar}
      {entries.isPending && <LoadingState label="Loading entries" />}
      {entries.isError && <ErrorState error={entries.error} onRetry={() => void entries.refetch()} />}
      {entries.isSuccess && rows.length === 0 && empty}
      {rows.length > 0 && (
        <EntriesTable rows={rows} shopId={shopId} ofOne={rebuildId !== undefined} onChange={onChange} onVoid={onVoid} />
      )}
      <Pager
        hasMore={entries.hasNextPage}
        busy={entries.isFetchingNextPage}
        shown={rows.length}
        onMore={() => void entries.fetchNextPage()}
      />
      {open?.kind === 'change' && (
        <ChangeEntry entry={open.entry} rebuilds={rebuilds} categories={categories} onClose={close} />
      )}
      {open?.kind === 'void' && <VoidEntry entry={open.entry} onClose={close} />}
      {open?.kind === 'split' && (
        <SplitDialog today={today} rebuilds={rebuilds} categories={categories} onClose={close} />
      )}
      {(open?.kind === 'free' || open?.kind === 'again') && (
        <NewEntry
          title={open.kind === 'free' ? 'Something that came free' : 'Add this entry'}
          start={open.kind === 'free' ? { ...start, cents: '0' } : open.typed}
          isFree={open.kind === 'free'}
          {...{ rebuilds, categories, add }}
          onClose={close}
        />
      )}
    </>
  );
}

function NewEntry({
  title,
  start,
  isFree,
  rebuilds,
  categories,
  add,
  onClose,
}: Pick<LedgerDeskProps, 'rebuilds' | 'categories'> & {
  title: string;
  start: EntryForm;
  isFree: boolean;
  add: ReturnType<typeof useLedgerWrites>['add'];
  onClose: () => void;
}) {
  const [key] = useState(newIdempotencyKey);
  return (
    <EntryDialog
      title={title}
      start={start}
      isFree={isFree}
      rebuilds={rebuilds}
      categories={categories}
      onClose={onClose}
      onSave={async (body) => {
        await add(body, key);
        onClose();
      }}
    />
  );
}
