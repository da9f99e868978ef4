import { type CSSProperties, memo } from 'react';
import type { Hint } from '#shared/contracts/import-beside.ts';
import type { Aside } from '#shared/contracts/import-reading.ts';
import type { ImportRow } from '#shared/contracts/imports.ts';
import type { Place } from '../place.ts';
import type { Settings } from '../use-settings.ts';
import { HINT_WORDS, OUTCOME_WORDS, reasonWords } from '../words.ts';
import { markOf } from './row-facts.ts';

type Props = {
  id: string;
  index: number;
  row: ImportRow;
  asides: readonly Aside[];
  hints: readonly Hint[];
  settings: Settings;
  isHere: boolean;
  /** The cell that the other side points at. */
  hotCol: number | null;
  count: number;
  style: CSSProperties;
  onPlace: (place: Place) => void;
};

const SIGNS = { taken: '', 'put aside': '✕', 'not data': '–', 'left out': '∅', cell: '!' } as const;

/** One row of the file: its number, how it ended, and its cells as they stand. */
export const GridRow = memo(function GridRow(props: Props) {
  const { row, asides, hints, settings, isHere, hotCol, onPlace } = props;
  const isOut = settings.isLeftOut(row);
  const sign = isOut ? 'left out' : row.outcome === 'taken' && asides.length > 0 ? 'cell' : row.outcome;
  const whole = hints.filter(({ col }) => col === null);
  const place = { sheet: row.sheet, row: row.row };
  return (
    <div
      id={props.id}
      role="row"
      aria-rowindex={props.index + 2}
      aria-selected={isHere}
      data-outcome={isOut ? 'left out' : row.outcome}
      className="file-row"
      style={props.style}
    >
      <div role="rowheader" className="file-row-number" onPointerDown={() => onPlace({ ...place, col: null })}>
        <span aria-hidden="true">{SIGNS[sign]}</span>
        <span title={whole.map(({ kind }) => HINT_WORDS[kind]).join(', ') || undefined}>
          {whole.length > 0 && <span aria-hidden="true">◦ </span>}
          {row.row}
        </span>
        <span className="sr-only">
          : {OUTCOME_WORDS[row.outcome]} {reasonWords(row.reason)}
        </span>
      </div>
      {Array.from({ length: props.count }, (_, at) => {
        const col = at + 1;
        const text = settings.textOf({ ...place, col });
        const hint = hints.find((one) => one.col === col);
        return (
          <div
            key={col}
            role="gridcell"
            aria-colindex={col + 1}
            data-mark={markOf(row.lines, asides, col)}
            data-corrected={text !== null || undefined}
            data-hot={hotCol === col || undefined}
            data-hint={hint ? '' : undefined}
            title={hint ? `${HINT_WORDS[hint.kind]}: ${hint.text}` : undefined}
            onPointerDown={() => onPlace({ ...place, col })}
          >
            {(text ?? row.cells[at] ?? '').trim()}
          </div>
        );
      })}
    </div>
  );
});
