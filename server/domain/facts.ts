import type { Day } from '#shared/day.ts';
import type { ExitKind } from '#shared/vocabulary.ts';

/**
 * What every measure is fed with: one rebuild, its entries already summed by category (the rollup keeps
 * these sums; a measure never sees a single entry). Money in cents, time in whole seconds, days as text.
 */
export interface RebuildFacts {
  readonly id: string;
  /** null = not said. */
  readonly class: string | null;
  readonly damage: string | null;
  /** Seen in person before buying. null = not said. */
  readonly seen: boolean | null;
  readonly boughtOn: Day | null;
  /** Roadworthy. */
  readonly readyOn: Day | null;
  readonly listedOn: Day | null;
  /** null = still in the shop's hands. `proceedsCents` is the sale price, or what another exit brought. */
  readonly exit: { readonly kind: ExitKind; readonly on: Day; readonly proceedsCents: number } | null;
  /** null = unknown: such a rebuild is in no money figure, and is counted. */
  readonly purchaseCents: number | null;
  /** Unpaid hours, in whole seconds. null = unknown. */
  readonly ownSeconds: number | null;
  readonly paidSeconds: number | null;
  /** A of §2: Σ cents of all entries. */
  readonly paidCents: number;
  /** B of §18.1: Σ over entries that are not chosen extras of (market value if free, else cents). */
  readonly planningCents: number;
  /** E of §5: Σ of the locked baseline; 0 = no estimate. */
  readonly estimateCents: number;
  /** Locked baseline per category, cents ≥ 0. Empty = no estimate. */
  readonly estimates: ReadonlyMap<string, number>;
  /** Sums of the entries per category; every category with at least one entry stands here. */
  readonly categories: ReadonlyMap<string, CategoryFacts>;
  /** Σ paid cents in the paid-labor category (L of §18.2). */
  readonly paidLaborCents: number;
  /** At least one entry whose foreseen is not said (§18.1). */
  readonly hasUnknownForeseen: boolean;
  /** At least one entry without a date: no annualised return. */
  readonly hasUndated: boolean;
  /** U of §11b: Σ max(0, planning value) over entries that are a surprise. */
  readonly surprisePlanningCents: number;
  /** Entries with cents ≠ 0 dated after the exit: count and net (§18.6). */
  readonly lateCount: number;
  readonly lateCents: number;
  /** Annualised return (§3), kept with the books. null = not defined. */
  readonly xirr: number | null;
}

export interface CategoryFacts {
  /** A_ic: Σ cents of all entries. */
  readonly paidCents: number;
  /** B_ic: Σ over entries that are not chosen extras of (market value if free, else cents). */
  readonly planningCents: number;
  /** Σ cents of surprises, refunds included, chosen extras not. */
  readonly unforeseenCents: number;
  /** Number of surprises with cents > 0. */
  readonly surpriseCount: number;
  /** Σ cents of chosen extras. */
  readonly extraCents: number;
  /** Σ market value of what came free. */
  readonly freeCents: number;
  readonly entryCount: number;
}
