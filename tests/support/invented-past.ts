import { addDays } from '#shared/day.ts';
import type { PlannedOutcome } from '../../server/domain/sets.ts';

/** What an invented past is made from. Percents are of the plan. */
export interface InventedPast {
  readonly count: number;
  readonly chance: () => number;
  /** Percent of the plan by which the shop as a whole is off, the same for all of its rebuilds. */
  readonly shiftPercent?: number;
  /** Percent of the plan on top from this place on: the planted drift. */
  readonly drift?: { readonly from: number; readonly percent: number };
}

/**
 * A shop's finished rebuilds, 30 days apart from 1 January 2020 on, in exit order. Plans are between 800 and 6,000, the
 * overrun is skewed: log-normal creep around 20 % and, for three in ten, a surprise of a few hundred. Without drift the
 * rebuilds are exchangeable: any order of them is as likely as any other.
 */
export function inventPast({ count, chance, shiftPercent = 0, drift }: InventedPast): PlannedOutcome[] {
  return Array.from({ length: count }, (_, i) => {
    const estimateCents = 80_000 + Math.floor(chance() * 520_000);
    const driftPercent = drift && i >= drift.from ? drift.percent : 0;
    const creep = 1.2 * Math.exp(0.2 * normal(chance)) - 1 + (shiftPercent + driftPercent) / 100;
    const surpriseCents = chance() < 0.3 ? Math.round(45_000 * Math.exp(0.5 * normal(chance))) : 0;
    const exitOn = addDays('2020-01-01', 30 * i);
    const overrunCents = Math.round(creep * estimateCents) + surpriseCents;
    return { id: `r${i}`, exitOn, boughtOn: addDays(exitOn, -120), estimateCents, overrunCents, surpriseCents };
  });
}

/** A standard normal value (Box & Muller 1958). */
export function normal(chance: () => number): number {
  return Math.sqrt(-2 * Math.log(1 - chance())) * Math.cos(2 * Math.PI * chance());
}
