import type { Formatter } from '#shared/formatter.ts';
import type { dotStripLayout } from './dot-strip-layout.ts';

type StripShape = ReturnType<typeof dotStripLayout>['rows'][number];

/** One category: its name and count, its spread, its dots, its middle, and at the right both in figures. */
export function Strip(props: { row: StripShape; isNarrow: boolean; width: number; format: Formatter; hatch: string }) {
  const { row, isNarrow, width, format, hatch } = props;
  const textY = isNarrow ? row.y - 20 : row.y + 4;
  const isOver = (row.middle ?? 0) > 0;
  const tone = row.middle === null || row.middle === 0 ? 'soft' : isOver ? 'loss' : 'gain';
  const middleText = row.middle === null ? 'too few yet' : format.signedPercent(row.middle);
  return (
    <g>
      {isNarrow && <rect x={0} y={textY - 13} width={width} height={18} className="ground" />}
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
      <text
        x={isNarrow ? width - 70 : width - 92}
        y={textY}
        textAnchor="end"
        className={`halo ${row.middle === null ? '' : 'strong'} ${tone}`}
      >
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
        stroke={rate > 0 ? 'var(--color-oxide)' : 'var(--color-steel)'}
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
