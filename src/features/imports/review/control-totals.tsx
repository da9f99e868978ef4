import type { ReactNode } from 'react';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { NotData } from '#shared/contracts/import-words.ts';
import { capital } from '../../../lib/capital.ts';
import { Hours, Money } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { NOT_DATA_WORDS } from '../words.ts';

const COLUMNS: Column<{ name: string; value: ReactNode }>[] = [
  { id: 'name', header: 'What', heads: true, cell: (row) => row.name },
  { id: 'value', header: 'In this file', number: true, cell: (row) => row.value },
];

/** Counts and sums of what comes in: they add up to the whole file. */
export function ControlTotals({ reading }: { reading: Reading }) {
  const format = useFormatter();
  const { control } = reading;
  const money = (cents: number) => <Money cents={cents} shown="always" />;
  const costs = Object.entries(control.centsByCategory)
    .sort((a, b) => b[1] - a[1])
    .map(([name, cents]) => ({ name: capital(name), value: money(cents) }));
  const others = [
    { name: 'Sales', amount: control.saleCents, value: money(control.saleCents) },
    { name: 'Planned costs', amount: control.estimateCents, value: money(control.estimateCents) },
    { name: 'Hours', amount: control.hoursSeconds, value: <Hours seconds={control.hoursSeconds} exact /> },
    { name: 'Readable on what is put aside', amount: control.putAsideCents, value: money(control.putAsideCents) },
  ].filter((row) => row.amount !== 0);
  return (
    <Panel
      title="What comes in"
      subtitle={`Every row of the file is in exactly one of the first lines.${control.blankRows > 0 ? ` ${format.count(control.blankRows, 'blank line')} between them.` : ''}`}
    >
      <div className="grid gap-6">
        <Table
          caption="Rows"
          rows={rowLines(reading).map(({ name, count }) => ({ name, value: format.number(count) }))}
          columns={COLUMNS}
          rowKey={(row) => row.name}
          foot={{ name: 'All rows that were read', value: format.number(control.rowsRead) }}
        />
        {costs.length > 0 && (
          <Table
            caption="Costs"
            rows={costs}
            columns={COLUMNS}
            rowKey={(row) => row.name}
            foot={{ name: 'Costs together', value: money(control.costCents) }}
          />
        )}
        {others.length > 0 && (
          <Table caption="Beside costs" rows={others} columns={COLUMNS} rowKey={(row) => row.name} />
        )}
      </div>
    </Panel>
  );
}

/** How the rows ended, one line for each way; their counts add up to all rows read. */
export function rowLines({ control, notData }: Reading): { name: string; count: number }[] {
  const kinds = Object.entries(notData).filter(([kind, count]) => kind !== 'blank' && count > 0);
  const named = kinds.reduce((sum, [, count]) => sum + count, 0);
  return [
    { name: 'Come in', count: control.taken },
    { name: 'Put aside', count: control.putAside },
    ...kinds.map(([kind, count]) => ({ name: `No data: ${NOT_DATA_WORDS[kind as NotData]}`, count })),
    { name: 'No data', count: control.notData - named },
  ].filter(({ count }, at) => at < 2 || count !== 0);
}
