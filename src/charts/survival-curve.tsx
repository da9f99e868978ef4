import { curveStepAfter } from '@visx/curve';
import { AreaClosed, LinePath } from '@visx/shape';
import type { Formatter } from '#shared/formatter.ts';
import { ChartFigure } from './chart-figure.tsx';
import { BottomAxis, LeftAxis } from './marks.tsx';
import { SURVIVAL_MARGIN, type SurvivalGroup, survivalLayout } from './survival-layout.ts';

type Props = {
  caption: string;
  /** All together first (its band is drawn), then up to six groups. */
  groups: readonly SurvivalGroup[];
  /** Words under the day axis: `days since listed`. */
  axisLabel: string;
  format: Formatter;
  height?: number;
};

/** Line patterns tell groups apart as well as their labels do. */
const DASHES = ['', '7 3', '2 3', '9 3 2 3', '4 4', '1 2', '12 4'];

/**
 * Share still unsold by day, unsold cars counted rightly: all together with its 95 % band, groups beside it, labelled where
 * they end. `caption`, `groups` (label, n, steps {day, share, low, high}, medianDays), `axisLabel`, `format`, `height` (300).
 */
export function SurvivalCurve({ caption, groups, axisLabel, format, height = 300 }: Props) {
  const table = {
    columns: ['Group', 'Rebuilds', 'Half are sold by', 'Still unsold at the end'],
    rows: groups.map((group) => [
      group.label,
      format.number(group.n),
      group.medianDays === null ? 'not yet' : format.days(group.medianDays),
      format.percent(group.steps.at(-1)?.share ?? 1),
    ]),
  };
  return (
    <ChartFigure caption={caption} table={table}>
      {({ width }) => <Painted {...{ groups, axisLabel, format, height, width }} />}
    </ChartFigure>
  );
}

type Place = { x: number; y: number };
type Band = { x: number; y0: number; y1: number };

function Painted({
  groups,
  axisLabel,
  format,
  height,
  width,
}: Omit<Props, 'caption'> & { height: number; width: number }) {
  const shapes = survivalLayout(groups, { width, height });
  const { left, right, top, bottom } = SURVIVAL_MARGIN;
  const shares = [0, 0.25, 0.5, 0.75, 1].map((value) => ({ value, at: shapes.y(value) }));
  const [all] = shapes.groups;
  return (
    <svg className="chart" height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true">
      {all && (
        <AreaClosed<Band>
          data={all.band}
          x={(d) => d.x}
          y0={(d) => d.y0}
          y1={(d) => d.y1}
          yScale={shapes.y}
          curve={curveStepAfter}
          className="band"
        />
      )}
      <LeftAxis
        scale={shapes.y}
        ticks={shares}
        left={left}
        right={width - right}
        write={(share) => format.percent(share)}
      />
      <BottomAxis
        scale={shapes.x}
        ticks={shapes.dayTicks.filter((tick) => tick.value > 0)}
        top={top}
        bottom={height - bottom}
        write={(day) => format.number(day)}
      />
      <text x={left} y={height - 3} className="soft">
        {axisLabel}
      </text>
      {shapes.groups.map((group, at) => (
        <LinePath<Place>
          key={group.label}
          data={group.line}
          x={(place) => place.x}
          y={(place) => place.y}
          curve={curveStepAfter}
          stroke={at === 0 ? 'var(--color-steel)' : 'var(--color-soft)'}
          strokeWidth={at === 0 ? 2.75 : 1.25}
          strokeDasharray={DASHES[at % DASHES.length] ?? ''}
        />
      ))}
      {shapes.groups.map((group, at) => (
        <g key={group.label}>
          <path
            d={`M${group.end.x + 2} ${group.end.y} L${width - right + 12} ${group.labelY}`}
            stroke="var(--color-primer)"
            fill="none"
          />
          <text x={width - right + 16} y={group.labelY + 4} className={at === 0 ? 'strong gain' : ''}>
            {group.label}
            <tspan className="soft" dx={6}>
              {group.n}
            </tspan>
          </text>
        </g>
      ))}
    </svg>
  );
}
