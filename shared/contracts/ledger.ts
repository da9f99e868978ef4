import { z } from 'zod';
import { centsSchema, daySchema, idSchema, optionalTextSchema, positiveCentsSchema } from '../fields.ts';
import { FORESEEN } from '../vocabulary.ts';

/** What a person may say of an entry. A credit is negative. Without a rebuild it is overhead and needs a day. */
const entryFields = z.strictObject({
  rebuildId: idSchema.nullable(),
  categoryId: idSchema,
  datedOn: daySchema.nullable(),
  cents: centsSchema,
  vendor: optionalTextSchema(200),
  what: optionalTextSchema(500),
  foreseen: z.enum(FORESEEN).nullable(),
  /** Chosen extra: counts in cost and profit, never in overrun, surprises or contingency. */
  isExtra: z.boolean(),
  /** Market value of something received free; then `cents` is 0. */
  freeValueCents: positiveCentsSchema.nullable(),
  receipt: optionalTextSchema(200),
});
export const entryFieldsSchema = entryFields;
export type EntryFields = z.output<typeof entryFieldsSchema>;

export const newEntrySchema = entryFields
  .partial()
  .required({ categoryId: true, cents: true })
  .refine((entry) => entry.rebuildId || entry.datedOn, {
    path: ['datedOn'],
    error: 'Overhead needs a day, so that it falls in a year.',
  })
  .refine((entry) => entry.freeValueCents == null || entry.cents === 0, {
    path: ['cents'],
    error: 'What came free costs 0; its value stands beside it.',
  });

export const entryChangeSchema = entryFields.partial();

export const entrySchema = z.object({
  ...entryFields.shape,
  id: idSchema,
  splitId: idSchema.nullable(),
  isGuess: z.boolean(),
  importId: idSchema.nullable(),
  importSheet: z.int().nullable(),
  importRow: z.int().nullable(),
  importCol: z.int().nullable(),
  voidedAt: z.string().nullable(),
  voidReason: z.string().nullable(),
  version: z.int(),
});
export type Entry = z.output<typeof entrySchema>;
