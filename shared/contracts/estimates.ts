import { z } from 'zod';
import { daySchema, idSchema, optionalTextSchema, positiveCentsSchema, secondsSchema } from '../fields.ts';

/** An estimate: the plan before work starts (the baseline once locked), or a later revision beside it. */
export const estimateFieldsSchema = z.strictObject({
  lines: z
    .array(z.strictObject({ categoryId: idSchema, cents: positiveCentsSchema }))
    .max(60)
    .refine((lines) => new Set(lines.map((line) => line.categoryId)).size === lines.length, {
      error: 'A category stands here twice.',
    }),
  plannedSeconds: secondsSchema.nullable(),
  expectedSaleCents: positiveCentsSchema.nullable(),
  expectedDays: z.int().min(0).max(10_000).nullable(),
  note: optionalTextSchema(1000),
});
export type EstimateFields = z.output<typeof estimateFieldsSchema>;

export const estimateSchema = z.object({
  ...estimateFieldsSchema.shape,
  id: idSchema,
  rebuildId: idSchema,
  revision: z.int(),
  isBaseline: z.boolean(),
  madeOn: daySchema.nullable(),
  lockedAt: z.string().nullable(),
  version: z.int(),
});
export type Estimate = z.output<typeof estimateSchema>;
