import type { ReactNode } from 'react';
import type { Reading, StatedTotal } from '#shared/contracts/import-reading.ts';
import { Hours, Money } from '../../../ui/figures.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { columnName, type Place, rowPlace } from '../place.ts';

/** The totals that the file itself states, each held against what comes in; a press shows where it stands. */
export function StatedTotals({ reading, onJump }: { reading: Reading; onJump: (place: Place) => void }) {
  const figure = (total: StatedTotal, value: number) =>
    total.measure === 'hours' ? <Hours seconds={value} exact /> : <Money cents={value} shown="always" />;
  const columns: Column<StatedTotal>[] = [
    { id: 'column', header: 'Column', heads: true, cell: (total) => columnName(reading, total) },
    {
      id: 'row',
      header: 'Row',
      cell: (total) => (
        <button type="button" className="place-link" onClick={() => onJump(total)}>
          {rowPlace(reading, total)}
          {total.label && `, “${total.label}”`}
        </button>
      ),
    },
    { id: 'stated', header: 'File says', number: true, cell: (total) => figure(total, total.stated) },
    { id: 'in', header: 'Comes in', number: true, cell: (total) => figure(total, total.imported) },
    {
      id: 'why',
      header: 'Difference',
      under: 'phone',
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

function Difference(props: { total: StatedTotal; figure: (total: StatedTotal, value: number) => ReactNode }) {
  const { total, figure } = props;
  return (
    <span className="whitespace-normal">
      <span className="font-[640] text-oxide">{figure(total, total.stated - total.imported)}</span>. {total.explanation}
    </span>
  );
}
