import { z } from 'zod';
import { daySchema } from '../fields.ts';
import { LEVELS } from '../vocabulary.ts';
import {
  cents,
  count,
  figure,
  headSchema,
  MARKS_AT_MOST,
  rateSchema,
  rebuildRefSchema,
  yearEdge,
} from './answers-parts.ts';
import { RULE_KINDS, ruleSchema } from './rules.ts';

/** Which year's rule is looked at; without one the rule of this shop year, or the latest before it. */
export const ruleReviewQuerySchema = z.strictObject({ year: z.coerce.number().int().min(1949).max(2101).optional() });

/** What the rule was to do on the rebuilds that it judged. */
const gradeSchema = z.object({
  expectedCount: z.number(),
  /** Chance, if nothing has changed, of as few held or fewer, and of as many or more. */
  chanceOfFew: z.number(),
  chanceOfMany: z.number(),
  /** null = too few yet. */
  verdict: z.enum(['held less often', 'held more often', 'luck']).nullable(),
});

/** A rule with how it did on what was bought under it, after it was adopted and before a later one took its place. */
const gradedRuleSchema = ruleSchema.extend({
  from: yearEdge,
  /** The last of its days. */
  to: yearEdge,
  isInForce: z.boolean(),
  record: rateSchema.extend({ shortCents: cents, unusedCents: cents, reserveCents: cents, openCount: count }),
  grade: gradeSchema,
});
export type GradedRule = z.output<typeof gradedRuleSchema>;

const reviewTrialSchema = rebuildRefSchema.extend({
  boughtOn: daySchema.nullable(),
  exitOn: daySchema,
  year: z.int(),
  estimateCents: cents,
  overrunCents: cents,
  reserveCents: cents,
  isCovered: z.boolean(),
  shortCents: cents,
  unusedCents: cents,
});

/** What the books ask for now. null = too few yet at this level. */
const askedNowSchema = z.object({
  kind: z.enum(RULE_KINDS),
  level: z.enum(LEVELS),
  n: count,
  figures: z.object({ percent: z.int(), flatCents: cents.nullable() }).nullable(),
});

/** Did the rule hold? Judged only on rebuilds that it was not set on. */
export const ruleReviewSchema = headSchema.extend({
  thisYear: z.int(),
  /** null = no rule was ever adopted up to this year. */
  reviewed: gradedRuleSchema
    .extend({
      /** In the order in which they left; the latest so many. */
      trials: z.array(reviewTrialSchema).max(MARKS_AT_MOST),
      /** The year that a decision is for: the one after it, or this one if that is later. */
      nextYear: z.int(),
      /** The rule already adopted for that year. */
      next: ruleSchema.nullable(),
      /** Its own kind first, at its own level. */
      askedNow: z.array(askedNowSchema),
      /** The share it was set to hold. */
      share: figure,
    })
    .nullable(),
  /** Every rule ever adopted, the earliest first. */
  history: z.array(gradedRuleSchema),
});
export type RuleReview = z.output<typeof ruleReviewSchema>;
