import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { type BoardRow, hoursQuerySchema } from '#shared/contracts/hours.ts';
import { HoursAnswer } from '../features/hours/hours-answer.tsx';
import { HoursDesk } from '../features/hours/hours-desk.tsx';
import { HoursFilters } from '../features/hours/hours-filters.tsx';
import { OwnHoursView } from '../features/hours/own-hours.tsx';
import { NoteReceipt } from '../features/ledger/note-receipt.tsx';
import { useAddressFilters } from '../lib/address-filters.ts';
import { listsQuery, optionsOf } from '../lib/lists.ts';
import { rebuildNamesQuery, rebuildOptions } from '../lib/rebuild-names.ts';
import { useSession } from '../lib/session.ts';
import { Button, LinkButton } from '../ui/button.tsx';
import { usePageKeys } from '../ui/page-keys.ts';
import { usePageTitle } from '../ui/page-title.ts';
import { EmptyState } from '../ui/states.tsx';

const KEYS = [
  { keys: 'Tab', does: 'To the next field of the line' },
  { keys: 'Enter', does: 'Save the line; day, rebuild and person stay' },
];

/** Hours: a mechanic's own on the phone, everybody's at the desk. */
export function HoursPage() {
  const { role } = useSession();
  const [search] = useSearchParams();
  return role === 'mechanic' || search.get('view') === 'mine' ? <OwnHoursPage /> : <HoursDeskPage />;
}

function OwnHoursPage() {
  const { shop, role } = useSession();
  const [search] = useSearchParams();
  const { data: lists } = useSuspenseQuery(listsQuery());
  const [noted, setNoted] = useState<BoardRow | null>(null);
  usePageTitle('Hours');
  const own = role === 'mechanic' ? '' : 'view=mine';
  const here = `/s/${shop.id}/hours?${own}`;
  return (
    <>
      <h1 className="sr-only">Hours</h1>
      <OwnHoursView
        rebuildId={search.get('rebuild')}
        today={shop.today}
        back={here}
        to={(rebuildId) => `${here}&rebuild=${rebuildId}`}
        beside={(row) => (
          <Button size="large" onClick={() => setNoted(row)}>
            Note a surprise or a receipt
          </Button>
        )}
      />
      {noted && (
        <NoteReceipt
          rebuildId={noted.id}
          subject={noted.tag}
          categories={optionsOf(lists.categories)}
          onClose={() => setNoted(null)}
        />
      )}
    </>
  );
}

function HoursDeskPage() {
  const { shop, role } = useSession();
  const { data: lists } = useSuspenseQuery(listsQuery());
  const { data: names } = useSuspenseQuery(rebuildNamesQuery());
  const { filters, set, isFiltered } = useAddressFilters(hoursQuerySchema);
  usePageKeys(KEYS);
  const canWrite = role === 'owner' || role === 'bookkeeper';
  const rebuilds = rebuildOptions(names);
  const workers = optionsOf(lists.workers, filters.worker ?? null);
  const clear = () => set(Object.fromEntries(Object.keys(filters).map((name) => [name, null])));
  return (
    <>
      <HoursAnswer
        filters={filters}
        isFiltered={isFiltered}
        actions={
          canWrite && (
            <LinkButton size="small" to="?view=mine">
              Log my own, on the phone
            </LinkButton>
          )
        }
      />
      <section className="panel">
        <HoursDesk
          filters={filters}
          shopId={shop.id}
          today={shop.today}
          canWrite={canWrite}
          rebuilds={rebuilds}
          workers={workers}
          filterBar={<HoursFilters filters={filters} set={set} rebuilds={rebuilds} workers={workers} />}
          empty={
            isFiltered ? (
              <EmptyState title="Nothing matches" action={<Button onClick={clear}>Show everything</Button>}>
                No hours fit all that is chosen above.
              </EmptyState>
            ) : (
              <EmptyState title="Every hour on a rebuild will stand here">
                Type the first line above. Hours are what “per hour” is worked out from.
              </EmptyState>
            )
          }
        />
      </section>
    </>
  );
}
