import { Fragment, type HTMLAttributes, type ReactNode, type Ref, useId } from 'react';
import { type Narrow, UnderRow, useFolded } from './fold.tsx';

/** One column. `cell` draws a row's cell; `number` aligns figures; `heads` makes it the row's heading; `sortBy` lets DataTable sort. */
export type Column<Row> = {
  id: string;
  header: ReactNode;
  cell: (row: Row, index: number) => ReactNode;
  number?: boolean;
  heads?: boolean;
  /** What to sort by; null stays last either way. */
  sortBy?: (row: Row) => number | string | null;
  /** Tailwind width, such as `w-40`; needed when rows are virtual. */
  width?: string;
  /** On a window as narrow as this the cell stands beneath its row, after the column's name unless `bare`. */
  under?: Narrow | undefined;
  bare?: boolean;
};

export type RowProps = HTMLAttributes<HTMLTableRowElement> & { [data: `data-${string}`]: string | undefined };

export type TableProps<Row> = {
  /** What stands here, said aloud and above the table only when `showCaption`. */
  caption: string;
  showCaption?: boolean;
  rows: readonly Row[];
  columns: readonly Column<Row>[];
  rowKey: (row: Row) => string;
  /** Attributes of a row: `data-strong`, `data-void`. */
  rowProps?: (row: Row) => RowProps;
  /** Sums: the cells of a last row, by column id. */
  foot?: Readonly<Record<string, ReactNode>>;
};

/** A table in its own frame that scrolls sideways when it must. `caption`, `rows`, `columns`, `rowKey`, `rowProps`, `foot`. */
export function Table<Row>(props: TableProps<Row>) {
  const { rows, rowKey, rowProps, foot } = props;
  const shape = useFolded(props.columns);
  const { columns } = shape;
  return (
    <TableFrame {...props}>
      <thead>
        <tr>
          {columns.map((column) => (
            <th key={column.id} scope="col" className={cellClass(column)}>
              {column.header}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row, index) => (
          <Fragment key={rowKey(row)}>
            <tr {...rowProps?.(row)}>
              <Cells row={row} index={index} columns={columns} />
            </tr>
            <UnderRow {...shape} valueOf={(column) => column.cell(row, index)} rowProps={rowProps?.(row)} />
          </Fragment>
        ))}
      </tbody>
      {foot && <Foot {...shape} foot={foot} />}
    </TableFrame>
  );
}

/** The cells of one row, the heading cell as such. */
export function Cells<Row>({ row, index, columns }: { row: Row; index: number; columns: readonly Column<Row>[] }) {
  return columns.map((column) =>
    column.heads ? (
      <th key={column.id} scope="row" className={cellClass(column)}>
        {column.cell(row, index)}
      </th>
    ) : (
      <td key={column.id} className={cellClass(column)}>
        {column.cell(row, index)}
      </td>
    ),
  );
}

/** The row of sums. */
export function Foot<Row>(props: {
  columns: readonly Column<Row>[];
  moved: readonly Column<Row>[];
  foot: Readonly<Record<string, ReactNode>>;
}) {
  const { columns, moved, foot } = props;
  return (
    <tfoot>
      <tr>
        {columns.map((column) => (
          <td key={column.id} className={cellClass(column)}>
            {foot[column.id]}
          </td>
        ))}
      </tr>
      {moved.some(({ id }) => Boolean(foot[id])) && <UnderRow {...props} valueOf={({ id }) => foot[id]} />}
    </tfoot>
  );
}

/** The frame: focusable, so that it scrolls by keyboard, and named by the caption. */
export function TableFrame(props: {
  caption: string;
  showCaption?: boolean;
  children: ReactNode;
  tall?: boolean;
  rowCount?: number;
  frameRef?: Ref<HTMLDivElement>;
}) {
  const id = useId();
  return (
    <div
      ref={props.frameRef}
      role="region"
      aria-labelledby={id}
      tabIndex={0}
      className={`table-frame ${props.tall ? 'table-frame-tall' : ''}`}
    >
      <table className="table" aria-rowcount={props.rowCount}>
        <caption id={id} className={props.showCaption ? 'pb-2 text-left font-[660]' : 'sr-only'}>
          {props.caption}
        </caption>
        {props.children}
      </table>
    </div>
  );
}

export function cellClass<Row>(column: Column<Row>): string {
  return `${column.number ? 'number' : ''} ${column.width ?? ''}`;
}
