import { type Day, dayNumber } from '#shared/day.ts';
import type { RebuildFacts } from './facts.ts';
import { byCodePoint } from './text-order.ts';

/** A rebuild that has left the shop (C of definitions §1 and §18.1). */
export type Completed = RebuildFacts & { readonly exit: NonNullable<RebuildFacts['exit']> };

/** A completed rebuild whose purchase is known: the only ones in a money figure. */
export type Priced = Completed & { readonly purchaseCents: number };

/** A completed rebuild as planning sees it: what it was to cost and what it did cost (§10–§11b). */
export interface PlannedOutcome {
  readonly id: string;
  readonly exitOn: Day;
  readonly boughtOn: Day | null;
  /** E, cents > 0. */
  readonly estimateCents: number;
  /** B − E in cents, B being the planning actual. */
  readonly overrunCents: number;
  /** U in cents. */
  readonly surpriseCents: number;
}

/** Every rebuild that has left the shop, by sale or otherwise. */
export function completed(facts: readonly RebuildFacts[]): Completed[] {
  return facts.filter((rebuild): rebuild is Completed => rebuild.exit !== null);
}

/** Completed rebuilds whose purchase is known. */
export function priced(facts: readonly RebuildFacts[]): Priced[] {
  return completed(facts).filter((rebuild): rebuild is Priced => rebuild.purchaseCents !== null);
}

/**
 * Was the estimate written over with what the work came to (§18.1)? True when three or more categories were
 * planned and every one of them cost its plan to the cent: such a plan says nothing about overruns.
 */
export function isOverwritten(rebuild: RebuildFacts): boolean {
  let planned = 0;
  for (const [category, cents] of rebuild.estimates) {
    if (cents === 0) continue;
    if ((rebuild.categories.get(category)?.planningCents ?? 0) !== cents) return false;
    planned += 1;
  }
  return planned >= 3;
}

/** Set K of §18.3: completed, with an estimate that was not written over. */
export function planned(facts: readonly RebuildFacts[]): Completed[] {
  return completed(facts).filter((rebuild) => rebuild.estimateCents > 0 && !isOverwritten(rebuild));
}

/** Set K2 of §18.3: K without those that have an entry whose foreseen nobody said. */
export function plannedAndTold(facts: readonly RebuildFacts[]): Completed[] {
  return planned(facts).filter((rebuild) => !rebuild.hasUnknownForeseen);
}

/** The outcomes of a set, in the order in which they became known (§11). */
export function plannedOutcomes(set: readonly Completed[]): PlannedOutcome[] {
  return set.toSorted(byExit).map((rebuild) => ({
    id: rebuild.id,
    exitOn: rebuild.exit.on,
    boughtOn: rebuild.boughtOn,
    estimateCents: rebuild.estimateCents,
    overrunCents: rebuild.planningCents - rebuild.estimateCents,
    surpriseCents: rebuild.surprisePlanningCents,
  }));
}

/** The order in which outcomes became known: by exit day, then id (§11). */
export function byExit(a: Completed, b: Completed): number {
  if (a.exit.on !== b.exit.on) return a.exit.on < b.exit.on ? -1 : 1;
  return byCodePoint(a.id, b.id);
}

/** One rebuild on the market: days from listing to its sale, or to where we lost sight of it. */
export interface OnMarket {
  readonly id: string;
  readonly class: string | null;
  readonly days: number;
  readonly isSold: boolean;
  readonly isOtherExit: boolean;
}

export interface MarketSet {
  readonly members: readonly OnMarket[];
  /** Left out: a later stage dated before an earlier one. */
  readonly oddDatesCount: number;
  /** Left out: sold, but no listing day. */
  readonly noListedCount: number;
}

/** Set D of §7 and §18.1: every rebuild listed by `asOf`, sold or not; those left out are counted. */
export function marketSet(facts: readonly RebuildFacts[], asOf: Day): MarketSet {
  const members: OnMarket[] = [];
  let oddDatesCount = 0;
  let noListedCount = 0;
  for (const rebuild of facts) {
    const { listedOn, exit } = rebuild;
    if (listedOn === null) noListedCount += exit?.kind === 'sold' ? 1 : 0;
    else if (hasOddDates(rebuild)) oddDatesCount += 1;
    else if (listedOn <= asOf) {
      const isSold = exit?.kind === 'sold';
      const days = dayNumber(exit?.on ?? asOf) - dayNumber(listedOn);
      members.push({ id: rebuild.id, class: rebuild.class, days, isSold, isOtherExit: exit !== null && !isSold });
    }
  }
  return { members, oddDatesCount, noListedCount };
}

/** Is one of the known days bought, ready, listed, exit before an earlier stage? Equal days are in order. */
export function hasOddDates(rebuild: RebuildFacts): boolean {
  const { boughtOn, readyOn, listedOn, exit } = rebuild;
  let latest: Day | null = null;
  for (const day of [boughtOn, readyOn, listedOn, exit?.on ?? null]) {
    if (day === null) continue;
    if (latest !== null && day < latest) return true;
    latest = day;
  }
  return false;
}
