import { useMemo } from 'react';
import type { Reading, RebuildFound } from '#shared/contracts/import-reading.ts';
import { DataTable } from '../../ui/data-table.tsx';
import { Money } from '../../ui/figures.tsx';
import { Panel } from '../../ui/panel.tsx';
import type { Column } from '../../ui/table.tsx';

const COLUMNS: Column<RebuildFound>[] = [
  {
    id: 'tag',
    header: 'Rebuild',
    heads: true,
    width: 'w-40',
    sortBy: (found) => found.tag,
    cell: (found) => found.tag,
  },
  {
    id: 'name',
    header: 'Vehicle',
    width: 'w-56 min-w-40',
    cell: (found) => [found.year, found.make, found.model].filter(Boolean).join(' '),
  },
  {
    id: 'spellings',
    header: 'In the file as',
    width: 'w-96 min-w-72',
    cell: (found) => <span className="text-soft">{found.spellings.join(' · ')}</span>,
  },
  {
    id: 'is',
    header: 'In your books',
    width: 'w-40',
    cell: (found) => (found.existingId ? 'joins this rebuild' : 'new'),
  },
  {
    id: 'paid',
    header: 'Bought for',
    number: true,
    width: 'w-36',
    sortBy: (found) => found.purchaseCents,
    cell: (found) => <Money cents={found.purchaseCents} shown="always" />,
  },
  {
    id: 'sold',
    header: 'Sold for',
    number: true,
    width: 'w-36',
    sortBy: (found) => found.saleCents,
    cell: (found) => <Money cents={found.saleCents} shown="always" />,
  },
];

/** The rebuilds that the file is about, each with every way that it is written there. */
export function RebuildsFound({ reading }: { reading: Reading }) {
  const rows = useMemo(() => reading.rebuilds, [reading]);
  if (rows.length === 0) return null;
  return (
    <Panel title={`Rebuilds in this file: ${rows.length}`} subtitle="Spellings that mean the same vehicle are one.">
      <DataTable caption="Rebuilds in this file" rows={rows} columns={COLUMNS} rowKey={(found) => found.tag} />
    </Panel>
  );
}
