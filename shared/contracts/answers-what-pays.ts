import { z } from 'zod';
import { idSchema } from '../fields.ts';
import { cents, count, figure, headSchema, perHourSchema } from './answers-parts.ts';

/** The mean pulled toward the shop's average; `weight` 1 = its own mean alone, 0 = the shop's. 95 % interval. */
const pulledSchema = z.object({
  weight: z.number(),
  value: z.number(),
  standardError: z.number(),
  lower: z.number(),
  upper: z.number(),
});

/** A cell of the grid or of a margin. Of a margin one of class and damage is null. */
const groupSchema = z.object({
  classId: idSchema.nullable(),
  className: z.string().nullable(),
  damageId: idSchema.nullable(),
  damageName: z.string().nullable(),
  n: count,
  /** Σ ÷ Σ. */
  plain: figure,
  /** Mean of the single values, its SD and 95 % t interval; null = one rebuild. */
  mean: z.number(),
  deviation: figure,
  lower: figure,
  upper: figure,
  /** null = the groups cannot be pooled. */
  pulled: pulledSchema.nullable(),
  /** Fewer than five: shown gray, not ranked. */
  isThin: z.boolean(),
  /** 1 = highest lower end of the pulled interval. null = thin, or not pooled. */
  rank: z.int().nullable(),
  /** The sums behind `plain`: profit over own hours, or over cost. */
  profitCents: cents,
  ownSeconds: count,
  costCents: cents,
});

/** One fit: cells, or one margin. `average` null = nothing to pool. `betweenVariance` 0 = no difference shown. */
const comparisonSchema = z.object({
  n: count,
  ungroupedCount: count,
  withinVariance: figure,
  average: z
    .object({
      mean: z.number(),
      standardError: z.number(),
      lower: z.number(),
      upper: z.number(),
      betweenVariance: z.number(),
      q: z.number(),
    })
    .nullable(),
  groups: z.array(groupSchema),
});
export type Comparison = z.output<typeof comparisonSchema>;

/** `classes` = all damage per class, `damages` = all classes per damage. */
const threeFits = z.object({ cells: comparisonSchema, classes: comparisonSchema, damages: comparisonSchema });

export const whatPaysAnswerSchema = headSchema.extend({
  /** Finished rebuilds with a known purchase, all together. */
  totals: z.object({
    n: count,
    purchaseCents: cents,
    workCents: cents,
    costCents: cents,
    proceedsCents: cents,
    profitCents: cents,
    lossCount: count,
    returnOnCost: z.object({ n: count, pooled: figure, median: figure, mean: figure }),
  }),
  views: perHourSchema,
  /** Profit ÷ own hours, cents per hour. */
  perHour: threeFits,
  /** Profit ÷ cost, a fraction. */
  returnOnCost: threeFits,
});
export type WhatPaysAnswer = z.output<typeof whatPaysAnswerSchema>;
