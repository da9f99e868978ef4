import { useState } from 'react';
import type { FirstRow, Line, Reading } from '#shared/contracts/import-reading.ts';
import { Button } from '../../ui/button.tsx';
import { Hours, Money } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { rowPlace } from './place.ts';
import { reasonWords } from './words.ts';

const AT_FIRST = 25;

/** The first rows: the file's own cells at the left, what was read from them at the right. */
export function FirstRows({ reading }: { reading: Reading }) {
  const [isAll, setAll] = useState(false);
  const rows = isAll ? reading.firstRows : reading.firstRows.slice(0, AT_FIRST);
  const columns: Column<FirstRow>[] = [
    { id: 'row', header: 'Row', heads: true, cell: (row) => rowPlace(reading, row) },
    { id: 'cells', header: 'As it stands in the file', width: 'w-1/2 min-w-72', cell: (row) => <Cells row={row} /> },
    { id: 'read', header: 'As it was read', width: 'min-w-64', cell: (row) => <Reads row={row} reading={reading} /> },
  ];
  return (
    <Panel title="The first rows, as they were read">
      <Table
        caption="First rows of the file"
        rows={rows}
        columns={columns}
        rowKey={(row) => `${row.sheet}-${row.row}`}
      />
      {!isAll && reading.firstRows.length > AT_FIRST && (
        <Button className="mt-4" onClick={() => setAll(true)}>
          Show the first {reading.firstRows.length}
        </Button>
      )}
    </Panel>
  );
}

function Cells({ row }: { row: FirstRow }) {
  const used = new Set(row.lines.map((line) => line.col));
  const shown = row.cells.map((cell, at) => ({ cell: cell.trim(), at })).filter(({ cell }) => cell !== '');
  return (
    <span className="text-soft">
      {shown.map(({ cell, at }, index) => (
        <span key={at}>
          {index > 0 && ' · '}
          <span className={used.has(at + 1) ? 'font-semibold text-ink' : ''}>
            {cell.length > 60 ? `${cell.slice(0, 60)}…` : cell}
          </span>
        </span>
      ))}
    </span>
  );
}

function Reads({ row, reading }: { row: FirstRow; reading: Reading }) {
  if (row.outcome === 'put aside') return <span className="text-oxide">Put aside: {reasonWords(row.reason)}</span>;
  if (row.outcome === 'not data') return <span className="text-soft">No data ({reasonWords(row.reason)})</span>;
  return (
    <ul>
      {row.lines.map((line) => (
        <li key={`${line.kind}-${line.col}`}>
          <LineWords line={line} reading={reading} />
        </li>
      ))}
      {row.lines.length === 0 && <li>Facts of a rebuild</li>}
    </ul>
  );
}

const KINDS: Readonly<Record<Line['kind'], string>> = {
  entry: '',
  purchase: 'purchase',
  sale: 'sale',
  asking: 'asking price',
  'expected sale': 'expected sale',
  estimate: 'planned',
  hours: 'hours',
  'estimated hours': 'planned hours',
};

function LineWords({ line, reading }: { line: Line; reading: Reading }) {
  const format = useFormatter();
  const tag = line.rebuild === null ? 'overhead' : (reading.rebuilds[line.rebuild]?.tag ?? '');
  const isHours = line.kind === 'hours' || line.kind === 'estimated hours';
  const words = [
    tag,
    [KINDS[line.kind], line.category].filter(Boolean).join(' '),
    line.on ? format.day(line.on) : null,
    line.isGuess ? 'a guess' : null,
  ];
  return (
    <>
      {isHours ? <Hours seconds={line.seconds} exact /> : <Money cents={line.cents} shown="always" />} ·{' '}
      {words.filter(Boolean).join(' · ')}
    </>
  );
}
