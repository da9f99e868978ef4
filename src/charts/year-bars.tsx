import { BarSeries, DataContext, XYChart } from '@visx/xychart';
import { useContext } from 'react';
import type { Formatter } from '#shared/formatter.ts';
import { ChartFigure } from './chart-figure.tsx';

/** One shop year. `note` stands under its name: how many left, or that it still runs. */
export type YearBar = { year: string; cents: number; note: string; isShown: boolean };

type Props = { caption: string; bars: readonly YearBar[]; format: Formatter };

const HEIGHT = 210;
/** Room for a figure above or below a bar, and for the years' names under all of them. */
const FIGURE = 20;
const NAMES = 44;
/** A year takes this much; where there is no room for all, the latest are drawn. */
const YEAR = 56;
/** And no more than this: a bar is not a wall. */
const YEAR_AT_MOST = 150;
const BAND = { type: 'band', paddingInner: 0.4, paddingOuter: 0.2 } as const;
const yearOf = (bar: YearBar) => bar.year;
const centsOf = (bar: YearBar) => bar.cents;

/** What each shop year kept (up) or lost (down), the year that is shown in bold. `caption`, `bars` in order of year, `format`. */
export function YearBars({ caption, bars, format }: Props) {
  const lost = bars.some((bar) => bar.cents < 0);
  const margin = { top: FIGURE, right: 0, bottom: NAMES + (lost ? FIGURE : 0), left: 0 };
  const rows = bars.map((bar) => [bar.year, format.money(bar.cents), bar.note]);
  return (
    <ChartFigure caption={caption} table={{ columns: ['Year', 'Kept', 'Rebuilds'], rows }}>
      {({ width }) => {
        const drawn = bars.slice(-Math.max(1, Math.floor(width / YEAR)));
        return (
          <div className="chart" aria-hidden="true">
            <XYChart
              width={Math.min(width, drawn.length * YEAR_AT_MOST)}
              height={HEIGHT}
              margin={margin}
              xScale={BAND}
              yScale={{ type: 'linear', zero: true }}
              captureEvents={false}
            >
              <BarSeries
                dataKey="kept"
                data={drawn}
                xAccessor={yearOf}
                yAccessor={centsOf}
                colorAccessor={(bar) => (bar.cents < 0 ? 'var(--color-oxide)' : 'var(--color-steel)')}
                enableEvents={false}
              />
              <Words bars={drawn} format={format} />
            </XYChart>
          </div>
        );
      }}
    </ChartFigure>
  );
}

/** The zero line, each bar's figure at its end, and the years under all. */
function Words({ bars, format }: Omit<Props, 'caption'>) {
  const { xScale, yScale, width, height } = useContext(DataContext);
  if (!xScale || !yScale || !('bandwidth' in xScale) || !width || !height) return null;
  const zero = Number(yScale(0));
  const half = xScale.bandwidth() / 2;
  return (
    <g>
      <line x1={0} x2={width} y1={zero} y2={zero} className="zero-line" shapeRendering="crispEdges" />
      {bars.map((bar) => {
        const middle = Number(xScale(bar.year)) + half;
        const end = Number(yScale(bar.cents));
        // Before its bars are known the chart has no place for a year.
        if (!Number.isFinite(middle) || !Number.isFinite(end)) return null;
        return (
          <g
            key={bar.year}
            transform={`translate(${middle} 0)`}
            textAnchor="middle"
            className={bar.isShown ? 'strong' : ''}
          >
            <text y={bar.cents < 0 ? end + 15 : end - 6}>{format.money(bar.cents, 'never')}</text>
            <text y={height - 22}>{bar.year}</text>
            <text y={height - 6} className="soft">
              {bar.note}
            </text>
          </g>
        );
      })}
    </g>
  );
}
