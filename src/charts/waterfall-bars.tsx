import { Bar } from '@visx/shape';
import type { Formatter } from '#shared/formatter.ts';
import { ChartFigure } from './chart-figure.tsx';
import { type WaterfallRow, waterfallLayout } from './waterfall-layout.ts';

const ROW = 27;

/**
 * Where each sale dollar went: from what it sold for, cost by cost, down to what was kept. `caption`, `rows` (label, cents,
 * kind: total | less | kept; costs as positive cents), `format`.
 */
export function WaterfallBars({
  caption,
  rows,
  format,
}: {
  caption: string;
  rows: readonly WaterfallRow[];
  format: Formatter;
}) {
  const write = (row: WaterfallRow) => format.money(row.kind === 'less' ? -row.cents : row.cents);
  return (
    <ChartFigure
      caption={caption}
      table={{ columns: ['Part', 'Amount'], rows: rows.map((row) => [row.label, write(row)]) }}
    >
      {({ width }) => {
        const labelRoom = Math.min(148, Math.max(...rows.map((row) => row.label.length)) * 7 + 10);
        const { bars, zero } = waterfallLayout(rows, { width, labelRoom, figureRoom: 68, rowHeight: ROW });
        const height = rows.length * ROW;
        return (
          <svg className="chart" height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true">
            <line x1={zero} x2={zero} y1={0} y2={height} className="grid-line" />
            {bars.map((bar) => (
              <g key={bar.label}>
                <text
                  x={labelRoom - 9}
                  y={bar.y + ROW / 2 + 4}
                  textAnchor="end"
                  className={bar.kind === 'less' ? 'soft' : 'strong'}
                >
                  {bar.label}
                </text>
                <Bar x={bar.x} y={bar.y + 5} width={bar.width} height={ROW - 10} className={barClass(bar)} />
                <text x={bar.x + bar.width + 6} y={bar.y + ROW / 2 + 4} className={bar.kind === 'less' ? '' : 'strong'}>
                  {write(bar)}
                </text>
              </g>
            ))}
          </svg>
        );
      }}
    </ChartFigure>
  );
}

function barClass(row: WaterfallRow): string {
  if (row.kind === 'total') return 'ink';
  if (row.kind === 'less') return 'quiet';
  return row.cents < 0 ? 'loss' : 'gain';
}
