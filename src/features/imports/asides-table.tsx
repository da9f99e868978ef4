import { useMemo } from 'react';
import type { Aside, Reading } from '#shared/contracts/import-reading.ts';
import { DataTable } from '../../ui/data-table.tsx';
import { Money } from '../../ui/figures.tsx';
import { Panel } from '../../ui/panel.tsx';
import type { Column } from '../../ui/table.tsx';
import { columnName, rowPlace } from './place.ts';
import { ASIDE_WORDS } from './words.ts';

/** Every row and cell that does not come in, with its reason and its text, so that nothing is lost in silence. */
export function AsidesTable({ reading }: { reading: Reading }) {
  const { asides, asideCount } = reading;
  const columns = useMemo((): Column<Aside>[] => {
    return [
      {
        id: 'row',
        header: 'Row',
        heads: true,
        sortBy: (one) => one.row,
        width: 'w-20',
        cell: (one) => rowPlace(reading, one),
      },
      {
        id: 'reason',
        header: 'Why',
        sortBy: (one) => one.reason,
        width: 'w-64 min-w-44',
        cell: (one) => ASIDE_WORDS[one.reason],
      },
      {
        id: 'column',
        header: 'Column',
        width: 'w-48',
        cell: (one) => (one.col === null ? 'whole row' : columnName(reading, { sheet: one.sheet, col: one.col })),
      },
      {
        id: 'text',
        header: 'What stands there',
        width: 'w-72 min-w-44',
        cell: (one) => one.text || <span className="text-soft">nothing</span>,
      },
      {
        id: 'cents',
        header: 'Readable money',
        number: true,
        width: 'w-40',
        sortBy: (one) => one.cents,
        cell: (one) => <Money cents={one.cents} shown="always" />,
      },
      { id: 'rest', header: 'Rest of its row', width: 'w-48', cell: (one) => (one.isCell ? 'comes in' : 'put aside') },
    ];
  }, [reading]);
  if (asideCount === 0) return null;
  const isCut = asideCount > asides.length;
  return (
    <Panel
      title={`Put aside: ${asideCount}`}
      subtitle={`Not booked, and kept with the file. Correct them in your spreadsheet, or enter them by hand.${isCut ? ` The first ${asides.length} are shown.` : ''}`}
    >
      <DataTable
        caption="Rows and cells put aside"
        rows={asides}
        columns={columns}
        rowKey={(one) => `${one.sheet}-${one.row}-${one.col}-${one.reason}`}
      />
    </Panel>
  );
}
