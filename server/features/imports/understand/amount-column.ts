import type { Column } from '#shared/contracts/import-reading.ts';
import type { moneyReader } from '../cells/money.ts';
import type { Head } from './head.ts';

const ENOUGH_ROWS = 3;
const MOST_COLUMNS = 12;
const MOST = 0.8;

type Money = ReturnType<typeof moneyReader>;

/**
 * Settles by arithmetic which column of a list holds what was paid: the one that is count times price, or net and tax
 * together. Columns that only make it up are none. Where money out stands negative, the column counts the other way round.
 */
export function settleAmount(columns: readonly Column[], head: Head, money: Money): Column[] {
  const figures = figuresOf(columns, head, money);
  const candidates = columns.filter(
    ({ meaning }) => meaning === 'amount' || meaning === 'ignore' || meaning === 'derived',
  );
  const parts = candidates
    .filter(({ col }) => (figures.get(col) ?? []).some((value) => value !== null))
    .slice(0, MOST_COLUMNS);
  for (const made of parts) {
    const [one, two] = madeOf(made, parts, figures) ?? [];
    if (!one || !two) continue;
    return withSign(
      columns.map((column) => {
        if (column === made) return { ...made, meaning: 'amount', category: null, why: MADE };
        return column === one || column === two ? { ...column, meaning: 'derived', category: null, why: PART } : column;
      }),
      figures,
    );
  }
  return withSign(columns, figures);
}

const MADE = 'It is what two other columns make together.';
const PART = 'It only goes into the amount beside it.';
/** Said of a column that counts what went out negative. */
export const TURNED = 'The heading says so; money that went out stands negative here.';

/** What each column holds in each row, in cents; null = no figure. */
function figuresOf(columns: readonly Column[], head: Head, money: Money) {
  return new Map(
    columns.map(({ col }) => {
      const values = head.below.map(({ cells }) => {
        const value = money(cells[col - 1] ?? '', true);
        return typeof value === 'number' ? value : null;
      });
      return [col, values] as const;
    }),
  );
}

type Figures = ReturnType<typeof figuresOf>;

/** The two columns whose product, or sum, another one is in most rows. */
function madeOf(made: Column, parts: readonly Column[], figures: Figures): [Column, Column] | null {
  const others = parts.filter((column) => column !== made);
  for (const [i, one] of others.entries()) {
    for (const two of others.slice(i + 1)) {
      const product = (a: number, b: number) => Math.round((a * b) / 100);
      const sum = (a: number, b: number) => a + b;
      if (agrees(made, one, two, figures, product, 100) || agrees(made, one, two, figures, sum, 0)) return [one, two];
    }
  }
  return null;
}

/** Does `made` equal what two columns come to, in rows where neither of them alone does? */
function agrees(
  made: Column,
  one: Column,
  two: Column,
  figures: Figures,
  of: (a: number, b: number) => number,
  neutral: number,
): boolean {
  let [filled, right, telling] = [0, 0, 0];
  for (const [i, value] of (figures.get(made.col) ?? []).entries()) {
    if (value === null) continue;
    const [a, b] = [figures.get(one.col)?.[i] ?? neutral, figures.get(two.col)?.[i] ?? neutral];
    filled++;
    if (Math.abs(of(a, b) - value) > 1) continue;
    right++;
    if (a !== neutral && b !== neutral && a !== 0 && b !== 0) telling++;
  }
  return filled >= ENOUGH_ROWS && telling >= 2 && right >= filled * MOST;
}

/** An account's list counts what went out negative: such a column is read the other way round. */
function withSign(columns: readonly Column[], figures: Figures): Column[] {
  const amount = columns.find(({ meaning }) => meaning === 'amount');
  const values = (figures.get(amount?.col ?? 0) ?? []).filter((value) => value !== null && value !== 0);
  const below = values.filter((value) => (value as number) < 0).length;
  const isTurned = values.length >= ENOUGH_ROWS && below > values.length / 2;
  if (!amount || !isTurned || columns.some(({ meaning }) => meaning === 'credit')) return [...columns];
  return columns.map((column) => (column === amount ? { ...amount, meaning: 'credit', why: TURNED } : column));
}
