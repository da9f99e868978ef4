import { ceilProduct } from '../exact.ts';
import type { LevelName } from '../vocabulary.ts';

/** A level as a fraction p/q, 0 < p < q, never by way of a percentage: 2/3 is not 67 %. */
export interface Level {
  readonly p: number;
  readonly q: number;
}

/** A level by its name: '4/5' is 4 of 5. */
export function levelOf(name: LevelName): Level {
  const [p = 0, q = 0] = name.split('/').map(Number);
  return { p, q };
}

/** k = ceil((n + 1)·p/q), in whole numbers (definitions §18.3). Example: n 35 at 4/5 gives 29. */
export function rankAt(n: number, { p, q }: Level): number {
  return ceilProduct(n + 1, p, q);
}
