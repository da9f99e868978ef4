import { type KeyboardEvent, useRef, useState } from 'react';
import { Link } from 'react-router-dom';
import type { ShowTip } from './chart-figure.tsx';

/** A place on a chart that stands for a rebuild: said and shown as `label`, opened at `href`. */
export type ChartPoint = { key: string; x: number; y: number; label: string; href?: string | undefined };

type Props = { label: string; points: readonly ChartPoint[]; showTip: ShowTip; radius?: number };

const STEPS: Record<string, (at: number, last: number) => number> = {
  ArrowRight: (at, last) => Math.min(at + 1, last),
  ArrowDown: (at, last) => Math.min(at + 1, last),
  ArrowLeft: (at) => Math.max(at - 1, 0),
  ArrowUp: (at) => Math.max(at - 1, 0),
  Home: () => 0,
  End: (_, last) => last,
};

/** Invisible places over the painted marks: one stop for Tab, arrows move between them, Enter opens. */
export function PointLayer({ label, points, showTip, radius = 5 }: Props) {
  const [active, setActive] = useState(0);
  const group = useRef<SVGGElement>(null);
  const current = Math.min(active, points.length - 1);
  const onKeyDown = (event: KeyboardEvent) => {
    const next = STEPS[event.key]?.(current, points.length - 1);
    if (next === undefined) return;
    event.preventDefault();
    setActive(next);
    group.current?.querySelectorAll<SVGAElement>('.chart-point')[next]?.focus();
  };
  return (
    <g ref={group} role="group" aria-label={`${label}: arrow keys move, Enter opens`} onKeyDown={onKeyDown}>
      {points.map((point, at) => {
        const show = () => showTip({ x: point.x, y: point.y, text: point.label });
        const props = {
          className: 'chart-point',
          tabIndex: at === current ? 0 : -1,
          'aria-label': point.label,
          onPointerEnter: show,
          onPointerLeave: () => showTip(null),
          onFocus: () => {
            setActive(at);
            show();
          },
          onBlur: () => showTip(null),
        };
        const shapes = (
          <>
            <circle className="chart-hit" cx={point.x} cy={point.y} r={Math.max(radius, 12)} />
            <circle className="chart-ring" cx={point.x} cy={point.y} r={radius + 2} />
          </>
        );
        return point.href ? (
          <Link key={point.key} to={point.href} {...props}>
            {shapes}
          </Link>
        ) : (
          <g key={point.key} role="img" {...props}>
            {shapes}
          </g>
        );
      })}
    </g>
  );
}
