import { z } from 'zod';
import { idSchema } from '../fields.ts';
import {
  cents,
  count,
  differenceSchema,
  figure,
  headSchema,
  rateSchema,
  rebuildRefSchema,
  trendSchema,
  withoutOneSchema,
} from './answers-parts.ts';

/** One rebuild against its plan. `over` in cents (of hours: seconds), `rate` = over ÷ plan. */
const dotSchema = rebuildRefSchema.omit({ name: true }).extend({ over: z.int(), rate: z.number() });
/** `from` ≤ rate < `to`; the ends are open (null). */
const binSchema = z.object({ from: figure, to: figure, count });

/** Actual ÷ plan − 1 over the rebuilds that planned for it: pooled = Σ over Σ; quantiles are of the single rates. */
const spread = {
  n: count,
  pooled: figure,
  median: figure,
  mean: figure,
  q10: figure,
  q25: figure,
  q75: figure,
  q90: figure,
  isThin: z.boolean(),
};
const planned = { ...spread, estimateCents: cents, actualCents: cents };

/** Every rebuild a dot, or bins when the answer's `marks` says so (the other list is empty then). */
const marks = { dots: z.array(dotSchema), bins: z.array(binSchema) };

/** The cents over plan, parted: a surprise, or known work costing more. Only rebuilds where each entry says which. */
const partsSchema = z.object({
  n: count,
  overCents: cents,
  surpriseCents: cents,
  knownCents: cents,
  /** surprise ÷ over, 0–1. null = nothing over. */
  surpriseShare: figure,
});

/** Pooled overrun of one shop year, by the year in which the rebuilds left. */
export const yearRateSchema = z.object({ year: z.int(), n: count, pooled: figure, isThin: z.boolean() });

const categorySchema = z.object({
  categoryId: idSchema,
  name: z.string(),
  ...planned,
  ...marks,
  parts: partsSchema,
  /** Spent without having been planned: never in a ratio. */
  unbudgetedCount: count,
  unbudgetedCents: cents,
  /** Chosen extras: paid, but in no overrun and no surprise. */
  extraCents: cents,
  /** Does it change? The earliest first. */
  years: z.array(yearRateSchema),
});

/** Some rebuilds as the comparison by damage shows them: their overrun, sum over sum, and how many had a surprise. */
const lookedAtSchema = z.object({ n: count, pooled: figure, isThin: z.boolean(), surprises: rateSchema });
const differenceOrNull = differenceSchema.nullable();

/** One damage against all others, each split by whether it was seen before buying. Differences of the overrun. */
const damageLookSchema = z.object({
  damageId: idSchema,
  name: z.string(),
  own: z.object({ seen: lookedAtSchema, unseen: lookedAtSchema }),
  others: z.object({ seen: lookedAtSchema, unseen: lookedAtSchema }),
  /** Unseen − seen: among this damage, and among all others. */
  look: differenceOrNull,
  lookOthers: differenceOrNull,
  /** This damage − all others: among the seen, and among the unseen. */
  damageSeen: differenceOrNull,
  damageUnseen: differenceOrNull,
});

export const overrunsAnswerSchema = headSchema.extend({
  /** `binned` when more than 300 rebuilds have an estimate. */
  marks: z.enum(['each', 'binned']),
  total: z.object({ ...planned, ...marks, parts: partsSchema }),
  /** By name; those that nobody planned have n 0. */
  categories: z.array(categorySchema),
  /** Planned hours against own + paid; both must be known. */
  hours: z.object({
    ...spread,
    plannedSeconds: count,
    actualSeconds: count,
    ...marks,
    years: z.array(yearRateSchema),
  }),
  surprises: rateSchema.extend({
    unknownCount: count,
    unforeseenCents: cents,
    /** All paid on the same rebuilds: what `shareOfWork` divides by. */
    workCents: cents,
    shareOfWork: figure,
    categories: z.array(rateSchema.extend({ categoryId: idSchema, name: z.string(), unforeseenCents: cents })),
  }),
  /** Paid for scope that was added by choice: counts in cost and profit, never here. */
  extras: z.object({ rebuildCount: count, cents }),
  /** Seen before buying, not seen, not said. */
  seen: z.array(
    z.object({
      seen: z.boolean().nullable(),
      ...planned,
      surprises: rateSchema,
      /** Σ profit ÷ Σ own hours. */
      perHour: z.object({ n: count, pooledCents: figure }),
    }),
  ),
  /** Unseen − seen: overrun, share with a surprise, kept by own hour (cents). null = too few to compare. */
  seenDifference: z.object({ overrun: differenceOrNull, surprised: differenceOrNull, perHour: differenceOrNull }),
  /** The most frequent first. */
  damages: z.array(damageLookSchema),
  /** By the day each left: overrun of the rebuild, and of its hours, as fractions. */
  trends: z.object({ overrun: trendSchema, hours: trendSchema }),
  /** Of the total's pooled overrun. */
  withoutOne: withoutOneSchema.nullable(),
  /** What leaving out every other way out would have said. */
  soldOnly: z.object({ n: count, pooled: figure }),
  /** By the shop year in which they left. */
  years: z.array(z.object({ year: z.int(), ...planned })),
});
export type OverrunsAnswer = z.output<typeof overrunsAnswerSchema>;
