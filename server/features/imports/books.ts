import type { Day } from '#shared/day.ts';
import type { PastSheet } from './earlier/past.ts';

/** A rebuild that the shop already has, as far as an import must know it. */
export interface ExistingRebuild {
  readonly id: string;
  readonly tag: string;
  readonly year: number | null;
  readonly make: string | null;
  readonly model: string | null;
  readonly hasPurchase: boolean;
  /** Sold, or gone by another exit. */
  readonly hasLeft: boolean;
  readonly hasBaseline: boolean;
  readonly hasEntries: boolean;
}

/** What understanding a file needs to know of the shop. Names, not ids: a reading is shown to people. */
export interface ShopBooks {
  readonly currency: string;
  readonly locale: string;
  readonly today: Day;
  readonly categories: readonly string[];
  /** Categories that the shop no longer offers: old files may still name them. */
  readonly retiredCategories: readonly string[];
  readonly classes: readonly string[];
  readonly damages: readonly string[];
  readonly rebuilds: readonly ExistingRebuild[];
  /** The sheets whose rows stand in the books, oldest import first. */
  readonly past: readonly PastSheet[];
}
