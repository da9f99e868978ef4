import { type Level, rankAt } from './level.ts';

/** Rungs of past rebuilds from the finest to the widest (definitions §11b). */
export const LADDER_RUNGS = ['class+damage+seen', 'damage+seen', 'seen', 'all'] as const;
export type Rung = (typeof LADDER_RUNGS)[number];

/** With fewer past rebuilds than this, no rung carries a rule. */
export const FEWEST_ON_RUNG = 9;

/** What a rung looks at, of a car or of a past rebuild. null = not known. */
export interface CarTraits {
  readonly classId: string | null;
  readonly damageId: string | null;
  readonly isSeen: boolean | null;
}

/** Is a past rebuild like the car in what the rung looks at? What is not known of either is like nothing. */
export function isOnRung(rung: Rung, past: CarTraits, car: CarTraits): boolean {
  if (rung === 'all') return true;
  if (car.isSeen === null || past.isSeen !== car.isSeen) return false;
  if (rung === 'seen') return true;
  if (car.damageId === null || past.damageId !== car.damageId) return false;
  return rung === 'damage+seen' || (car.classId !== null && past.classId === car.classId);
}

/** A rung worked out beforehand: what it looks at; the rest is null. */
export interface RungRow extends CarTraits {
  readonly rung: Rung;
}

/** Where a rule stands. `row` null = too few yet on every rung; `n` and `k` are then those of "all". */
export interface Picked<T> {
  readonly row: T | null;
  readonly n: number;
  readonly k: number;
}

/**
 * The finest rung that carries a rule for the car at this level: n ≥ 9 and k ≤ n (definitions §18.4). `rows` may leave
 * out rungs with fewer than nine, but not "all"; `countOf` = past rebuilds on a row. Example: eight like cars and nine
 * of that damage, all unseen: "damage+seen".
 */
export function pickRung<T extends RungRow>(
  rows: readonly T[],
  car: CarTraits,
  { level, countOf }: { readonly level: Level; readonly countOf: (row: T) => number },
): Picked<T> {
  for (const rung of LADDER_RUNGS) {
    const row = rows.find((one) => one.rung === rung && isOnRung(rung, one, car));
    const n = row ? countOf(row) : 0;
    const k = rankAt(n, level);
    if (row && n >= FEWEST_ON_RUNG && k <= n) return { row, n, k };
  }
  const all = rows.find(({ rung }) => rung === 'all');
  const n = all ? countOf(all) : 0;
  return { row: null, n, k: rankAt(n, level) };
}

/** The past rebuilds on the finest rung with at least nine of them. Too few on every rung: none, and rung null. */
export function pastOnRung<T extends CarTraits>(
  past: readonly T[],
  car: CarTraits,
): { readonly rung: Rung | null; readonly members: readonly T[] } {
  for (const rung of LADDER_RUNGS) {
    const members = past.filter((one) => isOnRung(rung, one, car));
    if (members.length >= FEWEST_ON_RUNG) return { rung, members };
  }
  return { rung: null, members: [] };
}
