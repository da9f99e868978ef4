import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { Percent } from '../../../ui/figures.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RangeText } from '../range-text.tsx';

type Row = OverrunsAnswer['seen'][number];

const words = (row: Row) => (row.seen === null ? 'Not said' : row.seen ? 'Seen before buying' : 'Bought unseen');

/** Does a look before buying go with fewer overruns and surprises? */
export function SeenTable({ seen }: { seen: OverrunsAnswer['seen'] }) {
  const rows = seen.filter((row) => row.n > 0);
  if (rows.length === 0) return null;
  return (
    <Panel
      title="Seen against unseen"
      subtitle="Goes with, not proves: cars that were looked at may differ in other ways too. Filter by damage to compare like with like."
    >
      <Table caption="Seen against unseen" rows={rows} columns={COLUMNS} rowKey={words} />
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  { id: 'seen', header: 'Bought', heads: true, cell: words },
  { id: 'n', header: 'Rebuilds', under: 'tablet', number: true, cell: (row) => row.n },
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
    id: 'surprised',
    header: 'Had a surprise',
    number: true,
    cell: (row) =>
      row.surprises.n > 0 && (
        <>
          <Percent rate={row.surprises.rate} />
          <span className="block text-label text-soft">
            {row.surprises.x} of {row.surprises.n}
          </span>
          <span className="block text-label text-soft">
            <RangeText low={row.surprises.lower} high={row.surprises.upper} />
          </span>
        </>
      ),
  },
];
