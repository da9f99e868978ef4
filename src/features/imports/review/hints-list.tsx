import type { Hint } from '#shared/contracts/import-beside.ts';
import type { Reading } from '#shared/contracts/import-reading.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { columnName, type Place, rowPlace } from '../place.ts';
import { HINT_WORDS } from '../words.ts';

const MOST = 50;

/** Comments, hidden rows and the like: they change nothing, and someone may want to look. */
export function HintsList({ reading, onJump }: { reading: Reading; onJump: (place: Place) => void }) {
  const format = useFormatter();
  const { hints } = reading;
  if (hints.length === 0) return null;
  const columns: Column<Hint>[] = [
    {
      id: 'place',
      header: 'Where',
      heads: true,
      cell: (hint) => (
        <button type="button" className="place-link" onClick={() => onJump(hint)}>
          {placeWords(reading, hint)}
        </button>
      ),
    },
    { id: 'kind', header: 'What', cell: (hint) => HINT_WORDS[hint.kind] },
    { id: 'text', header: 'It says', width: 'min-w-56', cell: (hint) => hint.text },
  ];
  return (
    <Panel
      title={`Worth a look: ${format.count(hints.length, 'place')}`}
      subtitle={`They change nothing in what comes in.${hints.length > MOST ? ` The first ${MOST} are shown.` : ''}`}
    >
      <Table
        caption="Places worth a look"
        rows={hints.slice(0, MOST)}
        columns={columns}
        rowKey={(hint) => `${hint.sheet}-${hint.row}-${hint.col}-${hint.kind}`}
      />
    </Panel>
  );
}

function placeWords(reading: Reading, { sheet, row, col }: Hint): string {
  const column = col === null ? null : columnName(reading, { sheet, col });
  if (row === 0) return column ?? 'Whole sheet';
  return `${rowPlace(reading, { sheet, row })}${column ? `, ${column}` : ''}`;
}
