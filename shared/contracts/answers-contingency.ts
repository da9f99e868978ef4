import { z } from 'zod';
import { daySchema, idSchema } from '../fields.ts';
import { LEVELS } from '../vocabulary.ts';
import {
  cents,
  count,
  figure,
  filterQuerySchema,
  headSchema,
  leftOutSchema,
  MARKS_AT_MOST,
  rateSchema,
  rebuildRefSchema,
} from './answers-parts.ts';
import { ruleSchema } from './rules.ts';

/** The level as a fraction: 4/5 = holds four times in five. */
export const contingencyQuerySchema = filterQuerySchema.extend({ level: z.enum(LEVELS).default('4/5') });

/** k = ceil((n + 1)·level): the overrun taken from n sorted ones. Too few yet (k > n): every figure null. */
const ranked = {
  n: count,
  k: count,
  isAttainable: z.boolean(),
  guarantee: figure,
  /** What the level may truly come to with so few rebuilds: 10th and 90th percentile. Two-part: roughly. */
  band: z.object({ lower: z.number(), upper: z.number() }).nullable(),
};

/** Between what a figure moves when any one rebuild is left out. */
const moves = <T extends z.ZodType>(value: T) => z.object({ lowest: value, highest: value });

const percentRuleSchema = z.object({
  ...ranked,
  /** The overrun taken, a fraction, unrounded; may be negative. */
  uplift: figure,
  /** Raised to a whole percent, at least 0: what to adopt. */
  percent: z.int().nullable(),
  /** The rebuild whose overrun it is. */
  taken: rebuildRefSchema.extend({ estimateCents: cents, overrunCents: cents }).nullable(),
  /** Without any one rebuild: the overrun taken, and that as a whole percent. null = too few without one of them. */
  without: z.object({ uplift: moves(z.number()), percent: moves(z.int()) }).nullable(),
});

const twoPartRuleSchema = z.object({
  ...ranked,
  /** Known work costing more, whole percent; the sums that it comes from beside it. */
  creepPercent: z.int().nullable(),
  creepCents: cents,
  estimateCents: cents,
  /** For surprises: as computed, and raised to whole units of money to adopt. */
  flatCents: cents.nullable(),
  adoptFlatCents: cents.nullable(),
  without: z.object({ creepPercent: moves(z.int()), flatCents: moves(cents) }).nullable(),
});

/** How a rule did on rebuilds whose outcome it could not know. `rate` = covered x ÷ scored n, interval approximate. */
const scoreSchema = rateSchema.extend({
  rule: z.enum(['percent', 'two-part', 'flat 10', 'flat 15', 'flat 20', 'flat 25']),
  shortCents: cents,
  unusedCents: cents,
  reserveCents: cents,
});

/** All scored on the same rebuilds. */
const backTestSchema = z.object({
  /** Fewer than five known when it was bought; enough to look but too few for this level. */
  skippedCount: count,
  tooFewCount: count,
  scores: z.array(scoreSchema),
});

/** What a rule asked for one rebuild, as known when it was bought. null = too few yet. */
const askedSchema = z
  .object({ reserveCents: cents, isCovered: z.boolean(), shortCents: cents, unusedCents: cents })
  .nullable();

/** One rebuild against the rules it would have had. */
const trailSchema = rebuildRefSchema.extend({
  exitOn: daySchema,
  year: z.int(),
  estimateCents: cents,
  overrunCents: cents,
  /** overrun ÷ estimate. */
  overrun: z.number(),
  /** Its place among all overruns in order, the smallest 1. */
  place: count,
  knownCount: count,
  /** The overrun that the percent rule took then. */
  uplift: figure,
  asked: askedSchema,
  /** null = foreseen is not said of every entry, so the two-part rule leaves it out. */
  twoPart: z
    .object({
      surpriseCents: cents,
      /** Beyond estimate and creep of today's rule, and its place in that order. */
      leftCents: cents,
      place: count,
      asked: askedSchema,
    })
    .nullable(),
});

const driftFigureSchema = z.object({ n: count, k: count, uplift: figure, percent: z.int().nullable() });

/** Do the last 24 months agree with the years before? */
const driftSchema = z.object({
  /** The last 24 months are the days after this one. */
  after: z.iso.date(),
  all: driftFigureSchema,
  recent: driftFigureSchema,
  before: driftFigureSchema,
  /** Recent rebuilds within the figure of the years before, and how many would be. null = no such figure. */
  withinCount: count.nullable(),
  expectedCount: figure,
  /** null = too few yet to say. */
  verdict: z.enum(['costs more', 'costs less', 'agrees']).nullable(),
});

export const BIDS_LISTED = 50;
const judgedBidSchema = rebuildRefSchema.extend({
  paidCents: cents,
  limitCents: cents,
  reserveCents: cents,
  profitCents: cents,
  ownSeconds: count.nullable(),
});
const bidGroupSchema = z.object({
  count,
  lostCount: count,
  /** Σ profit of those that lost, and of those that did not. */
  lostCents: cents,
  gainedCount: count,
  gainedCents: cents,
  /** Those with known own hours: how many, their hours, and Σ of what they left. */
  timedCount: count,
  ownSeconds: count,
  timedCents: cents,
  /** The first fifty. */
  rebuilds: z.array(judgedBidSchema),
});

/** What the rules of the day would have done to past bids. */
const pastBidsSchema = z.object({
  n: count,
  reserveCents: cents,
  skipped: bidGroupSchema,
  aboveAnyway: bidGroupSchema,
  leftOut: z.array(leftOutSchema),
});

const damageSchema = z.object({
  damageId: idSchema,
  name: z.string(),
  n: count,
  k: count,
  median: figure,
  q10: figure,
  q90: figure,
  /** From nine rebuilds on, if the level is attainable; null = too few yet: use the shop's. */
  uplift: figure,
  percent: z.int().nullable(),
});

/** The rule of a year and how it did on rebuilds bought in that year after it was adopted, and finished since. */
const ruleInForceSchema = ruleSchema.extend({
  record: rateSchema.extend({ shortCents: cents, unusedCents: cents, openCount: count }),
});

export const contingencyAnswerSchema = headSchema.extend({
  level: z.enum(LEVELS),
  estimateCents: cents,
  overrunCents: cents,
  percent: percentRuleSchema,
  twoPart: twoPartRuleSchema,
  /** Percent and flat rules over every rebuild with an estimate. */
  backTest: backTestSchema,
  /** The same with the two-part rule, over those where each entry says whether it was foreseen. */
  twoPartBackTest: backTestSchema,
  /** In the order in which they left; the latest so many. */
  trail: z.array(trailSchema).max(MARKS_AT_MOST),
  trailTotal: count,
  drift: driftSchema,
  /** null = own hours ask for nothing. */
  wantedCentsPerHour: figure,
  pastBids: z.object({ percent: pastBidsSchema, twoPart: pastBidsSchema }),
  damages: z.array(damageSchema),
  thisYear: z.object({ year: z.int(), rule: ruleInForceSchema.nullable() }),
  nextYear: z.object({ year: z.int(), rule: ruleInForceSchema.nullable() }),
});
export type ContingencyAnswer = z.output<typeof contingencyAnswerSchema>;
