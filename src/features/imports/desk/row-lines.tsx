import { Link } from 'react-router-dom';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { ImportRow } from '#shared/contracts/imports.ts';
import { Hours, Money } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { capital } from '../../../lib/capital.ts';
import { columnName, type Place } from '../place.ts';
import { LINE_WORDS } from '../words.ts';

type Line = ImportRow['lines'][number];
type Props = {
  row: ImportRow;
  reading: Reading;
  onPlace: (place: Place) => void;
  entryTo: (entryId: string) => string;
};

/** What was read from a row, line by line; pointing at a line, or stepping to it, marks the cell that it stands in. */
export function RowLines({ row, reading, onPlace, entryTo }: Props) {
  if (row.lines.length === 0)
    return (
      <p className="text-soft">{row.outcome === 'taken' ? 'Facts about a rebuild; no money and no hours.' : ''}</p>
    );
  return (
    <ul className="row-lines" aria-label="What was read">
      {row.lines.map((line) => {
        const mark = () => onPlace({ sheet: line.sheet, row: line.row, col: line.col });
        return (
          <li key={`${line.kind}-${line.col}-${line.rebuild}`} onPointerEnter={mark}>
            <LineWords line={line} reading={reading} />
            <span className="text-label text-soft">
              from <CellLink line={line} reading={reading} onPress={mark} />
              {line.entryId && (
                <>
                  {' · '}
                  <Link to={entryTo(line.entryId)}>its entry</Link>
                </>
              )}
            </span>
          </li>
        );
      })}
    </ul>
  );
}

function CellLink({ line, reading, onPress }: { line: Line; reading: Reading; onPress: () => void }) {
  return (
    <button type="button" className="place-link" onClick={onPress} onFocus={onPress}>
      {columnName(reading, line)}
    </button>
  );
}

function LineWords({ line, reading }: { line: Line; reading: Reading }) {
  const format = useFormatter();
  const isHours = line.kind === 'hours' || line.kind === 'estimated hours';
  const rebuild = line.rebuild === null ? 'Overhead' : (reading.rebuilds[line.rebuild]?.tag ?? '');
  const kind = capital([LINE_WORDS[line.kind], line.category].filter(Boolean).join(' '));
  const facts = [
    line.on ? format.day(line.on) : null,
    line.person,
    line.vendor,
    line.what,
    line.foreseen,
    line.isExtra ? 'chosen extra' : null,
  ].filter(Boolean);
  return (
    <>
      <span className="flex flex-wrap items-baseline justify-between gap-x-4">
        <strong className="font-[660]">{kind}</strong>
        <strong className="font-[660]">
          {isHours ? (
            <>
              <Hours seconds={line.seconds} exact /> h
            </>
          ) : (
            <Money cents={line.cents} shown="always" />
          )}
        </strong>
      </span>
      <span>
        {rebuild}
        {facts.map((fact) => ` · ${fact}`)}
      </span>
      {line.isGuess && <span className="guess-note">A guess: the cell says it only roughly. Look at it.</span>}
    </>
  );
}
