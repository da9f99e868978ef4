import { useId } from 'react';
import type { Formatter } from '#shared/formatter.ts';
import { ChartFigure, type ShowTip } from './chart-figure.tsx';
import { dotStripLayout, type StripRow } from './dot-strip-layout.ts';
import { BottomAxis, Hatch } from './marks.tsx';
import { PointLayer } from './point-layer.tsx';

type Props = { caption: string; rows: readonly StripRow[]; format: Formatter };

/**
 * Where the money runs over: per category each rebuild a dot, locked estimate at zero, a tick at the middle and a line over
 * 8 in 10; at the right the middle in figures and the hatched share that nobody foresaw. Above 300 dots only lines.
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

function Painted({ rows, format, width, showTip }: Omit<Props, 'caption'> & { width: number; showTip: ShowTip }) {
  const id = useId();
  const isNarrow = width < 560;
  const labelRoom = isNarrow ? 0 : Math.min(200, Math.max(...rows.map((row) => row.label.length)) * 7 + 76);
  const rowHeight = isNarrow ? 58 : 38;
  const figureRoom = isNarrow ? 0 : 148;
  const shapes = dotStripLayout(rows, { width, labelRoom, figureRoom, rowHeight, stripAt: isNarrow ? 40 : 19 });
  const bottom = rows.length * rowHeight + 4;
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
          top={isNarrow ? 28 : 0}
          bottom={bottom}
          write={(rate) => (rate === 0 ? (isNarrow ? '0' : 'as estimated') : format.signedPercent(rate))}
        />
        {shapes.rows.map((row) => (
          <Strip key={row.label} row={row} isNarrow={isNarrow} width={width} format={format} hatch={`url(#${id})`} />
        ))}
      </g>
      {points.length > 0 && <PointLayer label="Rebuilds by category" points={points} showTip={showTip} radius={4} />}
    </svg>
  );
}

type StripShape = ReturnType<typeof dotStripLayout>['rows'][number];

function Strip(props: { row: StripShape; isNarrow: boolean; width: number; format: Formatter; hatch: string }) {
  const { row, isNarrow, width, format, hatch } = props;
  const textY = isNarrow ? row.y - 20 : row.y + 4;
  const isOver = (row.middle ?? 0) > 0;
  const tone = row.middle === null || row.middle === 0 ? 'soft' : isOver ? 'loss' : 'gain';
  const middleText = row.middle === null ? 'too few yet' : format.signedPercent(row.middle);
  return (
    <g>
      <text x={0} y={textY} className="halo">
        <tspan className="strong">{row.label}</tspan>
        <tspan className="soft" dx={7}>
          {row.n}
        </tspan>
      </text>
      {row.lowX !== null && row.highX !== null && (
        <rect x={row.lowX} y={row.y - 1.5} width={Math.max(1, row.highX - row.lowX)} height={3} className="quiet" />
      )}
      {row.placed.map((dot, at) => (
        <Dot key={`${dot.label}-${at}`} {...dot} />
      ))}
      {row.middleX !== null && (
        <rect
          x={row.middleX - 2.5}
          y={row.y - 12}
          width={5}
          height={24}
          className={tone}
          stroke="var(--color-sheet)"
          strokeWidth={1.25}
        />
      )}
      <text x={isNarrow ? width - 70 : width - 92} y={textY} textAnchor="end" className={`strong halo ${tone}`}>
        {middleText}
      </text>
      {row.surpriseShare !== null && (
        <g transform={`translate(${width - (isNarrow ? 60 : 80)} ${textY - 9})`}>
          <rect x={0} y={0} width={30 * row.surpriseShare} height={10} fill={hatch} />
          <rect x={0} y={0} width={30} height={10} fill="none" stroke="var(--color-edge)" />
          <text x={35} y={9} className="soft">
            {format.percent(row.surpriseShare)}
          </text>
        </g>
      )}
    </g>
  );
}

function Dot({ x, y, rate, isCut }: { x: number; y: number; rate: number; isCut: boolean }) {
  if (isCut) {
    const way = rate > 0 ? 1 : -1;
    return (
      <path
        d={`M${x - 4 * way} ${y - 4} L${x + 3 * way} ${y} L${x - 4 * way} ${y + 4}`}
        fill="none"
        stroke="var(--color-oxide)"
        strokeWidth={2}
      />
    );
  }
  return (
    <circle
      cx={x}
      cy={y}
      r={3.25}
      fill="var(--color-sheet)"
      stroke={rate > 0 ? 'var(--color-oxide)' : 'var(--color-steel)'}
      strokeWidth={1.5}
    />
  );
}
