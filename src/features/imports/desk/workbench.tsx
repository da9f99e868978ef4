import { type Ref, type RefCallback, useCallback, useImperativeHandle, useMemo, useRef, useState } from 'react';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { Import, ImportRow } from '#shared/contracts/imports.ts';
import { Button } from '../../../ui/button.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { Segmented } from '../../../ui/segmented.tsx';
import { ErrorState, LoadingState } from '../../../ui/states.tsx';
import { SelectField } from '../../../ui/text-field.tsx';
import { type Place, sheetsOf } from '../place.ts';
import type { Settings } from '../use-settings.ts';
import { FileGrid, type GridHandle } from './file-grid.tsx';
import { ColumnDetail, RowDetail } from './row-detail.tsx';
import { factsOf } from './row-facts.ts';
import { SheetNote } from './sheet-note.tsx';
import { type RowFilter, useRows } from './use-rows.ts';

const FILTERS: readonly { value: RowFilter; label: string }[] = [
  { value: 'all', label: 'All' },
  { value: 'put aside', label: 'Put aside' },
  { value: 'not data', label: 'No data' },
  { value: 'guesses', label: 'Guesses' },
];

export interface WorkbenchHandle {
  /** Shows a place of the file and puts the focus there. */
  readonly go: (place: Place) => void;
}

type Props = {
  ref: Ref<WorkbenchHandle>;
  file: Import;
  reading: Reading;
  settings: Settings;
  categories: readonly string[];
  canChange: boolean;
  /** The place to begin with; null = the first row that holds data. */
  start: Place | null;
  entryTo: (entryId: string) => string;
};

/** The file at the left as it stands, and what was understood of the row in focus at the right, linked cell by cell. */
export function Workbench({ ref, file, reading, settings, categories, canChange, start, entryTo }: Props) {
  const [chosen, setPlace] = useState<Place>(() => start ?? firstPlace(reading));
  const [filter, setFilter] = useState<RowFilter>('all');
  const { rows, query, sheet, seek } = useRows(file, chosen, filter);
  const place = filter === 'all' ? chosen : placeAmong(rows, chosen);
  const frame = useRef<HTMLElement>(null);
  const { grid, onGrid, focusGrid } = useGridFocus(() => frame.current?.scrollIntoView({ block: 'start' }));
  const detail = useRef<HTMLDivElement>(null);
  const facts = useMemo(() => factsOf(reading), [reading]);
  const sheets = sheetsOf(file, reading);

  const go = (to: Place) => {
    setFilter('all');
    seek(to);
    setPlace(to);
    focusGrid();
  };
  useImperativeHandle(ref, () => ({ go }));
  const onFilter = (wanted: RowFilter) => {
    setFilter(wanted);
    seek({ sheet, row: 1 });
  };
  const { hasNextPage, isFetching, fetchNextPage } = query;
  const onNearEnd = useCallback(() => {
    if (hasNextPage && !isFetching) void fetchNextPage();
  }, [hasNextPage, isFetching, fetchNextPage]);
  const row = rows.find((one) => one.sheet === place.sheet && one.row === place.row);
  const column = reading.columns.find((one) => one.sheet === place.sheet && one.col === place.col);
  const shared = { reading, settings, canChange, place, onPlace: setPlace };
  return (
    <section ref={frame} aria-label="The file beside what was understood" className="mb-6 scroll-mt-20">
      <Panel
        title="The file, and what was understood"
        subtitle="Press a row or a cell: beside it stands what was read from it, and why."
        actions={<Segmented label="Rows" options={FILTERS} value={filter} onChange={onFilter} />}
      >
        {sheets.length > 0 && (
          <SelectField
            className="mb-3 max-w-[24rem]"
            label="Sheet"
            options={sheets}
            value={String(sheet)}
            onChange={(event) => {
              const to = { sheet: Number(event.target.value), row: 1, col: null };
              seek(to);
              setPlace(to);
            }}
          />
        )}
        <SheetNote reading={reading} sheet={sheet} />
        {query.isError && <ErrorState error={query.error} onRetry={() => void query.refetch()} />}
        {query.isPending && <LoadingState label="Loading rows" lines={8} />}
        <div className="workbench">
          {query.isSuccess && (
            <div className="min-w-0">
              {query.hasPreviousPage && (
                <Button
                  size="small"
                  className="mb-2"
                  busy={query.isFetchingPreviousPage}
                  onClick={() => void query.fetchPreviousPage()}
                >
                  Rows before row {rows[0]?.row}
                </Button>
              )}
              {rows.length === 0 && !query.hasNextPage ? (
                <p className="py-6 text-soft">No row of this sheet ended so.</p>
              ) : (
                <FileGrid
                  ref={onGrid}
                  label="Rows of the file"
                  isWhole={!query.hasNextPage && !query.hasPreviousPage}
                  {...{ reading, rows, facts, settings, place, onNearEnd }}
                  onPlace={setPlace}
                  onEnter={() => focusFirst(detail.current)}
                />
              )}
              <p className="mt-2 text-label text-soft" role="status">
                {query.isFetchingNextPage ? 'Fetching more rows …' : ''}
              </p>
            </div>
          )}
          <div ref={detail} className="workbench-detail" role="group" aria-label="What was understood">
            {row && <RowDetail {...shared} row={row} {...{ facts, entryTo }} onDone={() => grid.current?.focus()} />}
            {!row && column && place.row === 0 && <ColumnDetail {...shared} {...{ column, categories }} />}
            {!row && place.row > 0 && <p className="text-soft">Press a row of the file.</p>}
          </div>
        </div>
      </Panel>
    </section>
  );
}

/** Shows the grid and puts the focus on it: at once, or as soon as its rows are there. */
function useGridFocus(show: () => void) {
  const grid = useRef<GridHandle>(null);
  const isWanted = useRef(false);
  const latest = useRef(show);
  latest.current = show;
  const onGrid = useCallback<RefCallback<GridHandle>>((handle) => {
    grid.current = handle;
    if (!handle || !isWanted.current) return;
    isWanted.current = false;
    latest.current();
    handle.focus();
  }, []);
  const focusGrid = () => {
    isWanted.current = grid.current === null;
    show();
    grid.current?.focus();
  };
  return { grid, onGrid, focusGrid };
}

/** Into the first field of what was understood; Enter in the grid leads there. */
function focusFirst(detail: HTMLElement | null): void {
  const field = detail?.querySelector<HTMLElement>('input:not([type="checkbox"]), select, button');
  field?.focus();
  if (field instanceof HTMLInputElement) field.select();
}

/** The place, or the first of the rows where it is none of them. */
function placeAmong(rows: readonly ImportRow[], place: Place): Place {
  const [first] = rows;
  const isThere = place.row === 0 || rows.some(({ sheet, row }) => sheet === place.sheet && row === place.row);
  return isThere || !first ? place : { sheet: first.sheet, row: first.row, col: null };
}

function firstPlace({ firstRows }: Reading): Place {
  const first = firstRows.find(({ outcome }) => outcome !== 'not data') ?? firstRows[0];
  return { sheet: first?.sheet ?? 1, row: first?.row ?? 1, col: null };
}
