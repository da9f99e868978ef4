import type { WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import { Money, Percent } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';

type Row = { what: string; figure: React.ReactNode };

/** All finished rebuilds together: what came in, what it cost, what was kept. */
export function PaysTotals({ answer }: { answer: WhatPaysAnswer }) {
  const format = useFormatter();
  const { totals, views } = answer;
  const rows: Row[] = [
    { what: 'Sold for, or brought otherwise', figure: <Money cents={totals.proceedsCents} /> },
    { what: 'Purchase', figure: <Money cents={totals.purchaseCents} /> },
    { what: 'Work: every entry on them', figure: <Money cents={totals.workCents} /> },
    { what: 'Kept, before overhead', figure: <Money cents={totals.profitCents} tone="kept" /> },
    {
      what: 'Kept, a rebuild',
      figure: <Money cents={totals.n === 0 ? null : totals.profitCents / totals.n} tone="kept" shown="never" />,
    },
    {
      what: 'Left, a rebuild, after a wage for own hours',
      figure: <Money cents={views.afterWage.leftPerRebuildCents} tone="kept" shown="never" why="no wage or no hours" />,
    },
    { what: 'Return on cost, all together', figure: <Percent rate={totals.returnOnCost.pooled} digits={1} /> },
    { what: 'Return on cost, typical', figure: <Percent rate={totals.returnOnCost.median} digits={1} /> },
    { what: 'Lost money', figure: `${format.number(totals.lossCount)} of ${format.number(totals.n)}` },
  ];
  return (
    <Panel title="All together" subtitle={`${format.count(totals.n, 'finished rebuild')}, every way out counted.`}>
      <Table caption="All finished rebuilds together" rows={rows} columns={COLUMNS} rowKey={(row) => row.what} />
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  { id: 'what', header: 'Measure', heads: true, cell: (row) => row.what },
  { id: 'figure', header: 'Figure', number: true, cell: (row) => row.figure },
];
