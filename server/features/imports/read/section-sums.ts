import { readHours } from '../cells/hours.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { fold } from '../cells/fold.ts';
import { isFigure } from './sheet-words.ts';
import type { Plan, RowRead } from './plan.ts';
import { type ColumnSums, explain } from './sums.ts';

const HOURS = /\b(?:hours?|hrs|h|std|stunden|horas|heures)\b/;

interface Sum {
  since: number;
  whole: number;
}

/** Adds up a sheet about one vehicle by sections, so that its own subtotals and totals can be held against it. */
export function sectionSums(plan: Plan, sums: ColumnSums) {
  const money: Sum = { since: 0, whole: 0 };
  const hours: Sum = { since: 0, whole: 0 };
  return {
    /** The next vehicle begins. */
    restart(): void {
      for (const sum of [money, hours]) sum.since = sum.whole = 0;
    },
    /** The next section begins. */
    section(): void {
      money.since = hours.since = 0;
    },
    add({ lines }: RowRead): void {
      for (const { kind, cents, seconds } of lines) {
        const isCost = kind === 'entry' || kind === 'purchase';
        money.since += isCost ? cents : 0;
        money.whole += isCost ? cents : 0;
        hours.since += seconds;
        hours.whole += seconds;
      }
    },
    /** Holds a row of totals against what came in since the last one, or for the whole vehicle. */
    compare(cells: readonly string[], row: number, label: string, isOwnWork: boolean): void {
      const isHours = HOURS.test(fold(label)) || (isOwnWork && !cells.some(isFigure));
      const col = cells.findLastIndex((cell) => looksLikeMoney(cell)) + 1;
      const value = isHours ? readHours(cells[col - 1] ?? '') : plan.money(cells[col - 1] ?? '');
      const sum = isHours ? hours : money;
      if (col > 0 && typeof value === 'number' && !/profit|gewinn|beneficio|benefice|made|margin/.test(fold(label))) {
        const imported = value === sum.since || (value !== sum.whole && sum.since !== 0) ? sum.since : sum.whole;
        const explanation = explain(value, imported, 0);
        sums.note({
          row,
          col,
          label: label.trim(),
          measure: isHours ? 'hours' : 'money',
          stated: value,
          imported,
          putAside: 0,
          explanation,
        });
      }
      sum.since = 0;
    },
  };
}
