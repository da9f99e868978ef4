import { type ReactNode, useState } from 'react';
import { useWidth } from './use-width.ts';

/** The rows behind a picture, as text. Columns from the second on are figures. */
export type ChartTable = { columns: readonly string[]; rows: readonly (readonly string[])[] };

export type Tip = { x: number; y: number; text: string };
export type ShowTip = (tip: Tip | null) => void;

type Props = {
  /** The finding, in one sentence: read aloud, and printed under the picture. */
  caption: string;
  table: ChartTable;
  children: (size: { width: number; showTip: ShowTip }) => ReactNode;
};

/**
 * The frame of every chart: the picture at the width it has, its finding as a sentence, and its figures as a table one key
 * away. Pages use the charts, not this.
 */
export function ChartFigure({ caption, table, children }: Props) {
  const [ref, width] = useWidth<HTMLDivElement>();
  const [tip, showTip] = useState<Tip | null>(null);
  return (
    <figure className="grid min-w-0 gap-3">
      <div ref={ref} className="relative min-h-10 min-w-0">
        {width !== null && children({ width, showTip })}
        {tip && width !== null && <TipBox tip={tip} width={width} />}
      </div>
      <figcaption className="text-soft">{caption}</figcaption>
      <details className="no-print min-w-0">
        <summary className="inline-block min-h-6 text-label text-soft underline underline-offset-3">As a table</summary>
        <TextTable caption={caption} table={table} />
      </details>
    </figure>
  );
}

function TextTable({ caption, table }: { caption: string; table: ChartTable }) {
  return (
    <div className="table-frame mt-2" tabIndex={0} role="region" aria-label={`As a table: ${caption}`}>
      <table className="table">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            {table.columns.map((column, at) => (
              <th key={column} scope="col" className={at > 0 ? 'number' : ''}>
                {column}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row, line) => (
            <tr key={`${row[0]}-${line}`}>
              {row.map((text, at) => (
                <td key={table.columns[at]} className={at > 0 ? 'number' : ''}>
                  {text}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** Names the point under the pointer or focus. The point itself carries the same words for the ear. */
function TipBox({ tip, width }: { tip: Tip; width: number }) {
  const isRight = tip.x > width / 2;
  const place = isRight ? { right: width - tip.x + 10 } : { left: tip.x + 10 };
  return (
    <div className="chart-tip no-print" aria-hidden="true" style={{ ...place, top: tip.y - 14 }}>
      {tip.text}
    </div>
  );
}
