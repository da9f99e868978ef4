import { useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Outcome } from '#shared/contracts/import-words.ts';
import type { ImportRow } from '#shared/contracts/imports.ts';
import { Panel } from '../../ui/panel.tsx';
import { Pager } from '../../ui/pager.tsx';
import { Segmented } from '../../ui/segmented.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { rowsQuery } from './queries.ts';
import { reasonWords } from './words.ts';

const FILTERS = [
  { value: 'all', label: 'All' },
  { value: 'taken', label: 'In' },
  { value: 'put aside', label: 'Put aside' },
  { value: 'not data', label: 'No data' },
] as const;

const COLUMNS: Column<ImportRow>[] = [
  {
    id: 'row',
    header: 'Row',
    heads: true,
    cell: (row) => (row.sheet === 1 ? row.row : `sheet ${row.sheet}, ${row.row}`),
  },
  {
    id: 'cells',
    header: 'As it stood in the file',
    cell: (row) =>
      row.cells
        .filter((cell) => cell.trim())
        .join(' · ')
        .slice(0, 300),
  },
  {
    id: 'outcome',
    header: 'How it ended',
    cell: (row) => (row.outcome === 'taken' ? 'in' : `${row.outcome}: ${reasonWords(row.reason)}`),
  },
];

/** Every row of a booked file as it stood, kept for ever. */
export function KeptRows({ importId }: { importId: string }) {
  const [filter, setFilter] = useState<Outcome | 'all'>('all');
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useSuspenseInfiniteQuery(
    rowsQuery(importId, filter === 'all' ? null : filter),
  );
  const rows = data.pages.flatMap((page) => page.rows);
  return (
    <Panel
      title="Every row of the file"
      actions={<Segmented label="Rows" options={FILTERS} value={filter} onChange={setFilter} />}
    >
      {rows.length === 0 ? (
        <p className="text-soft">No row ended so.</p>
      ) : (
        <Table caption="Rows of the file" rows={rows} columns={COLUMNS} rowKey={(row) => `${row.sheet}-${row.row}`} />
      )}
      <Pager
        hasMore={hasNextPage}
        onMore={() => void fetchNextPage()}
        busy={isFetchingNextPage}
        shown={rows.length}
        noun="rows"
      />
    </Panel>
  );
}
