import type { Column } from '#shared/contracts/import-reading.ts';
import type { Place } from '../place.ts';
import type { Settings } from '../use-settings.ts';
import { meaningWords } from '../words.ts';

type Props = {
  id: string;
  columns: readonly Column[];
  /** Columns of the widest row. */
  count: number;
  template: string;
  settings: Settings;
  place: Place;
  onPlace: (place: Place) => void;
};

/** What each column is called and what it is taken for; a press shows more and lets it be corrected. */
export function GridHead({ id, columns, count, template, settings, place, onPlace }: Props) {
  const byCol = new Map(columns.map((column) => [column.col, column]));
  return (
    <div role="rowgroup" className="file-grid-head">
      <div role="row" aria-rowindex={1} style={{ gridTemplateColumns: template }}>
        <div role="columnheader" className="file-grid-corner">
          Row
        </div>
        {Array.from({ length: count }, (_, at) => {
          const column = byCol.get(at + 1);
          const meaning = column ? meaningWords(settings.columnOf(column) ?? column) : '';
          const isHere = place.row === 0 && place.col === at + 1;
          return (
            <div
              key={at}
              id={`${id}-head-${at + 1}`}
              role="columnheader"
              data-here={isHere || undefined}
              aria-colindex={at + 2}
            >
              {column ? (
                <button
                  type="button"
                  tabIndex={-1}
                  aria-pressed={isHere}
                  title={meaning}
                  onClick={() => onPlace({ sheet: place.sheet, row: 0, col: at + 1 })}
                >
                  <span>{column.heading || `Column ${at + 1}`}</span>
                  <span data-unused={column.meaning === 'ignore' || undefined}>{meaning}</span>
                </button>
              ) : (
                <span>Column {at + 1}</span>
              )}
            </div>
          );
        })}
      </div>
    </div>
  );
}
