import type { TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import { Days } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RangeText } from '../range-text.tsx';
import { capital } from '../../../lib/capital.ts';

type Group = TimeToSellAnswer['overall'];
type Row = Group & { name: string; isAll: boolean };
type At = Group['at30'];

/** Median with its range, and the share still there after 30, 60 and 90 days, by class. */
export function SellingTable({ answer }: { answer: TimeToSellAnswer }) {
  const rows: Row[] = [
    { ...answer.overall, name: 'All together', isAll: true },
    ...answer.classes.toSorted((a, b) => b.n - a.n).map((one) => ({ ...one, name: capital(one.name), isAll: false })),
  ];
  const hasOther = answer.overall.otherExitCount > 0;
  return (
    <Panel
      className="mb-6"
      title="By class"
      subtitle={`Middle: half are sold by then, with its 95% interval.${hasOther ? ' Left otherwise (parted out and the like): watched up to that day.' : ''}`}
    >
      <Table
        caption="Days to sell by class"
        rows={rows}
        columns={hasOther ? COLUMNS : WITHOUT_OTHER}
        rowKey={(row) => row.name}
        rowProps={(row) => (row.isAll ? { 'data-strong': '' } : {})}
      />
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  { id: 'name', header: 'Class', heads: true, cell: (row) => <span className="block sm:min-w-28">{row.name}</span> },
  { id: 'n', header: 'Listed', under: 'phone', number: true, cell: (row) => row.n },
  { id: 'sold', header: 'Sold', under: 'phone', number: true, cell: (row) => row.soldCount },
  { id: 'unsold', header: 'Unsold', under: 'tablet', number: true, cell: (row) => row.unsoldCount || '' },
  { id: 'other', header: 'Left otherwise', under: 'tablet', number: true, cell: (row) => row.otherExitCount || '' },
  { id: 'median', header: 'Middle, days', number: true, cell: (row) => <Middle row={row} /> },
  { id: 'range', header: '95% range', under: 'phone', number: true, cell: (row) => <MiddleRange row={row} /> },
  { id: 'at30', header: 'After 30', under: 'phone', number: true, cell: (row) => <Share at={row.at30} /> },
  { id: 'at60', header: 'After 60', number: true, cell: (row) => <Share at={row.at60} /> },
  { id: 'at90', header: 'After 90', under: 'tablet', number: true, cell: (row) => <Share at={row.at90} /> },
];

const WITHOUT_OTHER = COLUMNS.filter(({ id }) => id !== 'other');

function Middle({ row }: { row: Row }) {
  return (
    <>
      <Days days={row.median.days} why={row.soldCount === 0 ? 'none sold' : 'not yet'} />
      {row.isThin && <span className="block text-label font-normal text-soft">too few yet</span>}
    </>
  );
}

function MiddleRange({ row }: { row: Row }) {
  const format = useFormatter();
  const { lower, upper } = row.median;
  if (lower === null) return null;
  return (
    <>{upper === null ? `${format.number(lower)} or more` : `${format.number(lower)} to ${format.number(upper)}`}</>
  );
}

function Share({ at }: { at: At }) {
  const format = useFormatter();
  if (at.unsold === null) return <span className="text-soft">not that far</span>;
  return (
    <>
      {format.percent(at.unsold)}
      <span className="block text-label font-normal text-soft">
        <RangeText low={at.lower} high={at.upper} />
      </span>
    </>
  );
}
