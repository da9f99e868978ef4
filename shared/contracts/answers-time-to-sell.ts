import { z } from 'zod';
import { daySchema, idSchema } from '../fields.ts';
import { STAGES } from '../vocabulary.ts';
import { cents, count, dayOrNull, figure, headSchema, rebuildRefSchema, withoutOneSchema } from './answers-parts.ts';

/** Share still unsold after this day, with its 95 % limits (null where the share is 0 or 1). */
const stepSchema = z.object({
  days: count,
  atRiskCount: count,
  soldCount: count,
  unsold: z.number(),
  lower: figure,
  upper: figure,
});
const unsoldAtSchema = z.object({ unsold: figure, lower: figure, upper: figure });

const sellingTime = {
  /** Listed vehicles, sold or not. */
  n: count,
  soldCount: count,
  unsoldCount: count,
  /** Left otherwise than by sale: counted as watched up to that day. */
  otherExitCount: count,
  /** null = half have not sold; an end null = not reached. */
  median: z.object({ days: figure, lower: figure, upper: figure }),
  at30: unsoldAtSchema,
  at60: unsoldAtSchema,
  at90: unsoldAtSchema,
  /** Fewer than five sales. */
  isThin: z.boolean(),
  longestDays: count.nullable(),
  /** At most 300: with more selling days than that every so many is left out, never the last. */
  steps: z.array(stepSchema),
  isThinned: z.boolean(),
};

/**
 * haul = bought → picked up · queue = picked up → started · build = started → roadworthy · paper = roadworthy → title
 * issued · listing = title issued → listed · sell = listed → sold · held = bought → left.
 */
export const STAGES_OF_DAYS = ['haul', 'queue', 'build', 'paper', 'listing', 'sell', 'held'] as const;
const stageSchema = z.object({
  stage: z.enum(STAGES_OF_DAYS),
  /** Have both days in order. Of selling: listed ones, sold or not, and the figures are those of the curve. */
  n: count,
  /** Both days known, but the later one comes first: left out. */
  oddCount: count,
  median: figure,
  q10: figure,
  q90: figure,
  isThin: z.boolean(),
});
export type StageOfDays = z.output<typeof stageSchema>;

/** From so many days since purchase on; the last one is open. */
export const AGES = [0, 31, 91, 181, 366] as const;

const unsoldSchema = rebuildRefSchema.extend({
  stage: z.enum(STAGES),
  boughtOn: dayOrNull,
  listedOn: dayOrNull,
  daysSinceBought: z.int().nullable(),
  daysListed: z.int().nullable(),
  askingCents: cents.nullable(),
  /** Purchase + what was paid on it so far. */
  tiedUpCents: cents,
});

export const timeToSellAnswerSchema = headSchema.extend({
  overall: z.object(sellingTime),
  classes: z.array(z.object({ classId: idSchema, name: z.string(), ...sellingTime })),
  /** Log-rank test of the two largest classes. null = one class, or no sale. */
  comparison: z
    .object({
      classA: z.string(),
      classB: z.string(),
      nA: count,
      nB: count,
      observedA: count,
      expectedA: z.number(),
      observedB: count,
      expectedB: z.number(),
      variance: z.number(),
      chiSquare: figure,
      p: figure,
    })
    .nullable(),
  /** Days in each stage, in their order. */
  stages: z.array(stageSchema),
  classStages: z.array(z.object({ classId: idSchema, name: z.string(), stages: z.array(stageSchema) })),
  /** The rebuild that moves the middle of the curve most. */
  withoutOne: withoutOneSchema.nullable(),
  /** What leaving out the unsold and every other way out would have said: the middle of the days of those sold. */
  soldOnly: z.object({ n: count, median: figure }),
  /** In hand on `on`, listed or not, longest first; at most 300. */
  unsold: z.object({
    on: daySchema,
    total: count,
    cents,
    /** By days since bought, youngest first, each with the oldest rebuild in it; all five stand, empty or not. */
    ages: z.array(z.object({ fromDays: count, count, cents, oldest: rebuildRefSchema.nullable() })),
    rebuilds: z.array(unsoldSchema),
  }),
});
export type TimeToSellAnswer = z.output<typeof timeToSellAnswerSchema>;
