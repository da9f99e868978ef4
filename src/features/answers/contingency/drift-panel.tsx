import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { Nothing, Percent } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { sayDrift } from '../sentences/contingency.ts';

type Figure = ContingencyAnswer['drift']['all'];
type Row = { span: string; figure: Figure };

/** The last two years beside all of them; a warning where they disagree, and nothing where there are too few to tell. */
export function DriftPanel({ drift }: { drift: ContingencyAnswer['drift'] }) {
  const format = useFormatter();
  const said = sayDrift(drift, format);
  if (said === null) return null;
  const rows: Row[] = [
    { span: 'All years: the proposal', figure: drift.all },
    { span: `Since ${format.day(drift.after)}`, figure: drift.recent },
    { span: 'The years before', figure: drift.before },
  ];
  const isWarning = drift.verdict !== 'agrees';
  return (
    <Panel title={isWarning ? 'The last two years disagree' : 'Do the last two years agree?'}>
      <p className={`mb-4 ${isWarning ? 'border-l-4 border-oxide pl-3 font-[560]' : ''}`}>{said}</p>
      <Table caption="What each span asks for" rows={rows} columns={COLUMNS} rowKey={(row) => row.span} />
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  { id: 'span', header: 'Left in', heads: true, cell: (row) => row.span },
  {
    id: 'figure',
    header: 'Asks for',
    number: true,
    cell: ({ figure }) =>
      figure.percent === null ? <Nothing why="too few yet" /> : <Percent rate={figure.percent / 100} />,
  },
  { id: 'n', header: 'Rebuilds', number: true, cell: ({ figure }) => figure.n },
];
