import { z } from 'zod';
import { parseCents } from '#shared/money.ts';

/** A typed amount as cents, for a form's schema; says what it cannot read. `decimal` is the shop's decimal mark. */
export function centsTextSchema(decimal: '.' | ',') {
  return z.string().transform((text, context) => readCents(text, decimal, context));
}

/** As centsTextSchema, but an empty field is null: nothing said. */
export function optionalCentsTextSchema(decimal: '.' | ',') {
  return z.string().transform((text, context) => (text.trim() === '' ? null : readCents(text, decimal, context)));
}

function readCents(text: string, decimal: '.' | ',', context: z.core.$RefinementCtx): number {
  const cents = parseCents(text, decimal);
  if (cents !== null) return cents;
  context.addIssue({
    code: 'custom',
    message: text.trim() === '' ? 'Type an amount.' : `“${text}” cannot be read as an amount.`,
  });
  return z.NEVER;
}

/** Cents as the text that a money field starts with: plain digits in the shop's decimal mark; '' for null. */
export function centsToText(cents: number | null, decimal: '.' | ','): string {
  return cents === null ? '' : (cents / 100).toFixed(2).replace('.', decimal);
}
