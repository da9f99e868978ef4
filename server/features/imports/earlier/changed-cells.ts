import type { Column, Meaning } from '#shared/contracts/import-reading.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';
import { looksLikeDay } from '../cells/days.ts';
import { fold } from '../cells/fold.ts';
import { readHours } from '../cells/hours.ts';
import { looksLikeMoney } from '../cells/money.ts';
import type { Plan } from '../read/plan.ts';

/** What a changed cell says. */
export type ChangeKind = 'amount' | 'place' | 'date' | 'text';

export interface ChangedCell {
  readonly col: number;
  readonly kind: ChangeKind;
  /** It was blank then. */
  readonly isAdded: boolean;
}

const AMOUNTS = new Set<Meaning>([
  'amount',
  'credit',
  'purchase',
  'cost',
  'estimate',
  'hours',
  'estimated hours',
  'sale',
  'asking',
  'expected sale',
]);
const PLACES = new Set<Meaning>(['vehicle', 'category', 'stock number', 'year', 'make', 'model']);
const DATES = new Set<Meaning>(['date', ...REBUILD_DATES.map(([field]) => field)]);

/** The cells of a row that say something else than they did then; how they are written does not count. */
export function changedCells(plan: Plan, then: readonly string[], now: readonly string[]): ChangedCell[] {
  const columns = new Map(plan.columns.map((column) => [column.col, column]));
  const changed: ChangedCell[] = [];
  for (let at = 0; at < Math.max(then.length, now.length); at++) {
    const [before, after] = [(then[at] ?? '').trim(), (now[at] ?? '').trim()];
    if (before === after) continue;
    const kind = plan.columns.length > 0 ? kindOf(columns.get(at + 1), plan) : kindOfText(before || after);
    if (kind === null || isSame(plan, at + 1, kind, [before, after])) continue;
    changed.push({ col: at + 1, kind, isAdded: before === '' });
  }
  return changed;
}

/** null = the column holds nothing for the books. */
function kindOf(column: Column | undefined, { shape }: Plan): ChangeKind | null {
  if (!column || column.meaning === 'ignore' || column.meaning === 'derived') return null;
  if (AMOUNTS.has(column.meaning)) return 'amount';
  if (DATES.has(column.meaning)) return 'date';
  return shape !== 'vehicles' && PLACES.has(column.meaning) ? 'place' : 'text';
}

const kindOfText = (text: string): ChangeKind =>
  looksLikeDay(text) ? 'date' : looksLikeMoney(text) || typeof readHours(text) === 'number' ? 'amount' : 'text';

function isSame(plan: Plan, col: number, kind: ChangeKind, [a, b]: readonly [string, string]): boolean {
  const equal = (read: (text: string) => unknown, isRead: (value: unknown) => boolean) =>
    isRead(read(a)) && read(a) === read(b);
  const isNumber = (value: unknown) => typeof value === 'number';
  if (kind === 'amount')
    return equal((text) => plan.money(text, true), isNumber) || equal((text) => readHours(text), isNumber);
  if (kind === 'date') {
    const dayOf = plan.days.get(plan.columns.length > 0 ? col : 1);
    return dayOf !== undefined && equal(dayOf, (day) => day !== 'bad' && day !== 'blank');
  }
  return fold(a) === fold(b);
}
