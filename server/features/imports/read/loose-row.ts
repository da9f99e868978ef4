import { looksLikeMoney } from '../cells/money.ts';
import { notData, type Plan, putAside, type RowReader } from './plan.ts';
import { filled } from './row-kinds.ts';

/** Reads rows of a sheet that holds no table: notes, and figures that nobody could place. Those are put aside. */
export function looseRowReader(plan: Plan): RowReader {
  return (cells) => {
    const at = cells.findIndex((cell) => looksLikeMoney(cell) && /[.,]\d\d(?!\d)|[$€£]/.test(cell));
    if (at < 0 || filled(cells) < 2) return notData('note');
    const cents = plan.money(cells[at] ?? '');
    return putAside('not-a-data-row', at + 1, typeof cents === 'number' ? cents : null);
  };
}
