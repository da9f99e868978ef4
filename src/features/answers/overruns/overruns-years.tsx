import { Link } from 'react-router-dom';
import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { Money, Percent } from '../../../ui/figures.tsx';
import { FoldedPanel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RangeText } from '../range-text.tsx';

type Row = OverrunsAnswer['years'][number];

/** Does the estimate get better? By the year in which the rebuilds left. */
export function OverrunsYears({ years }: { years: OverrunsAnswer['years'] }) {
  const rows = years.filter((row) => row.n > 0);
  if (rows.length < 2) return null;
  return (
    <FoldedPanel
      title="Year by year"
      subtitle="Is it getting better? Where the spreads of two years overlap, the step between them may be chance. A year opens with its own categories."
    >
      <Table caption="Overrun by year" rows={rows} columns={COLUMNS} rowKey={(row) => `${row.year}`} />
    </FoldedPanel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'year',
    header: 'Left in',
    heads: true,
    cell: (row) => <Link to={`?from=${row.year}&to=${row.year}`}>{row.year}</Link>,
  },
  { id: 'n', header: 'Rebuilds', under: 'phone', number: true, cell: (row) => row.n },
  {
    id: 'plan',
    header: 'Planned',
    under: 'phone',
    number: true,
    cell: (row) => <Money cents={row.estimateCents} />,
  },
  {
    id: 'actual',
    header: 'Actual',
    under: 'phone',
    number: true,
    cell: (row) => <Money cents={row.actualCents} />,
  },
  {
    id: 'pooled',
    header: 'All together',
    number: true,
    cell: (row) => (
      <>
        <Percent rate={row.pooled} signed tone="cost" />
        {row.isThin && <span className="block text-label text-soft">too few yet</span>}
      </>
    ),
  },
  {
    id: 'median',
    header: 'Typical',
    under: 'phone',
    number: true,
    cell: (row) => <Percent rate={row.median} signed />,
  },
  {
    id: 'spread',
    header: '8 in 10 between',
    number: true,
    cell: (row) => !row.isThin && <RangeText low={row.q10} high={row.q90} signed />,
  },
];
