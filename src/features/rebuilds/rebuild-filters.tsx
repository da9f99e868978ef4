import { useCallback } from 'react';
import { STAGES } from '#shared/vocabulary.ts';
import { FilterBar } from '../../ui/filter-bar.tsx';
import { FindField } from '../../ui/find-field.tsx';
import { type Option, SelectField } from '../../ui/text-field.tsx';
import type { RebuildFilters } from './queries.ts';

type Props = {
  filters: RebuildFilters;
  set: (change: Readonly<Record<string, string | null>>) => void;
  classes: readonly Option[];
  damages: readonly Option[];
  /** The shop's current year: the filter offers it and those before. */
  thisYear: number;
};

const STAGE_OPTIONS = STAGES.map((stage) => ({ value: stage, label: stage.charAt(0).toUpperCase() + stage.slice(1) }));
const SEEN = [
  { value: 'yes', label: 'Seen' },
  { value: 'no', label: 'Not seen' },
  { value: 'unknown', label: 'Not said' },
];
/** Sort and direction in one choice. */
const ORDERS = [
  { value: 'bought-down', label: 'Last bought first' },
  { value: 'left-down', label: 'Last gone first' },
  { value: 'kept-down', label: 'Most kept first' },
  { value: 'kept-up', label: 'Least kept first' },
  { value: 'overrun-down', label: 'Most over plan first' },
  { value: 'hours-down', label: 'Most hours first' },
  { value: 'tag-up', label: 'By tag' },
];
const YEARS_BACK = 12;

/** Which rebuilds are shown, and in which order; all of it stands in the address. */
export function RebuildFilterBar({ filters, set, classes, damages, thisYear }: Props) {
  const count = Object.keys(filters).filter((name) => name !== 'sort' && name !== 'order').length;
  const onFind = useCallback((find: string) => set({ find }), [set]);
  const years = Array.from({ length: YEARS_BACK }, (_, back) => String(thisYear - back));
  const { sort = 'bought', order = sort === 'tag' ? 'up' : 'down' } = filters;
  const onOrder = (value: string) => {
    const [by = '', direction = ''] = value.split('-');
    set({ sort: by, order: direction });
  };
  return (
    <FilterBar label="Show which rebuilds" count={count}>
      <FindField label="Find" value={filters.find ?? ''} onFind={onFind} placeholder="Tag, make, model, VIN" />
      <SelectField
        label="Stage"
        none="All"
        value={filters.stage ?? ''}
        onChange={(event) => set({ stage: event.target.value })}
        options={STAGE_OPTIONS}
      />
      <SelectField
        label="Class"
        none="All"
        value={filters.class ?? ''}
        onChange={(event) => set({ class: event.target.value })}
        options={classes}
      />
      <SelectField
        label="Damage"
        none="All"
        value={filters.damage ?? ''}
        onChange={(event) => set({ damage: event.target.value })}
        options={damages}
      />
      <SelectField
        label="Before buying"
        none="All"
        value={filters.seen ?? ''}
        onChange={(event) => set({ seen: event.target.value })}
        options={SEEN}
      />
      <SelectField
        label="Left in"
        none="Any year"
        value={filters.year === undefined ? '' : String(filters.year)}
        onChange={(event) => set({ year: event.target.value })}
        options={years.map((year) => ({ value: year, label: year }))}
      />
      <SelectField
        label="Order"
        value={`${sort}-${order}`}
        onChange={(event) => onOrder(event.target.value)}
        options={ORDERS}
      />
    </FilterBar>
  );
}
