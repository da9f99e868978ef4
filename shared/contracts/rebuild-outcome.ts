import { z } from 'zod';
import { idSchema } from '../fields.ts';

/** One category of one rebuild: the locked plan against what it came to. Cents. */
export const categoryOutcomeSchema = z.object({
  categoryId: idSchema,
  name: z.string(),
  /** null = no locked estimate at all; 0 = locked, nothing planned here. */
  estimateCents: z.int().nullable(),
  /** What was paid: the sum of all entries. */
  paidCents: z.int(),
  /** What a plan must expect: without chosen extras, free things at market value. This is what the gap bar shows. */
  planningCents: z.int(),
  surpriseCents: z.int(),
  extraCents: z.int(),
  freeCents: z.int(),
  entryCount: z.int(),
});
export type CategoryOutcome = z.output<typeof categoryOutcomeSchema>;

/** Days between two of the marking dates. `days` is null while one is unknown. */
export const stageDaysSchema = z.object({ name: z.string(), days: z.int().nullable() });

/** Something to look at twice; it never blocks. `pointer` names the field. */
export const warningSchema = z.object({ pointer: z.string(), detail: z.string() });

/** A caution where the work can hurt. `asked` names the date whose marking brings it up; null = shown always. */
export const cautionSchema = z.object({
  about: z.string(),
  text: z.string(),
  asked: z.enum(['roadworthyOn', 'listedOn', 'soldOn']).nullable(),
});
export type Caution = z.output<typeof cautionSchema>;

export const vinCheckSchema = z.object({
  isValid: z.boolean(),
  problem: z.enum(['length', 'character', 'check digit']).nullable(),
  suggestions: z.array(z.string()),
});
