import { LinePath } from '@visx/shape';
import type { Formatter } from '#shared/formatter.ts';
import { ChartFigure, type ShowTip } from './chart-figure.tsx';
import { GRADE_MARGIN, type Grade, gradeLineLayout } from './grade-line-layout.ts';
import { LeftAxis } from './marks.tsx';
import { PointLayer } from './point-layer.tsx';

type Props = { caption: string; grades: readonly Grade[]; format: Formatter; height?: number };

/**
 * How often each rule held, as a line of grades: a dot for the share held, a line for its interval, a dash for the share it
 * was set to hold. `caption`, `grades` (label, note, href, share, rate, low, high), `format`, `height` (240).
 */
export function GradeLine({ caption, grades, format, height = 240 }: Props) {
  const text = (rate: number | null) => (rate === null ? '–' : format.percent(rate));
  const table = {
    columns: ['Rule', 'Held', 'Share', 'Could be from', 'to', 'Set to hold'],
    rows: grades.map((one) => [
      one.label,
      one.note,
      text(one.rate),
      text(one.low),
      text(one.high),
      format.percent(one.share),
    ]),
  };
  return (
    <ChartFigure caption={caption} table={table}>
      {({ width, showTip }) => <Painted {...{ grades, format, height, width, showTip }} />}
    </ChartFigure>
  );
}

type Sized = Omit<Props, 'caption'> & { height: number; width: number; showTip: ShowTip };
type Place = { x: number; y: number };

function Painted({ grades, format, height, width, showTip }: Sized) {
  const shapes = gradeLineLayout(grades, { width, height });
  const { left, right, bottom } = GRADE_MARGIN;
  const points = shapes.grades.map((one) => ({
    key: one.label,
    x: one.x,
    y: one.rateY ?? one.shareY,
    href: one.href,
    label: `${one.label}: ${one.note}, set to hold ${format.percent(one.share)}`,
  }));
  return (
    <svg className="chart" height={height} viewBox={`0 0 ${width} ${height}`}>
      <g aria-hidden="true">
        <LeftAxis
          scale={shapes.y}
          ticks={shapes.ticks}
          left={left}
          right={width - right}
          write={(share) => format.percent(share)}
        />
        <LinePath<Place>
          data={shapes.line}
          x={(place) => place.x}
          y={(place) => place.y}
          stroke="var(--color-primer)"
          strokeWidth={1.5}
        />
        {shapes.grades.map((one) => (
          <g key={one.label}>
            {one.lowY !== null && one.highY !== null && (
              <rect
                x={one.x - 1.5}
                y={one.highY}
                width={3}
                height={Math.max(1, one.lowY - one.highY)}
                className="quiet"
              />
            )}
            <rect x={one.x - shapes.dash / 2} y={one.shareY - 1.25} width={shapes.dash} height={2.5} className="ink" />
            {one.rateY !== null && (
              <circle cx={one.x} cy={one.rateY} r={5} className="gain" stroke="var(--color-sheet)" strokeWidth={1.25} />
            )}
            <text x={one.x} y={height - bottom + 20} textAnchor="middle" className="strong">
              {one.label}
            </text>
            <text x={one.x} y={height - bottom + 37} textAnchor="middle" className="soft">
              {one.note}
            </text>
          </g>
        ))}
      </g>
      <PointLayer label="Rules by year" points={points} showTip={showTip} radius={6} />
    </svg>
  );
}
