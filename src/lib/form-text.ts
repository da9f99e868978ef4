import { z } from 'zod';
import { daySchema } from '#shared/fields.ts';

/** Fields of a form hold text; these turn an empty one into null, as contracts want it. */
export const optionalText = z.string().transform((text) => text.trim() || null);

/** A chosen id, or null for nothing. */
export const optionalPick = z.string().transform((id) => id || null);

/** A day, or null for an empty field; said at its field together with the faults of the others. */
export const optionalDay = z.string().transform((text, context) => {
  if (text === '') return null;
  const day = daySchema.safeParse(text);
  if (day.success) return day.data;
  for (const { message } of day.error.issues) context.addIssue({ code: 'custom', message });
  return z.NEVER;
});

/** A whole number typed, or null. */
export const optionalCount = z.string().transform((text, context) => {
  const typed = text.replace(/[\s,.']/g, '');
  if (typed === '') return null;
  if (/^\d+$/.test(typed)) return Number(typed);
  context.addIssue({ code: 'custom', message: `“${text}” is not a whole number.` });
  return z.NEVER;
});

/** The last step of a form's schema: what the fields became must be what the contract takes; faults keep their field. */
export function into<S extends z.ZodType>(contract: S) {
  return (fields: unknown, context: z.core.$RefinementCtx): z.output<S> => {
    const parsed = contract.safeParse(fields);
    if (parsed.success) return parsed.data;
    for (const { path, message } of parsed.error.issues)
      context.issues.push({ code: 'custom', message, path, input: fields });
    return z.NEVER;
  };
}
