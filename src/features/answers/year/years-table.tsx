import { Link } from 'react-router-dom';
import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import { formatDayRange } from '#shared/format-day.ts';
import { Money } from '../../../ui/figures.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';

type Row = YearAnswer['years'][number];

/** Every shop year beside the others; a year opens by its number. */
export function YearsTable({ answer }: { answer: YearAnswer }) {
  const rows = answer.years.toSorted((a, b) => b.year - a.year);
  return (
    <Panel
      className="mb-6"
      title="All years"
      subtitle="A handful of rebuilds a year can show any slope by chance, and car prices move too: look at several years before calling it better or worse."
    >
      <Table
        caption="All years"
        rows={rows}
        columns={COLUMNS}
        rowKey={(row) => `${row.year}`}
        rowProps={(row) => (row.year === answer.year ? { 'data-strong': '' } : {})}
      />
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'year',
    header: 'Year',
    heads: true,
    cell: (row) => (
      <Link to={`?year=${row.year}`} title={formatDayRange(row.from, row.to)}>
        {row.year}
      </Link>
    ),
  },
  { id: 'left', header: 'Left', under: 'phone', number: true, cell: (row) => row.exitCount },
  { id: 'sold', header: 'Sold', under: 'phone', number: true, cell: (row) => row.soldCount },
  {
    id: 'profit',
    header: 'Before overhead',
    number: true,
    cell: (row) => <Money cents={row.profitCents} tone="kept" />,
  },
  {
    id: 'overhead',
    header: 'Overhead',
    under: 'phone',
    number: true,
    cell: (row) => <Money cents={row.overheadCents} />,
  },
  { id: 'kept', header: 'Kept', number: true, cell: (row) => <Money cents={row.keptCents} tone="kept" /> },
  {
    id: 'late',
    header: 'Late bills',
    under: 'phone',
    number: true,
    cell: (row) => (row.lateCount === 0 ? '' : <Money cents={row.lateCents} />),
  },
  {
    id: 'tied',
    header: 'Tied up at its end',
    under: 'phone',
    number: true,
    cell: (row) => <Money cents={row.tiedUp.cents} />,
  },
];
