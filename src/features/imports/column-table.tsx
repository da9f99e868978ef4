import { type Column as FileColumn, MEANINGS, type Meaning, type Reading } from '#shared/contracts/import-reading.ts';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { SelectField } from '../../ui/text-field.tsx';
import { sheetName } from './place.ts';
import type { Settings } from './use-settings.ts';
import { MEANING_WORDS } from './words.ts';

const OPTIONS = (Object.keys(MEANING_WORDS) as Meaning[])
  .filter((meaning) => MEANINGS.includes(meaning))
  .map((value) => ({ value, label: MEANING_WORDS[value] }));
const WITH_CATEGORY: readonly Meaning[] = ['cost', 'estimate'];

type Props = { reading: Reading; settings: Settings; categories: readonly string[]; canChange: boolean };

/** Each column of the file: its first values, what it is taken for, why, and a way to say otherwise. */
export function ColumnTable({ reading, settings, categories, canChange }: Props) {
  const columns: Column<FileColumn>[] = [
    ...(reading.sheets.length > 1
      ? [{ id: 'sheet', header: 'Sheet', cell: (column: FileColumn) => sheetName(reading, column.sheet) }]
      : []),
    { id: 'heading', header: 'Column', heads: true, cell: (column) => column.heading || `Column ${column.col}` },
    { id: 'samples', header: 'First values', width: 'min-w-48', cell: (column) => <Samples column={column} /> },
    {
      id: 'meaning',
      header: 'Taken for',
      width: 'w-72 min-w-56',
      cell: (column) => (canChange ? <MeaningField {...{ column, settings, categories }} /> : meaningWords(column)),
    },
    { id: 'why', header: 'Why', width: 'min-w-56', cell: (column) => <span className="text-soft">{column.why}</span> },
  ];
  return (
    <Panel
      title="What each column holds"
      subtitle="Guessed from the headings and the cells. Change what is wrong, then read the file again."
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
  return <span className="text-soft">{text || 'empty'}</span>;
}

const meaningWords = (column: FileColumn) =>
  `${MEANING_WORDS[column.meaning]}${column.category ? `: ${column.category}` : ''}`;

function MeaningField({
  column,
  settings,
  categories,
}: { column: FileColumn } & Pick<Props, 'settings' | 'categories'>) {
  const chosen = settings.columnOf(column) ?? column;
  const name = column.heading || `column ${column.col}`;
  const set = (meaning: Meaning, category: string | null) =>
    settings.setColumn({ sheet: column.sheet, col: column.col, meaning, category });
  const needsCategory = WITH_CATEGORY.includes(chosen.meaning);
  return (
    <div className="grid gap-2">
      <SelectField
        hideLabel
        label={`What ${name} holds`}
        options={OPTIONS}
        value={chosen.meaning}
        onChange={(event) => {
          const meaning = event.target.value as Meaning;
          set(meaning, WITH_CATEGORY.includes(meaning) ? (chosen.category ?? categories[0] ?? null) : null);
        }}
      />
      {needsCategory && (
        <SelectField
          hideLabel
          label={`Kind of cost in ${name}`}
          options={categories.map((value) => ({ value, label: value }))}
          value={chosen.category ?? ''}
          onChange={(event) => set(chosen.meaning, event.target.value)}
        />
      )}
    </div>
  );
}
