import type { TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import { Days } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';

type Row = TimeToSellAnswer['waits'][number];

const WORDS: Record<Row['wait'], { name: string; from: string }> = {
  queue: { name: 'Waiting for work', from: 'picked up to started' },
  build: { name: 'In the shop', from: 'started to roadworthy' },
  paper: { name: 'Waiting for papers', from: 'roadworthy to title issued' },
  held: { name: 'Held, all in all', from: 'bought to left' },
};

/** Where the days go before the market. */
export function WaitsTable({ waits }: { waits: TimeToSellAnswer['waits'] }) {
  const rows = waits.filter((row) => row.n > 0);
  if (rows.length === 0) return null;
  return (
    <Panel
      title="Before it is listed"
      subtitle="Typical days in each stage, and how many rebuilds have both of its days in order."
    >
      <Table caption="Days in each stage" rows={rows} columns={COLUMNS} rowKey={(row) => row.wait} />
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'wait',
    header: 'Stage',
    heads: true,
    cell: (row) => (
      <>
        {WORDS[row.wait].name}
        <span className="block text-label text-soft">
          {WORDS[row.wait].from}, {row.n}
        </span>
      </>
    ),
  },
  {
    id: 'median',
    header: 'Typical',
    number: true,
    cell: (row) => (
      <>
        <Days days={row.median} unit />
        {row.isThin && <span className="block text-label text-soft">too few yet</span>}
      </>
    ),
  },
  { id: 'spread', header: '8 in 10 between', number: true, cell: (row) => !row.isThin && <Spread row={row} /> },
];

function Spread({ row }: { row: Row }) {
  const format = useFormatter();
  if (row.q10 === null || row.q90 === null) return null;
  return <>{`${format.number(row.q10)} and ${format.number(row.q90)}`}</>;
}
