import { z } from 'zod';
import { daySchema, idSchema } from '../fields.ts';

/**
 * What the answers have in common. Money in cents (a mean or a rate may be a fraction of one), time in whole seconds,
 * ratios as fractions; null = nothing to say, never 0.
 */
export const count = z.int().min(0);
export const cents = z.int();
/** A mean, a ratio or an interval's end. */
export const figure = z.number().nullable();
export const dayOrNull = daySchema.nullable();
/** First or last day of a shop year: where that begins in July, the first and last year reach beyond the books' days. */
export const yearEdge = z.iso.date();

const yearQuery = z.coerce.number().int().min(1949).max(2100);

/** A page's filters as they stand in its address. Years are shop years, both ends included. */
export const filterQuerySchema = z.strictObject({
  from: yearQuery.optional(),
  to: yearQuery.optional(),
  class: z.union([idSchema, z.literal('unknown')]).optional(),
  damage: z.union([idSchema, z.literal('unknown')]).optional(),
  seen: z.enum(['yes', 'no', 'unknown']).optional(),
});
export type FilterQuery = z.output<typeof filterQuerySchema>;

/** `sold`: count as an old sheet would, without any other way out. Never what a page shows by itself. */
const exitsQuery = z.literal('sold').optional();
export const answerQuerySchema = filterQuerySchema.extend({ exits: exitsQuery });
export type AnswerQuery = z.output<typeof answerQuerySchema>;

export const yearQuerySchema = z.strictObject({ year: yearQuery.optional(), exits: exitsQuery });
export type YearQuery = z.output<typeof yearQuerySchema>;

/** What can be filtered by, with how many rebuilds each holds when nothing is filtered. */
export const filterOptionsSchema = z.object({
  /** Is a year that in which a rebuild left the shop, or that in which it was listed? */
  yearOf: z.enum(['left', 'listed']),
  years: z.array(z.object({ year: z.int(), from: yearEdge, to: yearEdge, count })),
  classes: z.array(z.object({ id: idSchema, name: z.string(), count })),
  damages: z.array(z.object({ id: idSchema, name: z.string(), count })),
  seen: z.object({ yes: count, no: count, unknown: count }),
});
export type FilterOptions = z.output<typeof filterOptionsSchema>;

/** A rebuild as a mark on a picture names it. `name` = year, make and model, or its class; may be empty. */
export const rebuildRefSchema = z.object({ id: idSchema, tag: z.string(), name: z.string() });
export type RebuildRef = z.output<typeof rebuildRefSchema>;

/** Why rebuilds are not in a figure; the words can stand on a page: "3 left out: no estimate". */
export const LEFT_OUT_REASONS = [
  'not sold yet',
  'left otherwise than by sale',
  'purchase not known',
  'own hours not known',
  'own or paid hours not known',
  'planned or worked hours not known',
  'class or damage not known',
  'no estimate',
  'estimate written over with what it came to',
  'foreseen or surprise not said',
  'entry without a date',
  'dates out of order',
  'sold without a listing day',
  'not listed yet',
  'fewer than five known when it was bought',
  'too few known for this level when it was bought',
  'no sale expected in its estimate',
  'no hours planned',
] as const;
export type LeftOutReason = (typeof LEFT_OUT_REASONS)[number];

export const LEFT_OUT_LISTED = 50;
export const leftOutSchema = z.object({
  reason: z.enum(LEFT_OUT_REASONS),
  count,
  /** The first fifty. */
  rebuilds: z.array(rebuildRefSchema),
});
export type LeftOut = z.output<typeof leftOutSchema>;

/** x of n with its 95 % Wilson interval. */
export const rateSchema = z.object({ n: count, x: count, rate: figure, lower: figure, upper: figure });

/** First − second, with its 95 % interval; one that holds 0 could be luck. `isThin`: fewer than five on a side. */
export const differenceSchema = z.object({
  difference: z.number(),
  lower: z.number(),
  upper: z.number(),
  isThin: z.boolean(),
});
export type Difference = z.output<typeof differenceSchema>;

/** The latest so many rebuilds are what a trend is read from. */
export const TREND_AT_MOST = 120;
/** Change a year: median of the slopes between every two rebuilds, with its 95 % interval. null = nothing apart in time. */
export const trendSchema = z.object({
  n: count,
  /** More had left than the latest that are looked at. */
  isCapped: z.boolean(),
  slope: figure,
  lower: figure,
  upper: figure,
  isThin: z.boolean(),
});
export type Trend = z.output<typeof trendSchema>;

/** The rebuild without which a figure changes most, and the figure then. */
export const withoutOneSchema = z.object({ rebuild: rebuildRefSchema, value: z.number() });
export type WithoutOne = z.output<typeof withoutOneSchema>;

/** Above this many marks a picture gets bands or the latest only, and says so. */
export const MARKS_AT_MOST = 300;

/** Stands in every answer. `rebuildCount` = rebuilds that the filters let through, finished or not. */
export const headSchema = z.object({
  asOf: daySchema,
  rebuildCount: count,
  filters: filterOptionsSchema,
  leftOut: z.array(leftOutSchema),
});
export type Head = z.output<typeof headSchema>;

/** Three views of profit per hour with the sums behind each. */
export const perHourSchema = z.object({
  own: z.object({
    n: count,
    missingCount: count,
    profitCents: cents,
    ownSeconds: count,
    /** Σ profit ÷ Σ own hours, and the median of the single ones. */
    pooledCents: figure,
    medianCents: figure,
  }),
  /** Paid labor given back, over everybody's hours. */
  all: z.object({
    n: count,
    missingCount: count,
    profitCents: cents,
    paidLaborCents: cents,
    seconds: count,
    pooledCents: figure,
  }),
  /** What is left when own hours are paid the wanted wage; null without a wage. */
  afterWage: z.object({
    n: count,
    missingCount: count,
    wantedCentsPerHour: figure,
    leftCents: figure,
    leftPerRebuildCents: figure,
  }),
});

/** A gap bar: locked estimate (null = none that counts), what planning saw spent, and the surprises in it. */
export const gapSchema = z.object({
  lockedCents: cents.nullable(),
  actualCents: cents,
  surpriseCents: cents,
  /** (actual − locked) ÷ locked. */
  overrun: figure,
});
