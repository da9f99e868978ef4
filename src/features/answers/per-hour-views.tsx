import type { z } from 'zod';
import type { perHourSchema } from '#shared/contracts/answers-parts.ts';
import { unbroken } from '../../lib/unbroken.ts';
import { Money, PerHour } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { type Column, Table } from '../../ui/table.tsx';

type Views = z.output<typeof perHourSchema>;
const NO_HOURS = 'no hours are known';

type Row = { view: string; figure: React.ReactNode; made: string; n: number; missing: number };

/** Profit per hour in three views, each with the sums behind it and how many rebuilds it rests on. */
export function PerHourViews({ views }: { views: Views }) {
  const format = useFormatter();
  const { own, all, afterWage } = views;
  const wage = afterWage.wantedCentsPerHour;
  const rows: Row[] = [
    {
      view: 'By own hour',
      figure: <PerHour cents={own.pooledCents} tone="kept" why="no hours" />,
      made: own.n === 0 ? NO_HOURS : `${format.money(own.profitCents)} over ${format.hours(own.ownSeconds)} own hours`,
      n: own.n,
      missing: own.missingCount,
    },
    {
      view: "By everybody's hour",
      figure: <PerHour cents={all.pooledCents} tone="kept" why="no hours" />,
      made:
        all.n === 0
          ? NO_HOURS
          : `${format.money(all.profitCents)} and ${format.money(all.paidLaborCents)} wages given back, over ${format.hours(all.seconds)} hours`,
      n: all.n,
      missing: all.missingCount,
    },
    {
      view: 'After a wage for own hours',
      figure: (
        <>
          <Money cents={afterWage.leftPerRebuildCents} tone="kept" why={wage === null ? 'no wage set' : 'no hours'} />
          {afterWage.leftPerRebuildCents !== null && <span className="block text-label text-soft">a rebuild</span>}
        </>
      ),
      made:
        wage === null || afterWage.leftCents === null
          ? 'the wanted pay per hour is set on the Shop page'
          : `${format.money(own.profitCents)} less ${format.money(wage)} for each own hour leaves ${format.money(afterWage.leftCents)}`,
      n: afterWage.n,
      missing: afterWage.missingCount,
    },
  ];
  return <Table caption="Profit per hour in three views" rows={rows} columns={COLUMNS} rowKey={(row) => row.view} />;
}

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'view',
    header: 'View, and what it is made of',
    heads: true,
    cell: (row) => (
      <span className="block sm:min-w-40">
        {row.view}
        <span className="block text-label text-soft">
          {unbroken(row.made)}
          {row.missing > 0 && `; ${row.missing} without hours left out`}
        </span>
      </span>
    ),
  },
  { id: 'figure', header: 'Figure', number: true, cell: (row) => row.figure },
  { id: 'n', header: 'Rebuilds', number: true, cell: (row) => row.n },
];
