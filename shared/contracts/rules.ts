import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import { daySchema, idSchema, optionalTextSchema, positiveCentsSchema } from '../fields.ts';
import { LEVELS } from '../vocabulary.ts';

export const RULE_KINDS = ['percent', 'two-part'] as const;

/** A rule holds at most so many percent: an estimate that is off by more is no plan to put a cushion on. */
export const MOST_PERCENT = 1000;

/** The sums that the figure was taken from, kept as they were on the day. */
export const ruleEvidenceSchema = z.object({
  n: z.int(),
  k: z.int(),
  /** k ÷ (n + 1). */
  guarantee: z.number(),
  /** Percent: the overrun taken, before rounding up. Two-part: null. */
  uplift: z.number().nullable(),
  /** Two-part: the flat part before rounding up to whole units of money. */
  flatCents: z.int().nullable(),
  /** What the books asked for, rounded up: the rule itself may be set otherwise. null = an old rule, adopted as asked. */
  askedPercent: z.int().nullable().default(null),
  askedFlatCents: z.int().nullable().default(null),
  /** Rules set this way, on what was known at the time: covered x of n. */
  covered: z.int(),
  scored: z.int(),
  booksVersion: z.int(),
});

/** What was seen of the rule before when this one was adopted: it was kept as it was, or changed. */
export const ruleReviewedSchema = z.object({
  ruleId: idSchema,
  year: z.int(),
  revision: z.int(),
  decision: z.enum(['kept', 'changed']),
  /** Held x of n bought under it and finished; so many were not finished. */
  x: z.int(),
  n: z.int(),
  openCount: z.int(),
  shortCents: z.int(),
  unusedCents: z.int(),
});

/** A contingency rule as adopted for a shop year. Later revisions stand beside it; the highest is in force. */
export const ruleSchema = z.object({
  id: idSchema,
  year: z.int(),
  revision: z.int(),
  kind: z.enum(RULE_KINDS),
  level: z.enum(LEVELS),
  /** Whole percent on top of the estimate. */
  percent: z.int(),
  /** For surprises, on top of that. null = a percent rule. */
  flatCents: z.int().nullable(),
  /** Rebuilds that it was set on, and the last day that one of them left. */
  rebuildCount: z.int(),
  dataUntil: daySchema,
  evidence: ruleEvidenceSchema,
  note: z.string().nullable(),
  /** null = adopted without looking at an earlier one. */
  review: ruleReviewedSchema.nullable(),
  adoptedOn: daySchema,
  adoptedAt: z.string(),
  adoptedByName: z.string(),
});
export type Rule = z.output<typeof ruleSchema>;

export const newRuleSchema = z.strictObject({
  /** This shop year or the next. */
  year: z.int().min(1950).max(2101),
  level: z.enum(LEVELS),
  kind: z.enum(RULE_KINDS),
  /** Set otherwise than the books ask: above it freely, below it only with a note that says why, or as kept. */
  percent: z.int({ error: 'Give a whole percent.' }).min(0).max(MOST_PERCENT).optional(),
  flatCents: positiveCentsSchema.optional(),
  note: optionalTextSchema(1000).optional(),
  /** The rule whose record was looked at. The same figures again are kept, others are a change. */
  reviewedRuleId: idSchema.optional(),
});

export const rulesApi = {
  list: {
    method: 'GET',
    path: '/api/rules',
    summary: 'Contingency rules adopted so far, the latest first',
    response: z.object({ rules: z.array(ruleSchema) }),
  },
  adopt: {
    method: 'POST',
    path: '/api/rules',
    summary: 'Adopt a contingency rule for one shop year: as the books ask, above it, or below it with a reason',
    body: newRuleSchema,
    response: ruleSchema,
    once: true,
  },
} as const satisfies FeatureApi;
