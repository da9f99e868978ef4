import { useCallback } from 'react';
import { ENTRY_KINDS, type LedgerQuery } from '#shared/contracts/ledger.ts';
import { FilterBar } from '../../ui/filter-bar.tsx';
import { FindField } from '../../ui/find-field.tsx';
import { PickField, type PickOption } from '../../ui/pick-field.tsx';
import { DayField, SelectField } from '../../ui/text-field.tsx';

type Props = {
  filters: LedgerQuery;
  set: (change: Readonly<Record<string, string | null>>) => void;
  rebuilds: readonly PickOption[];
  categories: readonly PickOption[];
};

const KINDS = ENTRY_KINDS.map((kind) => ({ value: kind, label: kind.charAt(0).toUpperCase() + kind.slice(1) }));
const VOIDS = [
  { value: 'show', label: 'Shown' },
  { value: 'only', label: 'Only void' },
];
const DATED = [
  { value: 'no', label: 'Without a day' },
  { value: 'yes', label: 'With a day' },
];

/** What of the ledger is shown; all of it stands in the address. */
export function LedgerFilters({ filters, set, rebuilds, categories }: Props) {
  const count = Object.keys(filters).filter((name) => name !== 'sort' && name !== 'order').length;
  const onFind = useCallback((find: string) => set({ find }), [set]);
  return (
    <FilterBar label="Show which entries" count={count}>
      <FindField label="Find" value={filters.find ?? ''} onFind={onFind} placeholder="What or vendor" />
      <PickField
        label="Rebuild"
        value={filters.rebuild ?? null}
        onChange={(rebuild) => set({ rebuild })}
        options={[{ value: 'none', label: 'Overhead (no rebuild)' }, ...rebuilds]}
        placeholder="All"
      />
      <SelectField
        label="Category"
        none="All"
        value={filters.category ?? ''}
        onChange={(event) => set({ category: event.target.value })}
        options={categories}
      />
      <SelectField
        label="Kind"
        none="All"
        value={filters.kind ?? ''}
        onChange={(event) => set({ kind: event.target.value })}
        options={KINDS}
      />
      <DayField label="From" value={filters.from ?? ''} onChange={(event) => set({ from: event.target.value })} />
      <DayField label="To" value={filters.to ?? ''} onChange={(event) => set({ to: event.target.value })} />
      <SelectField
        label="Days"
        none="All"
        value={filters.dated ?? ''}
        onChange={(event) => set({ dated: event.target.value })}
        options={DATED}
      />
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
