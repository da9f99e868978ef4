import type { Day } from '#shared/day.ts';
import type { Foreseen, OtherExit, RebuildDate } from '#shared/vocabulary.ts';
import type { DemoClass, DemoDamage } from './parameters.ts';

/** The six years of the demo shop as plain data: what a shop's books hold, before any warehouse. Cents, whole seconds, days. */
export interface DemoBook {
  readonly seed: number;
  readonly today: Day;
  readonly vehicles: readonly DemoVehicle[];
  /** Entries of no vehicle. */
  readonly overhead: readonly DemoEntry[];
  /** What was made wrong on purpose, and on which vehicles (tags). */
  readonly planted: ReadonlyMap<string, readonly string[]>;
}

/** Where a vehicle's figures were kept before they came into the books. */
export type DemoSource = 'ledger' | 'cars sheet' | 'receipts list';

export interface DemoVehicle {
  readonly tag: string;
  readonly source: DemoSource;
  readonly year: number;
  readonly make: string;
  readonly model: string;
  readonly color: string | null;
  readonly vin: string | null;
  readonly class: DemoClass;
  readonly damage: DemoDamage;
  /** null = nobody wrote it down. */
  readonly isSeen: boolean | null;
  readonly titleBrandBought: string | null;
  readonly titleBrandSold: string | null;
  readonly odometer: number | null;
  readonly boughtFrom: string | null;
  readonly purchaseCents: number;
  readonly askingCents: number | null;
  readonly saleCents: number | null;
  readonly buyerChannel: string | null;
  readonly dates: DemoDates;
  readonly exit: { readonly kind: OtherExit; readonly on: Day; readonly cents: number } | null;
  readonly baseline: DemoBaseline | null;
  readonly entries: readonly DemoEntry[];
  readonly hours: readonly DemoHours[];
  readonly notes: string | null;
  readonly lessons: string | null;
}

export type DemoDates = Readonly<Record<RebuildDate, Day | null>>;

/** The estimate as it was locked. */
export interface DemoBaseline {
  readonly madeOn: Day | null;
  /** All hours, own and paid. null = not planned. */
  readonly plannedSeconds: number | null;
  readonly expectedSaleCents: number | null;
  readonly expectedDays: number | null;
  readonly lines: ReadonlyMap<DemoCategory, number>;
}

export interface DemoEntry {
  readonly category: DemoCategory;
  readonly datedOn: Day | null;
  readonly cents: number;
  readonly vendor: string | null;
  readonly what: string | null;
  /** null = nobody said. */
  readonly foreseen: Foreseen | null;
  /** Chosen extra: wanted, not needed. */
  readonly isExtra: boolean;
}

export interface DemoHours {
  /** null = a total that names nobody; it is the owner's. */
  readonly worker: 'owner' | 'helper' | null;
  readonly workedOn: Day | null;
  readonly seconds: number;
  readonly task: string | null;
}

/** The categories that the demo uses, out of those that every shop starts with. */
export type DemoCategory =
  | 'auction fees'
  | 'transport'
  | 'parts'
  | 'outside labor (sublet)'
  | 'restraints (SRS)'
  | 'small systems'
  | 'title & registration'
  | 'inspection'
  | 'selling costs'
  | 'insurance'
  | 'paid labor'
  | 'supplies'
  | 'other';
