import { z } from 'zod';
import { positiveCentsSchema } from '../fields.ts';
import { LADDER_RUNGS } from '../measures/ladder-rungs.ts';
import { LEVELS } from '../vocabulary.ts';
import { count, figure, rateSchema } from './answers-parts.ts';

/** From this bid on, this fee; rising. A bid below the first row pays none of it. Cents. */
const feeStepsSchema = z
  .array(z.tuple([positiveCentsSchema, positiveCentsSchema]))
  .max(100)
  .refine((steps) => steps.every(([from], i) => i === 0 || from > (steps[i - 1]?.[0] ?? 0)), {
    error: 'The bids of the fee table must rise from row to row.',
  });

/** How a bid is charged, and what the shop usually spends around a purchase. */
export const feeTableFieldsSchema = z.strictObject({
  feeSteps: feeStepsSchema,
  /** On top of the table, whatever the bid. */
  feeFlatCents: positiveCentsSchema,
  bidStepCents: positiveCentsSchema.min(1, { error: 'A bid rises by at least a cent.' }),
  /** Tax on the bid as the fraction p/q: 6.5 % is 13/200. */
  tax: z.strictObject({
    p: z.int().min(0).max(1_000_000),
    q: z.int().min(1, { error: 'A fraction of nothing says nothing.' }).max(1_000_000),
  }),
  transportCents: positiveCentsSchema,
  /** Title and inspection. */
  titleCents: positiveCentsSchema,
  sellingCents: positiveCentsSchema,
  holdingCentsPerDay: positiveCentsSchema,
  wantedProfitCents: positiveCentsSchema,
});
export type FeeTableFields = z.output<typeof feeTableFieldsSchema>;

/** Version 0 = the shop has not set one yet; it then stands empty, with a bid step of 50. */
export const feeTableSchema = z.object({ ...feeTableFieldsSchema.shape, version: z.int() });
export type FeeTable = z.output<typeof feeTableSchema>;

/** How a plan is cushioned: the rule adopted for this year, a rule on this car's rung, a percentage of one's own, not at all. */
export const sheetRuleSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('in force') }),
  z.strictObject({ kind: z.literal('percent'), level: z.enum(LEVELS) }),
  z.strictObject({ kind: z.literal('two-part'), level: z.enum(LEVELS) }),
  z.strictObject({ kind: z.literal('flat'), percent: z.int().min(0).max(1000) }),
  z.strictObject({ kind: z.literal('none') }),
]);
export type SheetRule = z.output<typeof sheetRuleSchema>;

/** The rule as it was used, with its figures and what it rests on. */
export const usedRuleSchema = z.object({
  kind: z.enum(['in force', 'percent', 'two-part', 'flat', 'none']),
  /** Of a rule from past rebuilds. */
  level: z.enum(LEVELS).nullable(),
  /** Of the rule in force: the shop year it is adopted for. */
  year: z.int().nullable(),
  /** "Based on". null = no rung of past rebuilds, or too few yet on every rung. */
  rung: z.enum(LADDER_RUNGS).nullable(),
  /** Past rebuilds behind it; the k-th of them in order is the one taken. null = it rests on none, or was adopted. */
  n: count.nullable(),
  k: count.nullable(),
  /** Whole percent (two-part, flat, adopted). null = see `overrunCents`. */
  percent: z.int().nullable(),
  flatCents: z.int().nullable(),
  /** Percent rule: the overrun taken over its estimate, unrounded. */
  overrunCents: z.int().nullable(),
  estimateCents: z.int().nullable(),
  /** Too few past rebuilds, or no rule adopted: there is no repair budget, and so no bid. */
  isMissing: z.boolean(),
});
export type UsedRule = z.output<typeof usedRuleSchema>;

/** Chance by past rebuilds put on this sheet; see the measure `jointChance`. */
export const jointChanceSchema = z.object({
  rung: z.enum(LADDER_RUNGS),
  repair: rateSchema,
  sale: rateSchema,
  both: rateSchema,
  wanted: rateSchema,
  beyondCents: z.object({ p10: z.number(), p50: z.number(), p90: z.number() }).nullable(),
  medianInterval: z.object({ lower: z.number(), upper: z.number() }).nullable(),
  seed: z.int(),
  resampleCount: z.int(),
});

/** What a sheet comes to. Cents; null = there is none. */
export const bidFiguresSchema = z.object({
  planCents: z.int(),
  rule: usedRuleSchema,
  /** Plan and cushion. */
  repairBudgetCents: z.int().nullable(),
  /** The sale that the bid counts on. */
  saleCents: z.int(),
  holdingCents: z.int(),
  /** Own hours at the wanted pay, raised to the cent. */
  ownPayCents: z.int(),
  /** For bid, fee and tax together; may be below 0. */
  roomCents: z.int().nullable(),
  /** The walk-away bid. */
  bidCents: z.int().nullable(),
  feeCents: z.int().nullable(),
  taxCents: z.int().nullable(),
  leftCents: z.int().nullable(),
  /** Past sales that reached this share of what was expected: the chance that the counted-on sale stands for. */
  saleChance: rateSchema,
  saleShare: figure,
  /** null = see `jointReason`. */
  joint: jointChanceSchema.nullable(),
  jointReason: z.enum(['too few past pairs', 'no bid', 'no plan', 'no expected sale']).nullable(),
});
export type BidFigures = z.output<typeof bidFiguresSchema>;
