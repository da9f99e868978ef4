import { useCallback } from 'react';
import type { HoursQuery } from '#shared/contracts/hours.ts';
import { FilterBar } from '../../ui/filter-bar.tsx';
import { FindField } from '../../ui/find-field.tsx';
import { PickField, type PickOption } from '../../ui/pick-field.tsx';
import { DayField, type Option, SelectField } from '../../ui/text-field.tsx';

type Props = {
  filters: HoursQuery;
  set: (change: Readonly<Record<string, string | null>>) => void;
  rebuilds: readonly PickOption[];
  workers: readonly Option[];
};

const PAID = [
  { value: 'no', label: 'Own, unpaid' },
  { value: 'yes', label: 'Paid' },
];
const VOIDS = [
  { value: 'show', label: 'Shown' },
  { value: 'only', label: 'Only void' },
];

/** Which hours are shown; all of it stands in the address. */
export function HoursFilters({ filters, set, rebuilds, workers }: Props) {
  const count = Object.keys(filters).filter((name) => name !== 'sort' && name !== 'order').length;
  const onFind = useCallback((find: string) => set({ find }), [set]);
  const people = [...workers, { value: 'none', label: 'Not said' }];
  return (
    <FilterBar label="Show which hours" count={count}>
      <FindField label="Find" value={filters.find ?? ''} onFind={onFind} placeholder="Doing what" />
      <PickField
        label="Rebuild"
        value={filters.rebuild ?? null}
        onChange={(rebuild) => set({ rebuild })}
        options={rebuilds}
        placeholder="All"
      />
      <SelectField
        label="Who"
        none="All"
        value={filters.worker ?? ''}
        onChange={(event) => set({ worker: event.target.value })}
        options={people}
      />
      <SelectField
        label="Paid"
        none="All"
        value={filters.paid ?? ''}
        onChange={(event) => set({ paid: event.target.value })}
        options={PAID}
      />
      <DayField label="From" value={filters.from ?? ''} onChange={(event) => set({ from: event.target.value })} />
      <DayField label="To" value={filters.to ?? ''} onChange={(event) => set({ to: event.target.value })} />
      <SelectField
        label="Void"
        none="Hidden"
        value={filters.void ?? ''}
        onChange={(event) => set({ void: event.target.value })}
        options={VOIDS}
      />
    </FilterBar>
  );
}
