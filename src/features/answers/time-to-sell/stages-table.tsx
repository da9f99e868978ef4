import type { StageOfDays, TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import { Days } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { STAGE_WORDS, whereTheDaysGo } from '../sentences/stages.ts';

/** Where the days go, from the purchase to the sale. */
export function StagesTable({ answer }: { answer: TimeToSellAnswer }) {
  const format = useFormatter();
  const rows = answer.stages.filter((row) => row.n > 0);
  if (rows.length === 0) return null;
  return (
    <Panel title="Where the days go" subtitle={whereTheDaysGo(answer, format)}>
      <Table
        caption="Days in each stage"
        rows={rows}
        columns={COLUMNS}
        rowKey={(row) => row.stage}
        rowProps={(row) => (row.stage === 'held' ? { 'data-strong': '' } : {})}
      />
    </Panel>
  );
}

const COLUMNS: readonly Column<StageOfDays>[] = [
  {
    id: 'stage',
    header: 'Stage',
    heads: true,
    cell: (row) => (
      <>
        {STAGE_WORDS[row.stage].name}
        <span className="block text-label font-normal text-soft">
          {STAGE_WORDS[row.stage].from}, {row.n}
          {row.oddCount > 0 && `; ${row.oddCount} in another order left out`}
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
        <Days days={row.median} unit why="not yet" />
        {row.isThin && <span className="block text-label font-normal text-soft">too few yet</span>}
      </>
    ),
  },
  { id: 'spread', header: '8 in 10 between', number: true, cell: (row) => !row.isThin && <Spread row={row} /> },
];

function Spread({ row }: { row: StageOfDays }) {
  const format = useFormatter();
  if (row.q10 === null) return null;
  return <>{`${format.number(row.q10)} and ${row.q90 === null ? 'not yet' : format.number(row.q90)}`}</>;
}
