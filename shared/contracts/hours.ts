import { z } from 'zod';
import { daySchema, idSchema, optionalTextSchema } from '../fields.ts';

/** Hours on a rebuild, kept as whole seconds. Person and day may be unknown (a total from an old sheet). */
export const hoursFieldsSchema = z.strictObject({
  rebuildId: idSchema,
  workerId: idSchema.nullable(),
  workedOn: daySchema.nullable(),
  seconds: z.int().min(0).max(360_000_000, { error: 'That is more hours than anyone works.' }),
  /** Paid work is in the costs already; "per hour" counts unpaid hours. */
  isPaid: z.boolean(),
  task: optionalTextSchema(200),
});
export type HoursFields = z.output<typeof hoursFieldsSchema>;

export const hoursEntrySchema = z.object({
  ...hoursFieldsSchema.shape,
  id: idSchema,
  isGuess: z.boolean(),
  importId: idSchema.nullable(),
  importSheet: z.int().nullable(),
  importRow: z.int().nullable(),
  voidedAt: z.string().nullable(),
  voidReason: z.string().nullable(),
  version: z.int(),
});
export type HoursEntry = z.output<typeof hoursEntrySchema>;
