import { useId } from 'react';
import type { Formatter } from '#shared/formatter.ts';
import { ChartFigure, type ShowTip } from './chart-figure.tsx';
import { dotStripLayout, type StripRow } from './dot-strip-layout.ts';
import { Strip } from './dot-strip-row.tsx';
import { BottomAxis, Hatch } from './marks.tsx';
import { PointLayer } from './point-layer.tsx';

type Props = { caption: string; rows: readonly StripRow[]; format: Formatter };

/**
 * Where the money runs over: per category each rebuild a dot, locked estimate at zero, a tick at the middle and a line over
 * 8 in 10; at the right the middle in figures and the hatched share that nobody foresaw. Above 300 rebuilds only lines.
 * `caption`, `rows` (label, n, dots {rate, label, href}, middle, low, high, surpriseShare), `format`.
 */
export function DotStrip({ caption, rows, format }: Props) {
  const text = (rate: number | null) => (rate === null ? 'too few' : format.signedPercent(rate));
  const table = {
    columns: ['Category', 'Rebuilds', 'Middle', '8 in 10 from', 'to', 'Surprise share'],
    rows: rows.map((row) => [
      row.label,
      format.number(row.n),
      text(row.middle),
      text(row.low),
      text(row.high),
      row.surpriseShare === null ? '–' : format.percent(row.surpriseShare),
    ]),
  };
  return (
    <ChartFigure caption={caption} table={table}>
      {({ width, showTip }) => <Painted rows={rows} format={format} width={width} showTip={showTip} />}
    </ChartFigure>
  );
}

/** Room above for the words over the figures at the right. */
const HEAD = 20;

function Painted({ rows, format, width, showTip }: Omit<Props, 'caption'> & { width: number; showTip: ShowTip }) {
  const id = useId();
  const isNarrow = width < 560;
  const labelRoom = isNarrow ? 0 : Math.min(200, Math.max(...rows.map((row) => row.label.length)) * 7 + 76);
  const rowHeight = isNarrow ? 58 : 38;
  const figureRoom = isNarrow ? 0 : 148;
  const shapes = dotStripLayout(rows, {
    width,
    labelRoom,
    figureRoom,
    rowHeight,
    stripAt: HEAD + (isNarrow ? 36 : 19),
  });
  const bottom = HEAD + rows.length * rowHeight + 4;
  const points = shapes.rows.flatMap((row) =>
    row.placed.map((dot, at) => ({
      ...dot,
      key: `${row.label}-${at}`,
      label: `${dot.label}, ${row.label}: ${format.signedPercent(dot.rate)}`,
    })),
  );
  return (
    <svg className="chart" height={bottom + 24} viewBox={`0 0 ${width} ${bottom + 24}`}>
      <g aria-hidden="true">
        <defs>
          <Hatch id={id} color="var(--color-oxide)" />
        </defs>
        <BottomAxis
          scale={shapes.scale}
          ticks={shapes.ticks}
          top={HEAD}
          bottom={bottom}
          write={(rate) => (rate === 0 ? (isNarrow ? '0' : 'as estimated') : format.signedPercent(rate))}
        />
        <text x={width - (isNarrow ? 70 : 92)} y={11} textAnchor="end" className="soft">
          middle
        </text>
        <text x={width - (isNarrow ? 60 : 80)} y={11} className="soft">
          surprise
        </text>
        {shapes.rows.map((row) => (
          <Strip key={row.label} row={row} isNarrow={isNarrow} width={width} format={format} hatch={`url(#${id})`} />
        ))}
      </g>
      {points.length > 0 && <PointLayer label="Rebuilds by category" points={points} showTip={showTip} radius={4} />}
    </svg>
  );
}
