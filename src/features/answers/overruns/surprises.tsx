import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { Money, Percent } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RangeText } from '../range-text.tsx';
import { capital } from '../../../lib/capital.ts';

type Surprises = OverrunsAnswer['surprises'];
type Row = Surprises['categories'][number];

/** How often something turned up that nobody foresaw, where, and what it cost. */
export function SurprisesTable({ surprises }: { surprises: Surprises }) {
  const format = useFormatter();
  if (surprises.n === 0) return null;
  const rows = surprises.categories.filter((one) => one.x > 0).toSorted((a, b) => b.x - a.x);
  const share =
    surprises.shareOfWork === null
      ? ''
      : ` They cost ${format.money(surprises.unforeseenCents)}, ${format.percent(surprises.shareOfWork)} of all that was paid on these.`;
  const unknown =
    surprises.unknownCount > 0
      ? ` ${capital(format.count(surprises.unknownCount, 'rebuild'))} left out, where an entry does not say.`
      : '';
  return (
    <Panel
      title="Surprises"
      subtitle={`${format.number(surprises.x)} of ${format.count(surprises.n, 'rebuild')} had one.${share}${unknown}`}
    >
      {rows.length > 0 && (
        <Table
          caption="Surprises by category"
          rows={rows}
          columns={COLUMNS}
          rowKey={(row) => row.categoryId}
          foot={{
            name: 'Any of them',
            x: format.number(surprises.x),
            rate: <Percent rate={surprises.rate} />,
            range: <RangeText low={surprises.lower} high={surprises.upper} />,
            cost: <Money cents={surprises.unforeseenCents} />,
          }}
        />
      )}
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  { id: 'name', header: 'Category', heads: true, cell: (row) => capital(row.name) },
  { id: 'x', header: 'Rebuilds', under: 'phone', number: true, cell: (row) => row.x },
  { id: 'rate', header: 'Rate', number: true, cell: (row) => <Percent rate={row.rate} /> },
  {
    id: 'range',
    header: '95% range',
    under: 'tablet',
    number: true,
    cell: (row) => <RangeText low={row.lower} high={row.upper} />,
  },
  { id: 'cost', header: 'Cost in all', number: true, cell: (row) => <Money cents={row.unforeseenCents} /> },
];
