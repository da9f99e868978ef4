import type { StageOfDays, TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import { capital } from '../../../lib/capital.ts';
import { Days } from '../../../ui/figures.tsx';
import { FoldedPanel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { STAGE_WORDS } from '../sentences/stages.ts';

type Row = TimeToSellAnswer['classStages'][number];

/** Typical days in each stage, class by class. */
export function ClassStages({ rows }: { rows: TimeToSellAnswer['classStages'] }) {
  if (rows.length < 2) return null;
  return (
    <FoldedPanel
      title="Where the days go, by class"
      subtitle="Typical days, and how many rebuilds they rest on; gray: fewer than five, too few yet."
    >
      <Table caption="Days in each stage by class" rows={rows} columns={COLUMNS} rowKey={(row) => row.classId} />
    </FoldedPanel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'name',
    header: 'Class',
    heads: true,
    cell: (row) => <span className="block sm:min-w-28">{capital(row.name)}</span>,
  },
  ...Object.entries(STAGE_WORDS).map(([stage, { name }]) => ({
    id: stage,
    header: name,
    under: stage === 'build' || stage === 'sell' ? undefined : ('phone' as const),
    number: true,
    cell: (row: Row) => <Middle of={row.stages.find((one) => one.stage === stage)} />,
  })),
];

function Middle({ of }: { of: StageOfDays | undefined }) {
  if (!of || of.n === 0 || of.median === null) return null;
  return (
    <span className={of.isThin ? 'text-soft' : ''}>
      <Days days={of.median} /> <span className="inline-block min-w-5 text-label text-soft">{of.n}</span>
    </span>
  );
}
