import { AxisBottom, AxisLeft } from '@visx/axis';
import type { scaleLinear } from '@visx/scale';

type Scale = ReturnType<typeof scaleLinear<number>>;
type Tick = { value: number; at: number };

/** Diagonal lines: a surprise. `id` names the pattern, `color` is a CSS colour. */
export function Hatch({ id, color }: { id: string; color: string }) {
  return (
    <pattern id={id} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      <rect width="5" height="5" fill="var(--color-sheet)" />
      <rect width="2.4" height="5" fill={color} />
    </pattern>
  );
}

/** Money or percent up the left side, with hairlines across; zero is drawn in ink. */
export function LeftAxis(props: {
  scale: Scale;
  ticks: readonly Tick[];
  left: number;
  right: number;
  write: (value: number) => string;
}) {
  const { scale, ticks, left, right, write } = props;
  return (
    <g>
      {ticks.map(({ value, at }) => (
        <line
          key={value}
          x1={left}
          x2={right}
          y1={at}
          y2={at}
          className={value === 0 ? 'zero-line' : 'grid-line'}
          shapeRendering="crispEdges"
        />
      ))}
      <AxisLeft
        scale={scale}
        left={left}
        tickValues={ticks.map((tick) => tick.value)}
        tickFormat={(value) => write(Number(value))}
        hideAxisLine
        hideTicks
        tickLabelProps={{
          className: 'soft',
          textAnchor: 'end',
          dx: -2,
          dy: 4,
          fontSize: 12.5,
          fontFamily: 'inherit',
          fill: '',
        }}
      />
    </g>
  );
}

/** Figures along the bottom, with hairlines up; zero is drawn in ink. */
export function BottomAxis(props: {
  scale: Scale;
  ticks: readonly Tick[];
  top: number;
  bottom: number;
  write: (value: number) => string;
}) {
  const { scale, ticks, top, bottom, write } = props;
  return (
    <g>
      {ticks.map(({ value, at }) => (
        <line
          key={value}
          x1={at}
          x2={at}
          y1={top}
          y2={bottom}
          className={value === 0 ? 'zero-line' : 'grid-line'}
          shapeRendering="crispEdges"
        />
      ))}
      <AxisBottom
        scale={scale}
        top={bottom}
        tickValues={ticks.map((tick) => tick.value)}
        tickFormat={(value) => write(Number(value))}
        hideAxisLine
        hideTicks
        tickLabelProps={{
          className: 'soft',
          textAnchor: 'middle',
          dy: 2,
          fontSize: 12.5,
          fontFamily: 'inherit',
          fill: '',
        }}
      />
    </g>
  );
}
