import type { Reading, StatedTotal } from '#shared/contracts/import-reading.ts';
import { capital } from '../../lib/capital.ts';
import { Hours, Money } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { columnName, rowPlace } from './place.ts';
import { NOT_DATA_WORDS } from './words.ts';

/** Counts and sums of what comes in: they add up to the whole file. */
export function ControlTotals({ reading }: { reading: Reading }) {
  const format = useFormatter();
  const { control, notData } = reading;
  const kinds = Object.entries(control.centsByCategory).sort((a, b) => b[1] - a[1]);
  const beside = Object.entries(notData).filter(([kind, count]) => kind !== 'blank' && count > 0);
  const rows = [
    { name: 'Rows that come in', value: format.number(control.taken) },
    { name: 'Rows put aside', value: format.number(control.putAside) },
    {
      name: `Rows that hold no data${beside.length ? ` (${beside.map(([kind, count]) => `${format.count(count, NOT_DATA_WORDS[kind as keyof typeof NOT_DATA_WORDS])}`).join(', ')})` : ''}`,
      value: format.number(control.notData),
    },
  ];
  const money = (cents: number) => <Money cents={cents} shown="always" />;
  const costs = kinds.map(([name, cents]) => ({ name: capital(name), value: money(cents) }));
  const others = [
    { name: 'Sales', amount: control.saleCents, value: money(control.saleCents) },
    { name: 'Planned costs', amount: control.estimateCents, value: money(control.estimateCents) },
    { name: 'Hours', amount: control.hoursSeconds, value: <Hours seconds={control.hoursSeconds} exact /> },
    { name: 'Readable on rows put aside', amount: control.putAsideCents, value: money(control.putAsideCents) },
  ].filter((row) => row.amount !== 0);
  const columns: Column<{ name: string; value: React.ReactNode }>[] = [
    { id: 'name', header: 'What', heads: true, cell: (row) => row.name },
    { id: 'value', header: 'In this file', number: true, cell: (row) => row.value },
  ];
  return (
    <Panel title="What comes in" subtitle="Every row of the file is in exactly one of the first three lines.">
      <div className="grid gap-6">
        <Table
          caption="Rows"
          rows={rows}
          columns={columns}
          rowKey={(row) => row.name}
          foot={{ name: 'All rows, blank ones apart', value: format.number(control.rowsRead) }}
        />
        {costs.length > 0 && (
          <Table
            caption="Costs"
            rows={costs}
            columns={columns}
            rowKey={(row) => row.name}
            foot={{ name: 'Costs together', value: money(control.costCents) }}
          />
        )}
        {others.length > 0 && (
          <Table caption="Beside costs" rows={others} columns={columns} rowKey={(row) => row.name} />
        )}
      </div>
    </Panel>
  );
}

/** The totals that the file itself states, each held against what comes in. */
export function StatedTotals({ reading }: { reading: Reading }) {
  const figure = (total: StatedTotal, value: number) =>
    total.measure === 'hours' ? <Hours seconds={value} exact /> : <Money cents={value} shown="always" />;
  const columns: Column<StatedTotal>[] = [
    { id: 'column', header: 'Column', heads: true, cell: (total) => columnName(reading, total) },
    {
      id: 'row',
      header: 'Row',
      cell: (total) => `${rowPlace(reading, total)}${total.label ? `, “${total.label}”` : ''}`,
    },
    { id: 'stated', header: 'File says', number: true, cell: (total) => figure(total, total.stated) },
    { id: 'in', header: 'Comes in', number: true, cell: (total) => figure(total, total.imported) },
    {
      id: 'why',
      header: 'Difference',
      cell: (total) => (total.stated === total.imported ? 'None' : <Difference total={total} figure={figure} />),
    },
  ];
  return (
    <Panel
      title="Held against the file’s own totals"
      subtitle="Rows of totals are never booked; they are used to check."
    >
      {reading.statedTotals.length === 0 ? (
        <p className="text-soft">This file states no totals.</p>
      ) : (
        <Table
          caption="The file’s own totals"
          rows={reading.statedTotals}
          columns={columns}
          rowKey={(total) => `${total.sheet}-${total.row}-${total.col}`}
        />
      )}
    </Panel>
  );
}

function Difference({
  total,
  figure,
}: {
  total: StatedTotal;
  figure: (total: StatedTotal, value: number) => React.ReactNode;
}) {
  return (
    <>
      <span className="font-[640] text-oxide">{figure(total, total.stated - total.imported)}</span>. {total.explanation}
    </>
  );
}
