import type { Aside, Meaning } from '#shared/contracts/import-reading.ts';
import type { AsideReason } from '#shared/contracts/import-words.ts';
import type { Plan, RowRead } from './plan.ts';

/** The entries of the list of rows and cells put aside that one row makes. */
export function asidesOf(cells: readonly string[], line: number, read: RowRead, plan: Plan): Aside[] {
  const at = { sheet: plan.sheet.number, row: line };
  const asides = read.cells.map((cell): Aside => ({ ...at, isCell: true, ...cell, cols: [cell.col] }));
  if (read.outcome !== 'put aside') return asides;
  const { col, cents } = read;
  const reason = read.reason as AsideReason;
  const text = (col === null ? cells.join(' · ') : (cells[col - 1] ?? '')).slice(0, 200);
  return [...asides, { ...at, col, isCell: false, reason, text, cents, cols: correctable(cells, read, plan) }];
}

const NAMES: readonly Meaning[] = ['vehicle', 'stock number', 'year', 'make', 'model'];
const AMOUNTS: readonly Meaning[] = ['amount', 'credit'];
const MENDED: Partial<Record<AsideReason, readonly Meaning[]>> = {
  'missing-vehicle': NAMES,
  'ambiguous-vehicle': NAMES,
  'missing-amount': AMOUNTS,
  'bad-amount': AMOUNTS,
  'ambiguous-amount': AMOUNTS,
  'bad-date': ['date'],
  'bad-hours': ['hours'],
};

/** The columns in which another text may mend a row: the cell at fault, or those that its reason speaks of, or all. */
function correctable(cells: readonly string[], { reason, col }: RowRead, { columns }: Plan): number[] {
  if (reason === 'duplicate') return [];
  if (col !== null && col > 0) return [col];
  const meant = MENDED[reason as AsideReason] ?? [];
  const found = columns.filter(({ meaning }) => meant.includes(meaning)).map((column) => column.col);
  return found.length > 0 ? found : cells.flatMap((cell, at) => (cell.trim() === '' ? [] : [at + 1]));
}
