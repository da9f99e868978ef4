import { useId } from 'react';
import type { Formatter } from '#shared/formatter.ts';
import { type GapBarData, type GapPart, gapBarLayout } from './gap-bar-layout.ts';
import { Hatch } from './marks.tsx';

type Props = GapBarData & {
  /** Over (+) or under (−) the locked estimate as a fraction, finished; null: not known. */
  overrunRate: number | null;
  format: Formatter;
  /** Amount at the right end, to compare bars by length; left out, the outline is the same length in every row. */
  maxCents?: number;
  width?: number;
  height?: number;
  hideLabel?: boolean;
};

/** Room beyond the outline when every row has its own scale. */
const ROOM = 1.5;

/**
 * The gap bar, our one sign: outline = locked estimate, solid ink = spent as foreseen, rust beyond the outline = over,
 * hatch = surprise, white inside = under. `lockedCents`, `foreseenCents`, `surpriseCents`, `overrunRate`, `format`,
 * `maxCents`, `width` (96), `height` (14), `hideLabel`.
 */
export function GapBar({ overrunRate, format, maxCents, width = 96, height = 14, hideLabel, ...data }: Props) {
  const id = useId();
  const full = maxCents ?? (data.lockedCents ?? data.foreseenCents + data.surpriseCents) * ROOM;
  const shapes = gapBarLayout(data, { width: width - 2, maxCents: full });
  const tone = overrunRate === null || overrunRate <= 0 ? 'text-soft' : 'text-oxide';
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap">
      <svg
        width={width}
        height={height}
        role="img"
        aria-label={words(data, format)}
        className="chart flex-none"
        style={{ width }}
      >
        <defs>
          <Hatch id={`${id}-ink`} color="var(--color-ink)" />
          <Hatch id={`${id}-over`} color="var(--color-oxide)" />
        </defs>
        {shapes.parts.map((part) => (
          <rect
            key={`${part.kind}-${part.isOver}`}
            x={part.from + (part.isOver ? 3 : 2)}
            y={3}
            width={Math.max(1, part.to - part.from - (part.isOver ? 1 : 2))}
            height={height - 6}
            fill={fillOf(part, id)}
          />
        ))}
        {shapes.outline !== null && (
          <rect
            x={0.75}
            y={0.75}
            width={Math.max(1, shapes.outline)}
            height={height - 1.5}
            fill="none"
            stroke="var(--color-ink)"
            strokeWidth={1.25}
          />
        )}
        {shapes.isCut && (
          <path
            d={`M${width - 7} 1 l4 ${height / 2 - 1} l-4 ${height / 2 - 1}`}
            fill="none"
            stroke="var(--color-sheet)"
            strokeWidth={3}
          />
        )}
      </svg>
      {!hideLabel && (
        <span aria-hidden="true" className={`text-label font-[620] tabular-nums ${tone}`}>
          {overrunRate === null ? 'no estimate' : format.signedPercent(overrunRate)}
        </span>
      )}
    </span>
  );
}

function fillOf(part: GapPart, id: string): string {
  if (part.kind === 'surprise') return `url(#${id}-${part.isOver ? 'over' : 'ink'})`;
  return part.isOver ? 'var(--color-oxide)' : 'var(--color-ink)';
}

function words(data: GapBarData, format: Formatter): string {
  const spent = data.foreseenCents + data.surpriseCents;
  const surprise = data.surpriseCents > 0 ? `; ${format.money(data.surpriseCents)} of it surprises` : '';
  if (data.lockedCents === null) return `No locked estimate; spent ${format.money(spent)}${surprise}`;
  const gap = spent - data.lockedCents;
  const outcome = gap === 0 ? 'as planned' : `${format.money(Math.abs(gap))} ${gap > 0 ? 'over' : 'under'}`;
  return `Planned ${format.money(data.lockedCents)}, spent ${format.money(spent)}: ${outcome}${surprise}`;
}
