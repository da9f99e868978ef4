import { ceilProduct } from '../exact.ts';

/** B − E over E, kept as its two whole numbers so that a reserve comes out to the cent. `estimateCents` > 0. */
export interface Overran {
  /** B − E, cents; negative = it cost less than planned. */
  readonly overrunCents: number;
  readonly estimateCents: number;
}

/**
 * Cents to put on top of an estimate: ceil(u·e), exactly; 0 if the overrun taken is not above 0 (a plan is never cut).
 * Example: 505,822 over on 213,016 asks 505,822 of an estimate of 213,016. (definitions §10)
 */
export function reserve(taken: Overran, estimate: number): number {
  return taken.overrunCents <= 0 ? 0 : ceilProduct(taken.overrunCents, estimate, taken.estimateCents);
}

/** Cents of a flat rule of `percent` whole percent on an estimate, raised to the next cent. (definitions §10) */
export function flatReserve(percent: number, estimate: number): number {
  return ceilProduct(percent, estimate, 100);
}

/** Cents that a two-part rule puts on top of an estimate: ceil(a·e) + b. (definitions §11b) */
export function twoPartReserve(creepPercent: number, flatCents: number, estimate: number): number {
  return flatReserve(creepPercent, estimate) + flatCents;
}
