import { curveStepAfter } from '@visx/curve';
import { AreaClosed, LinePath } from '@visx/shape';
import type { Formatter } from '#shared/formatter.ts';
import { ChartFigure, type ShowTip } from './chart-figure.tsx';
import { freeSpot } from './free-spot.ts';
import { LeftAxis } from './marks.tsx';
import { PointLayer } from './point-layer.tsx';
import { STEP_MARGIN, type StepSeries, stepLineLayout } from './step-line-layout.ts';

type Props = {
  caption: string;
  /** This year. Points are totals after each event, in order of day; `href` opens the rebuild. */
  now: StepSeries;
  /** The year before, dashed; null when there is none. */
  before: StepSeries | null;
  /** Direct labels, such as `this year` and `in 2025`; the total is written before them. */
  nowLabel: string;
  beforeLabel: string;
  format: Formatter;
  height?: number;
};

/**
 * What was kept, added up through the year, in steps; last year dashed behind it. `caption`, `now`, `before` (series: points
 * {on, cents, label, href}, start, end, knownTo), `nowLabel`, `beforeLabel`, `format`, `height` (270 at most; lower where it is narrow).
 */
export function StepLine(props: Props) {
  const { now, before, format, caption } = props;
  const rows = [...(before?.points ?? []), ...now.points].map((point) => [
    format.day(point.on),
    point.label,
    format.money(point.cents),
  ]);
  return (
    <ChartFigure caption={caption} table={{ columns: ['Day', 'What', 'Kept so far'], rows }}>
      {({ width, showTip }) => <Painted {...props} width={width} showTip={showTip} />}
    </ChartFigure>
  );
}

type Place = { x: number; y: number };
/** Width of a letter of a label, roughly, in pixels. */
const LETTER = 7.1;
const x = (place: Place) => place.x;
const y = (place: Place) => place.y;

function Painted({
  now,
  before,
  format,
  width,
  height: most = 270,
  showTip,
  nowLabel,
  beforeLabel,
}: Props & { width: number; showTip: ShowTip }) {
  // A narrow picture that is high as well makes every step look like a cliff.
  const height = Math.min(most, Math.max(250, width * 0.8));
  const shapes = stepLineLayout(now, before, { width, height });
  const total = now.points.at(-1)?.cents ?? 0;
  const end = shapes.now.at(-1);
  return (
    <svg className="chart" height={height} viewBox={`0 0 ${width} ${height}`}>
      <g aria-hidden="true">
        <AreaClosed<Place>
          data={shapes.now}
          x={x}
          y={y}
          yScale={shapes.y.scale}
          y0={shapes.y.scale(0)}
          curve={curveStepAfter}
          className="band"
        />
        <LeftAxis
          scale={shapes.y.scale}
          ticks={shapes.y.ticks}
          left={STEP_MARGIN.left}
          right={width - STEP_MARGIN.right}
          write={format.axisMoney}
        />
        {shapes.months.map((month) => (
          <text key={month.x} x={month.x} y={height - 6} className="soft">
            {month.label}
          </text>
        ))}
        {shapes.before && (
          <LinePath<Place>
            data={shapes.before}
            x={x}
            y={y}
            curve={curveStepAfter}
            stroke="var(--color-primer)"
            strokeWidth={1.75}
            strokeDasharray="4 3"
          />
        )}
        <LinePath<Place>
          data={shapes.now}
          x={x}
          y={y}
          curve={curveStepAfter}
          stroke={total < 0 ? 'var(--color-oxide)' : 'var(--color-steel)'}
          strokeWidth={2.5}
        />
        {end && <circle cx={end.x} cy={end.y} r={4.5} className={total < 0 ? 'loss' : 'gain'} />}
        <EndLabels
          {...{ shapes, width, height, format, nowLabel, beforeLabel }}
          nowCents={total}
          beforeCents={before?.points.at(-1)?.cents ?? null}
        />
      </g>
      <PointLayer
        label="Sales of the year"
        points={shapes.points.map((point) => ({
          ...point,
          key: `${point.on}${point.label}`,
          label: `${point.label}: ${format.money(point.cents)} kept so far`,
        }))}
        showTip={showTip}
      />
    </svg>
  );
}

function EndLabels(props: {
  shapes: ReturnType<typeof stepLineLayout>;
  width: number;
  height: number;
  format: Formatter;
  nowLabel: string;
  nowCents: number;
  beforeLabel: string;
  beforeCents: number | null;
}) {
  const { shapes, width, format, nowCents, beforeCents } = props;
  const end = shapes.now.at(-1);
  const past = shapes.before?.at(-1);
  if (!end) return null;
  const isLeft = end.x > width * 0.45;
  const nowText = `${format.money(nowCents)} ${props.nowLabel}`;
  const pastText = beforeCents === null ? null : `${format.money(beforeCents)} ${props.beforeLabel}`;
  const zero = shapes.y.scale(0);
  const axis = [
    { x: STEP_MARGIN.left, y: zero },
    { x: width - STEP_MARGIN.right, y: zero },
  ];
  const lines = [axis, shapes.now, ...(shapes.before ? [shapes.before] : [])];
  const limits = { top: 13, bottom: props.height - STEP_MARGIN.bottom - 6 };
  const long = nowText.length * LETTER;
  const now = freeSpot(
    isLeft ? { from: end.x + 4 - long, to: end.x + 4 } : { from: end.x + 4, to: end.x + 4 + long },
    end.y - 11,
    lines,
    [],
    limits,
  );
  const right = width - STEP_MARGIN.right;
  const before = pastText
    ? freeSpot({ from: right - pastText.length * LETTER, to: right }, (past?.y ?? end.y) - 9, lines, [now], limits)
    : null;
  return (
    <>
      {before && (
        <text x={right} y={before.y} textAnchor="end" className="soft halo">
          {pastText}
        </text>
      )}
      <text
        x={end.x + 4}
        y={now.y}
        textAnchor={isLeft ? 'end' : 'start'}
        className={`strong halo ${nowCents < 0 ? 'loss' : 'gain'}`}
      >
        {nowText}
      </text>
    </>
  );
}
