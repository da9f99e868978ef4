import type { Formatter } from '#shared/formatter.ts';
import { ChartFigure } from './chart-figure.tsx';
import { BottomAxis } from './marks.tsx';
import { type RangeRow, rangeLinesLayout } from './range-lines-layout.ts';

/**
 * One line per group (damage type): what happened from the 10th to the 90th percentile, and a tick at the group's own figure.
 * `caption`, `rows` (label, n, low, high, value, note: `add 29%` or `too few yet: use 24%`), `format`.
 */
export function RangeLines({
  caption,
  rows,
  format,
}: {
  caption: string;
  rows: readonly RangeRow[];
  format: Formatter;
}) {
  const text = (rate: number | null) => (rate === null ? '–' : format.signedPercent(rate));
  const table = {
    columns: ['Group', 'Rebuilds', '8 in 10 from', 'to', 'Figure'],
    rows: rows.map((row) => [row.label, format.number(row.n), text(row.low), text(row.high), row.note]),
  };
  return (
    <ChartFigure caption={caption} table={table}>
      {({ width }) => <Painted rows={rows} format={format} width={width} />}
    </ChartFigure>
  );
}

function Painted({ rows, format, width }: { rows: readonly RangeRow[]; format: Formatter; width: number }) {
  const isNarrow = width < 460;
  const labelRoom = isNarrow ? 0 : Math.max(...rows.map((row) => row.label.length)) * 7 + 92;
  const rowHeight = isNarrow ? 46 : 32;
  const noteRoom = isNarrow ? 12 : Math.max(...rows.map((row) => row.note.length)) * 6.6 + 14;
  const shapes = rangeLinesLayout(rows, { width, labelRoom, rowHeight, lineAt: isNarrow ? 30 : 16, noteRoom });
  const bottom = rows.length * rowHeight;
  return (
    <svg className="chart" height={bottom + 24} viewBox={`0 0 ${width} ${bottom + 24}`} aria-hidden="true">
      <BottomAxis
        scale={shapes.axis.scale}
        ticks={shapes.axis.ticks}
        top={0}
        bottom={bottom}
        write={(rate) => (rate === 0 ? '0' : format.signedPercent(rate))}
      />
      {shapes.rows.map((row) => (
        <g key={row.label}>
          {isNarrow && <rect x={0} y={row.y - 27} width={width} height={18} className="ground" />}
          <text x={0} y={isNarrow ? row.y - 13 : row.y + 4} className="halo">
            <tspan className="strong">{row.label}</tspan>
            <tspan className="soft" dx={8}>
              {format.count(row.n, 'rebuild')}
            </tspan>
          </text>
          {row.lowX !== null && row.highX !== null && (
            <rect x={row.lowX} y={row.y - 1.5} width={Math.max(1, row.highX - row.lowX)} height={3} className="quiet" />
          )}
          {row.valueX !== null && (
            <rect
              x={row.valueX - 3}
              y={row.y - 9}
              width={6}
              height={18}
              className="gain"
              stroke="var(--color-sheet)"
              strokeWidth={1.25}
            />
          )}
          <text
            x={isNarrow ? width : row.noteX}
            y={isNarrow ? row.y - 13 : row.y + 4}
            textAnchor={isNarrow ? 'end' : 'start'}
            className={row.value === null ? 'soft halo' : 'strong gain halo'}
          >
            {row.note}
          </text>
        </g>
      ))}
    </svg>
  );
}
