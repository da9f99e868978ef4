import type { Column as FileColumn, Reading } from '#shared/contracts/import-reading.ts';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { type Place, sheetName } from '../place.ts';
import type { Settings } from '../use-settings.ts';
import { meaningWords } from '../words.ts';
import { MeaningField } from './meaning-field.tsx';

type Props = {
  reading: Reading;
  settings: Settings;
  categories: readonly string[];
  canChange: boolean;
  onJump: (place: Place) => void;
};

/** Each column of the file: its first values, what it is taken for, why, and a way to say otherwise. */
export function ColumnTable({ reading, settings, categories, canChange, onJump }: Props) {
  const columns: Column<FileColumn>[] = [
    ...(reading.sheets.length > 1
      ? [{ id: 'sheet', header: 'Sheet', cell: (column: FileColumn) => sheetName(reading, column.sheet) }]
      : []),
    {
      id: 'heading',
      header: 'Column',
      heads: true,
      cell: ({ sheet, col, heading }) => (
        <button type="button" className="place-link" onClick={() => onJump({ sheet, row: 0, col })}>
          {heading || `Column ${col}`}
        </button>
      ),
    },
    {
      id: 'samples',
      header: 'First values',
      width: 'min-w-48',
      under: 'phone',
      bare: true,
      cell: (column) => <Samples column={column} />,
    },
    {
      id: 'meaning',
      header: 'Taken for',
      width: 'w-72 min-w-48',
      cell: (column) => (canChange ? <MeaningField {...{ column, settings, categories }} /> : meaningWords(column)),
    },
    {
      id: 'why',
      header: 'Why',
      width: 'min-w-56',
      under: 'phone',
      bare: true,
      cell: (column) => <span className="whitespace-normal text-soft">{column.why}</span>,
    },
  ];
  const from = reading.rememberedFrom;
  return (
    <Panel
      title="What each column holds"
      subtitle={
        from
          ? `Taken over from ${from.fileName}, which has the same headings. Change what is wrong, then read the file again.`
          : 'Guessed from the headings and the cells. Change what is wrong, then read the file again.'
      }
    >
      <Table
        caption="Columns of the file"
        rows={reading.columns}
        columns={columns}
        rowKey={(column) => `${column.sheet}-${column.col}`}
      />
    </Panel>
  );
}

function Samples({ column }: { column: FileColumn }) {
  const text = column.samples
    .slice(0, 3)
    .map((sample) => (sample.length > 40 ? `${sample.slice(0, 40)}…` : sample))
    .join(' · ');
  return <span className="whitespace-normal text-soft">{text || 'empty'}</span>;
}
