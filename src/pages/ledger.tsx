import { useSuspenseQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { ledgerQuerySchema } from '#shared/contracts/ledger.ts';
import { LedgerAnswer } from '../features/ledger/ledger-answer.tsx';
import { LedgerDesk } from '../features/ledger/ledger-desk.tsx';
import { LedgerFilters } from '../features/ledger/ledger-filters.tsx';
import { OpenedEntry } from '../features/ledger/opened-entry.tsx';
import { useAddressFilters } from '../lib/address-filters.ts';
import { listsQuery, optionsOf } from '../lib/lists.ts';
import { rebuildNamesQuery, rebuildOptions } from '../lib/rebuild-names.ts';
import { useSession } from '../lib/session.ts';
import { Button, LinkButton } from '../ui/button.tsx';
import { usePageKeys } from '../ui/page-keys.ts';
import { EmptyState } from '../ui/states.tsx';

const KEYS = [
  { keys: 'Tab', does: 'To the next field of the line' },
  { keys: 'Enter', does: 'Save the line; day, rebuild and category stay' },
];

/** What was spent, on what: the fast line, filters, and every entry behind the sums. */
export function LedgerPage() {
  const { shop, role } = useSession();
  const { data: lists } = useSuspenseQuery(listsQuery());
  const { data: names } = useSuspenseQuery(rebuildNamesQuery());
  const { filters, set, isFiltered } = useAddressFilters(ledgerQuerySchema);
  const entryId = useSearchParams()[0].get('entry');
  usePageKeys(KEYS);
  const rebuilds = rebuildOptions(names);
  const categories = optionsOf(lists.categories, filters.category ?? null);
  const clear = () => set(Object.fromEntries(Object.keys(filters).map((name) => [name, null])));
  const canWrite = role === 'owner' || role === 'bookkeeper';
  return (
    <>
      <LedgerAnswer filters={filters} isFiltered={isFiltered} />
      <section className="panel">
        <LedgerDesk
          filters={filters}
          shopId={shop.id}
          today={shop.today}
          canWrite={canWrite}
          rebuilds={rebuilds}
          categories={categories}
          filterBar={<LedgerFilters filters={filters} set={set} rebuilds={rebuilds} categories={categories} />}
          empty={
            isFiltered ? (
              <EmptyState title="Nothing matches" action={<Button onClick={clear}>Show everything</Button>}>
                No entry fits all that is chosen above.
              </EmptyState>
            ) : (
              <EmptyState
                title="Every cost and credit will stand here"
                action={<LinkButton to={`/s/${shop.id}/import`}>Import a spreadsheet</LinkButton>}
              >
                Type the first line above, or bring in what you have kept so far.
              </EmptyState>
            )
          }
        />
      </section>
      {entryId && canWrite && (
        <OpenedEntry {...{ entryId, rebuilds, categories }} onClose={() => set({ entry: null })} />
      )}
    </>
  );
}
