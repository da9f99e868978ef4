/** Rungs of past rebuilds from the finest to the widest (definitions §11b). */
export const LADDER_RUNGS = ['class+damage+seen', 'damage+seen', 'seen', 'all'] as const;
export type Rung = (typeof LADDER_RUNGS)[number];

/** With fewer past rebuilds than this, no rung carries a rule. */
export const FEWEST_ON_RUNG = 9;

/** What a rung looks at, of a car or of a past rebuild. null = not known. */
export interface RungTraits<T> {
  readonly class: T | null;
  readonly damage: T | null;
  readonly seen: boolean | null;
}

/** Is a past rebuild like the car in what the rung looks at? What is not known of either is like nothing. */
export function isOnRung<T>(rung: Rung, past: RungTraits<T>, car: RungTraits<T>): boolean {
  if (rung === 'all') return true;
  if (car.seen === null || past.seen !== car.seen) return false;
  if (rung === 'seen') return true;
  if (car.damage === null || past.damage !== car.damage) return false;
  return rung === 'damage+seen' || (car.class !== null && past.class === car.class);
}
