import { createSortedRowModel, rowSortingFeature, sortFn_basic, tableFeatures, useTable } from '@tanstack/react-table';
import { useVirtualizer } from '@tanstack/react-virtual';
import { Fragment, useMemo, useRef } from 'react';
import { UnderRow, useFolded } from './fold.tsx';
import { Cells, type Column, cellClass, Foot, TableFrame, type TableProps } from './table.tsx';

const features = tableFeatures({
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
  sortFns: { basic: sortFn_basic },
});

/** From this many rows on, only those in view are drawn. */
const VIRTUAL_FROM = 200;
const ROW_HEIGHT = 39;
const FOLDED_ROW_HEIGHT = 84;

type Sort = { column: string; down: boolean };

/**
 * A table that sorts by a press on a heading and draws only what is in view above 200 rows (give columns a `width` then).
 * Props of Table, and `sort` (column, down) to start with; `onSort` to keep it in the address. Keep `columns` and `rows` stable.
 */
export function DataTable<Row extends object>(
  props: TableProps<Row> & { sort?: Sort; onSort?: (sort: Sort | null) => void },
) {
  const { rows, columns, rowKey, rowProps, foot, sort, onSort } = props;
  const shape = useFolded(columns);
  const frame = useRef<HTMLDivElement>(null);
  const table = useTable({
    features,
    data: rows as Row[],
    columns: useMemo(
      () =>
        columns.map((column) => ({
          id: column.id,
          accessorFn: (row: Row) => column.sortBy?.(row) ?? undefined,
          enableSorting: column.sortBy !== undefined,
          sortFn: 'basic' as const,
          sortUndefined: 'last' as const,
        })),
      [columns],
    ),
    initialState: { sorting: sort ? [{ id: sort.column, desc: sort.down }] : [] },
  });
  const ordered = table.getRowModel().rows;
  const isVirtual = ordered.length > VIRTUAL_FROM;
  const virtual = useVirtualizer({
    count: isVirtual ? ordered.length : 0,
    getScrollElement: () => frame.current,
    estimateSize: () => (shape.moved.length === 0 ? ROW_HEIGHT : FOLDED_ROW_HEIGHT),
    overscan: 6,
  });
  const window = virtual.getVirtualItems();
  const first = isVirtual ? (window[0]?.index ?? 0) : 0;
  const shown = isVirtual ? ordered.slice(first, (window.at(-1)?.index ?? -1) + 1) : ordered;
  const after = isVirtual ? virtual.getTotalSize() - (window.at(-1)?.end ?? 0) : 0;

  const onPress = (id: string) => {
    const column = table.getColumn(id);
    column?.toggleSorting(column.getIsSorted() === false ? undefined : column.getIsSorted() === 'asc');
    const next = table.state.sorting[0];
    onSort?.(next ? { column: next.id, down: next.desc } : null);
  };

  return (
    <TableFrame {...props} tall={isVirtual} frameRef={frame} {...(isVirtual ? { rowCount: ordered.length + 1 } : {})}>
      <SortHead
        columns={shape.columns}
        directionOf={(id) => table.getColumn(id)?.getIsSorted() ?? false}
        onPress={onPress}
      />
      <tbody>
        {first > 0 && <Spacer height={window[0]?.start ?? 0} span={shape.columns.length} />}
        {shown.map((row, at) => (
          <Fragment key={rowKey(row.original)}>
            <tr aria-rowindex={isVirtual ? first + at + 2 : undefined} {...rowProps?.(row.original)}>
              <Cells row={row.original} index={first + at} columns={shape.columns} />
            </tr>
            <UnderRow
              {...shape}
              valueOf={(column) => column.cell(row.original, first + at)}
              rowProps={rowProps?.(row.original)}
            />
          </Fragment>
        ))}
        {after > 0 && <Spacer height={after} span={shape.columns.length} />}
      </tbody>
      {foot && <Foot {...shape} foot={foot} />}
    </TableFrame>
  );
}

type Direction = false | 'asc' | 'desc';

function SortHead<Row>(props: {
  columns: readonly Column<Row>[];
  directionOf: (id: string) => Direction;
  onPress: (id: string) => void;
}) {
  return (
    <thead>
      <tr>
        {props.columns.map((column) => {
          const direction = props.directionOf(column.id);
          return (
            <th key={column.id} scope="col" className={cellClass(column)} aria-sort={ariaSort(direction)}>
              {column.sortBy ? (
                <button type="button" className="table-sort" onClick={() => props.onPress(column.id)}>
                  {column.header}
                  {direction && <span aria-hidden="true">{direction === 'asc' ? '▲' : '▼'}</span>}
                </button>
              ) : (
                column.header
              )}
            </th>
          );
        })}
      </tr>
    </thead>
  );
}

/** Stands for the rows that are not drawn. */
function Spacer({ height, span }: { height: number; span: number }) {
  return (
    <tr aria-hidden="true">
      <td colSpan={span} style={{ height, padding: 0, border: 0 }} />
    </tr>
  );
}

function ariaSort(direction: Direction): 'ascending' | 'descending' | undefined {
  return direction === false ? undefined : direction === 'asc' ? 'ascending' : 'descending';
}
