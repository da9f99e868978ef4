import { z } from 'zod';
import { idSchema } from '../fields.ts';
import { PAY_VIEWS } from '../vocabulary.ts';
import {
  answerQuerySchema,
  cents,
  count,
  figure,
  headSchema,
  perHourSchema,
  withoutOneSchema,
} from './answers-parts.ts';

/** `view`: what a rebuild's figure is; by own hour unless asked. */
export const whatPaysQuerySchema = answerQuerySchema.extend({ view: z.enum(PAY_VIEWS).optional() });
export type WhatPaysQuery = z.output<typeof whatPaysQuerySchema>;

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
  /** The sums behind `plain`; seconds 0 = not known. `allSeconds` = own + paid. */
  profitCents: cents,
  laborCents: cents,
  ownSeconds: count,
  allSeconds: count,
  costCents: cents,
  /** The pulled figure without its furthest rebuild. null = thin. */
  withoutOne: withoutOneSchema.nullable(),
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

const keptSchema = z.object({ n: count, keptCents: cents });
const oldSheetGroupSchema = z.object({
  id: idSchema.nullable(),
  name: z.string(),
  old: keptSchema,
  whole: keptSchema,
  unsoldCount: count,
  /** By kept a rebuild, among groups of five or more. */
  oldRank: z.int().nullable(),
  wholeRank: z.int().nullable(),
});

/** What a sheet of one row per sold vehicle would claim: sale − purchase − `bills`; then with more and more of the truth. */
const oldSheetSchema = z.object({
  bills: z.array(z.string()),
  old: keptSchema,
  /** Every entry, but sold ones only. */
  soldOnly: keptSchema,
  whole: keptSchema,
  classes: z.array(oldSheetGroupSchema),
  damages: z.array(oldSheetGroupSchema),
});

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
  view: z.enum(PAY_VIEWS),
  /** The view's figure: cents per hour, cents a rebuild, or a fraction of cost. */
  fits: threeFits,
  /** Of all together by own hour: Σ profit ÷ Σ own hours. */
  withoutOne: withoutOneSchema.nullable(),
  oldSheet: oldSheetSchema,
});
export type WhatPaysAnswer = z.output<typeof whatPaysAnswerSchema>;
