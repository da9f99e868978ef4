import { z } from 'zod';
import { daySchema, idSchema } from '../fields.ts';
import { LEVELS } from '../vocabulary.ts';
import { cents, count, figure, filterQuerySchema, headSchema, rateSchema, rebuildRefSchema } from './answers-parts.ts';
import { ruleSchema } from './rules.ts';

/** The level as a fraction: 4/5 = holds four times in five. */
export const contingencyQuerySchema = filterQuerySchema.extend({ level: z.enum(LEVELS).default('4/5') });

/** k = ceil((n + 1)·level): the overrun taken from n sorted ones. Too few yet (k > n): every figure null. */
const ranked = { n: count, k: count, isAttainable: z.boolean(), guarantee: figure };

const percentRuleSchema = z.object({
  ...ranked,
  /** The overrun taken, a fraction, unrounded; may be negative. */
  uplift: figure,
  /** Raised to a whole percent, at least 0: what to adopt. */
  percent: z.int().nullable(),
  /** The rebuild whose overrun it is. */
  taken: rebuildRefSchema.extend({ estimateCents: cents, overrunCents: cents }).nullable(),
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

/** One rebuild against the rule it would have had. Rule fields null = too few yet. */
const trailSchema = rebuildRefSchema.extend({
  exitOn: daySchema,
  year: z.int(),
  estimateCents: cents,
  overrunCents: cents,
  /** overrun ÷ estimate. */
  overrun: z.number(),
  knownCount: count,
  uplift: figure,
  reserveCents: cents.nullable(),
  isCovered: z.boolean().nullable(),
  shortCents: cents.nullable(),
  unusedCents: cents.nullable(),
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
  /** In the order in which they left; the latest 300. */
  trail: z.array(trailSchema),
  trailTotal: count,
  damages: z.array(damageSchema),
  thisYear: z.object({ year: z.int(), rule: ruleInForceSchema.nullable() }),
  nextYear: z.object({ year: z.int(), rule: ruleInForceSchema.nullable() }),
});
export type ContingencyAnswer = z.output<typeof contingencyAnswerSchema>;
