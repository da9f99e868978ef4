import { z } from 'zod';
import { daySchema, idSchema } from '../fields.ts';
import { EXITS } from '../vocabulary.ts';
import {
  cents,
  count,
  dayOrNull,
  figure,
  gapSchema,
  headSchema,
  perHourSchema,
  rebuildRefSchema,
  trendSchema,
  withoutOneSchema,
  yearEdge,
} from './answers-parts.ts';

/** The running total after one rebuild left or overhead was paid; over 300 of these, after each day's or month's sum. */
const stepSchema = z.object({
  on: daySchema,
  kind: z.enum(['rebuild', 'overhead', 'several']),
  changeCents: cents,
  totalCents: cents,
  rebuild: rebuildRefSchema.nullable(),
});

const tiedUpSchema = z.object({ on: yearEdge, rebuildCount: count, cents });

/** One shop year (definitions §18.6): kept = profit of the rebuilds that left in it − overhead dated in it. */
const shopYearSchema = z.object({
  year: z.int(),
  from: yearEdge,
  to: yearEdge,
  exitCount: count,
  soldCount: count,
  noPurchaseCount: count,
  profitCents: cents,
  overheadCents: cents,
  keptCents: cents,
  lateCount: count,
  lateCents: cents,
  tiedUp: tiedUpSchema,
});

/** A rebuild of the year. Money null = its purchase is not known. */
const yearRebuildSchema = rebuildRefSchema.extend({
  className: z.string().nullable(),
  damageName: z.string().nullable(),
  isSeen: z.boolean().nullable(),
  exitKind: z.enum(EXITS),
  exitOn: daySchema,
  boughtOn: dayOrNull,
  daysHeld: z.int().nullable(),
  purchaseCents: cents.nullable(),
  workCents: cents,
  costCents: cents.nullable(),
  proceedsCents: cents,
  keptCents: cents.nullable(),
  ownSeconds: count.nullable(),
  keptPerHourCents: figure,
  annualReturn: figure,
  lateCents: cents,
  gap: gapSchema,
});

export const yearAnswerSchema = headSchema.extend({
  year: z.int(),
  from: yearEdge,
  to: yearEdge,
  /** The last day counted: `to`, or today while the year runs. */
  through: yearEdge,
  isRunning: z.boolean(),
  exitCount: count,
  soldCount: count,
  /** Of the `n` whose purchase is known. */
  n: count,
  lossCount: count,
  profitCents: cents,
  overheadCents: cents,
  keptCents: cents,
  perHour: perHourSchema,
  /** The year before up to the same day (29 February: the 28th). null = the books do not go back so far. */
  before: z
    .object({
      year: z.int(),
      from: yearEdge,
      to: yearEdge,
      through: yearEdge,
      exitCount: count,
      keptCents: cents,
      /** The whole of that year. */
      wholeKeptCents: cents,
      /** This year's kept − that one's, both to the same day. */
      aheadCents: cents,
    })
    .nullable(),
  /** `every`: how finely the steps stand. `before` runs through its whole year. */
  steps: z.object({
    every: z.enum(['change', 'day', 'month']),
    now: z.array(stepSchema),
    before: z.array(stepSchema),
  }),
  /** Where the sale money went, rebuilds with a known purchase: proceeds − purchase − Σ categories − overhead = kept. */
  money: z.object({
    proceedsCents: cents,
    purchaseCents: cents,
    categories: z.array(z.object({ categoryId: idSchema, name: z.string(), cents })),
    overheadCents: cents,
    keptCents: cents,
  }),
  /** Entries dated after their rebuild had left; already in the profit. */
  late: z.object({ count, cents, rebuilds: z.array(rebuildRefSchema.extend({ count, cents })) }),
  /** In rebuilds still in hand on `through`. */
  tiedUp: tiedUpSchema,
  returns: z.object({
    /** Annual return of all flows together, and the median of the single ones over `n`. */
    pooled: figure,
    n: count,
    median: figure,
    /** More than one rate fits the flows together; the one nearest to 0 is shown. */
    hasSeveral: z.boolean(),
    undatedCount: count,
    /** Days from bought to left. Under about 60 an annual return mostly measures speed. */
    daysHeld: z.object({ n: count, median: figure }),
    onCost: z.object({ n: count, pooled: figure, median: figure, profitCents: cents, costCents: cents }),
  }),
  /** The latest 300 to leave, latest first; `rebuildTotal` in all. */
  rebuilds: z.array(yearRebuildSchema),
  rebuildTotal: count,
  years: z.array(shopYearSchema),
  /** Over all years, by the day each left, cents a year: kept by own hour, and kept a rebuild. */
  trends: z.object({ perHour: trendSchema, perRebuild: trendSchema }),
  /** Of what the year kept, and of that by own hour: the rebuild that moves it most. */
  withoutOne: z.object({ kept: withoutOneSchema.nullable(), perHour: withoutOneSchema.nullable() }),
  /** What leaving out every other way out would have said. */
  soldOnly: z.object({ n: count, keptCents: cents }),
});
export type YearAnswer = z.output<typeof yearAnswerSchema>;
