import { useState } from 'react';
import type { Aside, Reading } from '#shared/contracts/import-reading.ts';
import type { ImportRow } from '#shared/contracts/imports.ts';
import { Button } from '../../../ui/button.tsx';
import { CheckField } from '../../../ui/text-field.tsx';
import { CellField } from '../review/cell-field.tsx';
import { columnName, type Place } from '../place.ts';
import type { Settings } from '../use-settings.ts';
import { meaningWords } from '../words.ts';
import { faultyCols } from './row-facts.ts';

type Props = {
  row: ImportRow;
  reading: Reading;
  asides: readonly Aside[];
  settings: Settings;
  canChange: boolean;
  hotCol: number | null;
  onPlace: (place: Place) => void;
  /** Back to the grid, once a cell is put right. */
  onDone: () => void;
};

/** The cells of a row, each with what its column is taken for. Those at fault are fields; the others become fields when asked. */
export function RowCells(props: Props) {
  const { row, reading, asides, settings, canChange, hotCol, onPlace, onDone } = props;
  const [isAll, setAll] = useState(false);
  const cols = Array.from({ length: row.cells.length }, (_, at) => at + 1);
  const faulty = faultyCols(asides);
  const place = { sheet: row.sheet, row: row.row };
  const isOut = settings.isLeftOut(row);
  const isField = (col: number) => canChange && !isOut && (isAll || faulty.includes(col));
  const shown = cols.filter(
    (col) => isField(col) || row.cells[col - 1]?.trim() || settings.textOf({ ...place, col }) !== null,
  );
  return (
    <div className="grid gap-2">
      <ul className="row-cells" aria-label="Cells of the row">
        {shown.map((col) => {
          const at = { ...place, col };
          const raw = row.cells[col - 1] ?? '';
          const mark = () => onPlace(at);
          return (
            <li key={col} data-hot={hotCol === col || undefined} onPointerEnter={mark}>
              {isField(col) ? (
                <CellField onFocus={mark} {...{ at, raw, settings, onDone }} label={columnName(reading, at)} />
              ) : (
                <CellText {...{ raw, reading, at }} text={settings.textOf(at)} />
              )}
            </li>
          );
        })}
      </ul>
      {canChange && (
        <div className="flex flex-wrap items-center justify-between gap-3">
          {(row.outcome !== 'not data' || isOut) && (
            <CheckField
              label="Leave this row out"
              checked={isOut}
              onChange={(event) => settings.setLeftOut(row, event.target.checked)}
            />
          )}
          {!isOut && !isAll && (
            <Button size="small" onClick={() => setAll(true)}>
              {faulty.length > 0 ? 'Change another cell' : 'Change a cell'}
            </Button>
          )}
        </div>
      )}
    </div>
  );
}

type CellTextProps = { raw: string; text: string | null; reading: Reading; at: { sheet: number; col: number } };

function CellText({ raw, text, reading, at }: CellTextProps) {
  const column = reading.columns.find(({ sheet, col }) => sheet === at.sheet && col === at.col);
  const name = columnName(reading, at);
  const meaning = column ? meaningWords(column) : null;
  return (
    <>
      <span className="text-label text-soft">
        {name}
        {meaning && meaning !== name && ` → ${meaning}`}
      </span>
      <span className="break-words">
        {(text ?? raw).trim() || <span className="text-soft">nothing</span>}
        {text !== null && <span className="text-soft"> (was: {raw.trim() || 'nothing'})</span>}
      </span>
    </>
  );
}
