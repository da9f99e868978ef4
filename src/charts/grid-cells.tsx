import { Link } from 'react-router-dom';
import type { Formatter } from '#shared/formatter.ts';
import { cellTone } from './cell-tone.ts';

/** One kind of wreck. `value` null with n above 0: too few yet. `low`/`high`: the interval, cents. `href`: its rebuilds. */
export type GridCell = {
  value: number | null;
  low: number | null;
  high: number | null;
  n: number;
  href?: string | undefined;
};

type Props = {
  /** The finding in a sentence. */
  caption: string;
  /** Heading of the corner, for the ear: `Class by damage`. */
  corner: string;
  columns: readonly string[];
  rows: readonly { label: string; cells: readonly GridCell[]; all: GridCell }[];
  /** Margin under each column, in order. */
  columnAll: readonly GridCell[];
  allColumnsLabel: string;
  allRowsLabel: string;
  format: Formatter;
  /** Writes a value and the ends of a range; whole money unless said. */
  write?: ((value: number) => string) | undefined;
  /** What stands after a value: `/h`. */
  unit: string;
};

/**
 * The class × damage grid: value, range and count in each cell, painted by value; gray where too few yet; margins at
 * right and below. It is a real table, so it is its own text form. `caption`, `corner`, `columns`, `rows` (label, cells, all),
 * `columnAll`, `allColumnsLabel`, `allRowsLabel`, `format`, `unit`.
 */
export function GridCells(props: Props) {
  const { caption, corner, columns, rows, columnAll, format, unit } = props;
  const write = props.write ?? ((value: number) => format.money(value, 'never'));
  const all = [...rows.flatMap((row) => [...row.cells, row.all]), ...columnAll];
  const largest = Math.max(0, ...all.map((cell) => Math.abs(cell.value ?? 0)));
  return (
    <div className="table-frame" role="region" aria-label={caption} tabIndex={0}>
      <table className="w-full min-w-max border-separate border-spacing-1 text-label leading-snug">
        <caption className="caption-bottom pt-3 text-left text-body text-soft">
          <span className="grid-caption">{caption}</span>
        </caption>
        <thead>
          <tr>
            <td>
              <span className="sr-only">{corner}</span>
            </td>
            {[...columns, props.allColumnsLabel].map((column) => (
              <th
                key={column}
                scope="col"
                className="px-1.5 py-1 text-left text-body font-[640] first-letter:uppercase"
              >
                {column}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.label}>
              <th
                scope="row"
                className="sticky left-0 bg-sheet py-2 pr-2 text-right text-body font-[640] first-letter:uppercase"
              >
                {row.label}
              </th>
              {row.cells.map((cell, at) => (
                <td
                  key={columns[at]}
                  className={`cell h-[4.75rem] min-w-[4.75rem] align-top tone-${cellTone(cell, largest)}`}
                >
                  <Cell cell={cell} format={format} write={write} unit={unit} />
                </td>
              ))}
              <td className="min-w-20 align-top">
                <Cell cell={row.all} format={format} write={write} unit={unit} isMargin />
              </td>
            </tr>
          ))}
          <tr>
            <th scope="row" className="sticky left-0 bg-sheet py-2 pr-2 text-right text-body font-[640]">
              {props.allRowsLabel}
            </th>
            {columnAll.map((cell, at) => (
              <td key={columns[at]} className="align-top">
                <Cell cell={cell} format={format} write={write} unit={unit} isMargin />
              </td>
            ))}
            <td />
          </tr>
        </tbody>
      </table>
    </div>
  );
}

function Cell({
  cell,
  format,
  write,
  unit,
  isMargin = false,
}: {
  cell: GridCell;
  format: Formatter;
  write: (value: number) => string;
  unit: string;
  isMargin?: boolean;
}) {
  if (cell.n === 0) return <span className="sr-only">no rebuilds</span>;
  const count = format.count(cell.n, 'rebuild');
  const body =
    cell.value === null ? (
      <>
        <span className={isMargin ? 'block text-body font-[680]' : 'block pt-1'}>
          {isMargin ? 'too few yet' : count}
        </span>
        <span className="block">{isMargin ? count : 'too few yet'}</span>
      </>
    ) : (
      <>
        <span className="block whitespace-nowrap tabular-nums">
          <span className={`font-[700] ${isMargin ? 'text-body' : 'text-[1.25rem] leading-tight font-stretch-110%'}`}>
            {write(cell.value)}
          </span>{' '}
          {unit}
        </span>
        {cell.low !== null && cell.high !== null && (
          <span className="block whitespace-nowrap tabular-nums">
            {write(cell.low)} to {write(cell.high)}
          </span>
        )}
        <span className={isMargin ? 'block text-soft' : 'block'}>{count}</span>
      </>
    );
  const frame = 'block h-full px-1.5 py-1.5';
  if (!cell.href) return <span className={frame}>{body}</span>;
  return (
    <Link to={cell.href} className={`${frame} text-inherit no-underline hover:underline`}>
      {body}
    </Link>
  );
}
