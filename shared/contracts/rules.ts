import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import { daySchema, idSchema, optionalTextSchema } from '../fields.ts';
import { LEVELS } from '../vocabulary.ts';

export const RULE_KINDS = ['percent', 'two-part'] as const;

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
  /** Rules set this way, on what was known at the time: covered x of n. */
  covered: z.int(),
  scored: z.int(),
  booksVersion: z.int(),
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
  note: optionalTextSchema(1000).optional(),
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
    summary: 'Adopt the contingency rule that the books ask for, for one shop year',
    body: newRuleSchema,
    response: ruleSchema,
    once: true,
  },
} as const satisfies FeatureApi;
