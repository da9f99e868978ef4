import { AreaClosed, Bar, LinePath } from '@visx/shape';
import type { Formatter } from '#shared/formatter.ts';
import { BACK_TEST_MARGIN, type BackTestBar, backTestLayout, ruleRuns } from './back-test-layout.ts';
import { ChartFigure, type ShowTip } from './chart-figure.tsx';
import { LeftAxis } from './marks.tsx';
import { PointLayer } from './point-layer.tsx';

type Props = { caption: string; bars: readonly BackTestBar[]; format: Formatter; height?: number };

/**
 * Each rebuild against the rule it would have had at the time: bars over (up) or under (down) the locked estimate, the rule
 * as a stepped band; short ones in rust with what they were short by; grey before a rule could be set. The last 300 are drawn.
 * `caption`, `bars` (label, href, year, rate, ruleRate, shortCents), `format`, `height` (290).
 */
export function BackTestBars({ caption, bars, format, height = 290 }: Props) {
  const table = {
    columns: ['Rebuild', 'Left in', 'Over or under', 'Rule at the time', 'Short by'],
    rows: bars.map((bar) => [
      bar.label,
      String(bar.year),
      format.signedPercent(bar.rate),
      bar.ruleRate === null ? 'too few yet' : format.percent(bar.ruleRate, 1),
      bar.shortCents ? format.money(bar.shortCents) : '–',
    ]),
  };
  return (
    <ChartFigure caption={caption} table={table}>
      {({ width, showTip }) => <Painted {...{ bars, format, height, width, showTip }} />}
    </ChartFigure>
  );
}

type Place = { x: number; y: number };
const x = (place: Place) => place.x;
const y = (place: Place) => place.y;

function Painted({
  bars,
  format,
  height,
  width,
  showTip,
}: Omit<Props, 'caption'> & { height: number; width: number; showTip: ShowTip }) {
  const shapes = backTestLayout(bars, { width, height }, (cents) => format.money(cents));
  const { left, right, bottom } = BACK_TEST_MARGIN;
  const zero = shapes.y.scale(0);
  const runs = ruleRuns(shapes.bars, shapes.slot);
  const points = shapes.bars.map((bar, at) => ({
    key: `${bar.label}-${at}`,
    x: bar.middle,
    y: bar.rate < 0 ? zero + bar.height : bar.y,
    href: bar.href,
    label: wordsOf(bar, format),
  }));
  return (
    <svg className="chart" height={height} viewBox={`0 0 ${width} ${height}`}>
      <g aria-hidden="true">
        {runs.map((run) => (
          <AreaClosed<Place>
            key={run[0]?.x}
            data={run}
            x={x}
            y={y}
            y0={zero}
            yScale={shapes.y.scale}
            className="band"
          />
        ))}
        <LeftAxis
          scale={shapes.y.scale}
          ticks={shapes.y.ticks}
          left={left}
          right={width - right}
          write={(rate) => (rate === 0 ? '0' : format.signedPercent(rate))}
        />
        {shapes.bars.map((bar, at) => (
          <Bar
            key={`${bar.label}-${at}`}
            x={bar.middle - shapes.barWidth / 2}
            y={bar.rate < 0 ? zero : bar.y}
            width={shapes.barWidth}
            height={Math.max(1, bar.height)}
            className={barClass(bar)}
          />
        ))}
        <line x1={left} x2={width - right} y1={zero} y2={zero} className="zero-line" shapeRendering="crispEdges" />
        {runs.map((run) => (
          <LinePath<Place> key={run[0]?.x} data={run} x={x} y={y} stroke="var(--color-steel)" strokeWidth={2} />
        ))}
        {shapes.labels.map((label) => (
          <text key={label.x} x={label.x} y={label.y} textAnchor="middle" className="strong loss halo">
            {label.text}
          </text>
        ))}
        {shapes.years.map((mark) => (
          <text key={mark.year} x={mark.x} y={height - bottom + 19} className="soft">
            {mark.year}
          </text>
        ))}
      </g>
      {points.length > 0 && (
        <PointLayer label="Rebuilds in order of sale" points={points} showTip={showTip} radius={5} />
      )}
    </svg>
  );
}

type Drawn = ReturnType<typeof backTestLayout>['bars'][number];

function barClass(bar: Drawn): string {
  if (bar.ruleRate === null) return 'quiet';
  return bar.isShort ? 'loss' : 'gain';
}

function wordsOf(bar: Drawn, format: Formatter): string {
  const rule = bar.ruleRate === null ? 'too few before it to set a rule' : `rule ${format.percent(bar.ruleRate)}`;
  const outcome =
    bar.ruleRate === null ? '' : bar.isShort ? `, short by ${format.money(bar.shortCents ?? 0)}` : ', covered';
  return `${bar.label}: ${format.signedPercent(bar.rate)}, ${rule}${outcome}`;
}
