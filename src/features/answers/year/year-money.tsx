import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import { Days, Money, Percent } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';

type Row = { what: string; figure: React.ReactNode; note: string };

/** What the money earned while it was in: on cost, by the year, days held; and what is still tied up. */
export function YearMoney({ answer }: { answer: YearAnswer }) {
  const format = useFormatter();
  const { returns, tiedUp } = answer;
  const { onCost, daysHeld } = returns;
  const several = returns.hasSeveral ? 'more than one rate fits; the one nearest to zero stands here. ' : '';
  const undated = returns.undatedCount > 0 ? `${returns.undatedCount} with an undated entry left out. ` : '';
  const rows: Row[] = [
    {
      what: 'Return on cost, all together',
      figure: <Percent rate={onCost.pooled} digits={1} tone="kept" why="too few yet" />,
      note: `${format.money(onCost.profitCents)} on ${format.money(onCost.costCents)} of all-in cost; typical ${onCost.median === null ? 'not known' : format.percent(onCost.median, 1)}`,
    },
    {
      what: 'Days held, typical',
      figure: <Days days={daysHeld.median} why="not known" />,
      note: 'bought to left',
    },
    {
      what: 'Return by the year, all together',
      figure: <Percent rate={returns.pooled} tone="kept" why="not known" />,
      note: `${several}${undated}Under about 60 days held it mostly measures speed: read days and dollars first.`,
    },
    {
      what: 'Money still tied up',
      figure: <Money cents={tiedUp.cents} />,
      note: `in ${format.count(tiedUp.rebuildCount, 'rebuild')} on ${format.day(tiedUp.on)}: purchase and what was paid by then`,
    },
  ];
  return (
    <Panel title="What the money did" subtitle="Own hours are not a cost here.">
      <Table caption="What the money did" rows={rows} columns={COLUMNS} rowKey={(row) => row.what} />
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'what',
    header: 'Measure, and what it is made of',
    heads: true,
    cell: (row) => (
      <span className="block sm:min-w-44">
        {row.what}
        <span className="block text-label text-soft">{row.note}</span>
      </span>
    ),
  },
  { id: 'figure', header: 'Figure', number: true, cell: (row) => row.figure },
];
