export type CellTone = 'none' | 'few' | `${'gain' | 'loss'}-${1 | 2 | 3 | 4}`;

/**
 * How strongly a cell is painted: by the size of its value against the largest one that can be said, in four steps.
 * No rebuilds: none. Too few to say: few.
 */
export function cellTone(cell: { value: number | null; n: number }, largest: number): CellTone {
  if (cell.n === 0) return 'none';
  if (cell.value === null) return 'few';
  const share = largest === 0 ? 0 : Math.abs(cell.value) / largest;
  const step = share > 0.75 ? 4 : share > 0.5 ? 3 : share > 0.25 ? 2 : 1;
  return cell.value < 0 ? `loss-${step}` : `gain-${step}`;
}
