import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { Hours, Money, Percent } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { useShopPath } from '../rebuild-link.tsx';
import { capital } from '../../../lib/capital.ts';
import { byMoneyOver } from './strip-rows.ts';

type Category = OverrunsAnswer['categories'][number];
type Row = {
  key: string;
  name: React.ReactNode;
  n: number;
  isThin: boolean;
  plan: React.ReactNode;
  actual: React.ReactNode;
  over: React.ReactNode;
  pooled: number | null;
  median: number | null;
  unbudgeted: Category | null;
};

/** Categories with plan, actual, pooled and typical overrun; what nobody had planned for stands beside, in no ratio. */
export function OverrunsTable({ answer }: { answer: OverrunsAnswer }) {
  const rows = useRows(answer);
  if (answer.total.n === 0 && rows.length === 1) return null;
  return (
    <section id="rows" className="mb-6 scroll-mt-6">
      <Panel
        title="Category by category"
        subtitle="All together is sum over sum; typical is the middle rebuild. Not planned: spent where the estimate had nothing, so in no ratio."
      >
        <Table
          caption="Overrun by category"
          rows={rows}
          columns={COLUMNS}
          rowKey={(row) => row.key}
          rowProps={(row) => (row.key === 'total' ? { 'data-strong': '' } : {})}
        />
      </Panel>
    </section>
  );
}

function useRows(answer: OverrunsAnswer): Row[] {
  const format = useFormatter();
  const path = useShopPath();
  return useMemo(() => {
    const { total, hours, categories } = answer;
    const planned = byMoneyOver(categories);
    const never = categories.filter((one) => one.n === 0 && one.unbudgetedCount > 0);
    const rowOf = (one: Category | OverrunsAnswer['total'], key: string, name: React.ReactNode): Row => ({
      key,
      name,
      n: one.n,
      isThin: one.isThin,
      plan: <Money cents={one.n === 0 ? null : one.estimateCents} />,
      actual: <Money cents={one.n === 0 ? null : one.actualCents} />,
      over: <Money cents={one.n === 0 ? null : one.actualCents - one.estimateCents} signed tone="cost" />,
      pooled: one.pooled,
      median: one.median,
      unbudgeted: 'categoryId' in one && one.unbudgetedCount > 0 ? one : null,
    });
    const hoursRow: Row = {
      key: 'hours',
      name: 'Hours worked',
      n: hours.n,
      isThin: hours.isThin,
      plan: <Hours seconds={hours.plannedSeconds} />,
      actual: <Hours seconds={hours.actualSeconds} />,
      over: `${hours.actualSeconds > hours.plannedSeconds ? '+' : ''}${format.hours(hours.actualSeconds - hours.plannedSeconds)} h`,
      pooled: hours.pooled,
      median: hours.median,
      unbudgeted: null,
    };
    const link = (one: Category) => <Link to={path(`ledger?category=${one.categoryId}`)}>{capital(one.name)}</Link>;
    return [
      rowOf(total, 'total', 'All together'),
      ...(hours.n > 0 ? [hoursRow] : []),
      ...[...planned, ...never].map((one) => rowOf(one, one.categoryId, link(one))),
    ];
  }, [answer, format, path]);
}

const COLUMNS: readonly Column<Row>[] = [
  { id: 'name', header: 'Category', heads: true, cell: (row) => <span className="block sm:min-w-32">{row.name}</span> },
  { id: 'n', header: 'Rebuilds', under: 'phone', number: true, cell: (row) => row.n || '' },
  { id: 'plan', header: 'Planned', under: 'phone', number: true, cell: (row) => row.plan },
  { id: 'actual', header: 'Actual', under: 'phone', number: true, cell: (row) => row.actual },
  { id: 'over', header: 'Over', number: true, cell: (row) => row.over },
  {
    id: 'pooled',
    header: 'All together',
    number: true,
    cell: (row) => (
      <>
        <Percent rate={row.pooled} signed tone="cost" />
        {row.isThin && row.n > 0 && <span className="block text-label text-soft">too few yet</span>}
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
    id: 'unbudgeted',
    header: 'Not planned',
    under: 'tablet',
    number: true,
    cell: (row) =>
      row.unbudgeted && (
        <>
          <Money cents={row.unbudgeted.unbudgetedCents} />
          <span className="text-soft"> on {row.unbudgeted.unbudgetedCount}</span>
        </>
      ),
  },
];
