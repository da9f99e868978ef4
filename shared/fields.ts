import { z } from 'zod';
import { isDay } from './day.ts';
import { MAX_CENTS } from './money.ts';

/** Building blocks of contracts: the same checks in the form and at the server's door. */

/** 16 random bytes in base64url. */
export const idSchema = z.string().regex(/^[A-Za-z0-9_-]{22}$/, { error: 'Not an id.' });

/** A day that exists, `YYYY-MM-DD`, 1950 to 2100. */
export const daySchema = z.string().refine(isDay, { error: 'Give a day that exists, between 1950 and 2100.' });

/** A whole number of cents, either sign. */
export const centsSchema = z
  .int({ error: 'Give an amount in whole cents.' })
  .min(-MAX_CENTS, { error: 'That amount is too large.' })
  .max(MAX_CENTS, { error: 'That amount is too large.' });

/** The most time that one record holds: a hundred thousand hours, in seconds. */
export const MAX_SECONDS = 360_000_000;

/** Whole seconds of work. */
export const secondsSchema = z.int().min(0).max(MAX_SECONDS, { error: 'That is more hours than anyone works.' });

export const positiveCentsSchema = centsSchema.min(0, { error: 'This cannot be below zero.' });

// A NUL or half of a surrogate pair is damage from somewhere else, never something typed.
const DAMAGED = /\0|[\uD800-\uDBFF](?![\uDC00-\uDFFF])|(?<![\uD800-\uDBFF])[\uDC00-\uDFFF]/;

/** Text kept as typed but for spaces at its ends, in NFC; refused when longer than `most` characters. */
export function textSchema(most: number, least = 1) {
  return z
    .string()
    .refine((text) => !DAMAGED.test(text), { error: 'This text holds characters that cannot be kept.' })
    .transform((text) => text.trim().normalize('NFC'))
    .pipe(
      z
        .string()
        .min(least, { error: 'Fill this in.' })
        .max(most, { error: `At most ${most} characters.` }),
    );
}

/** Optional text: an empty field is no text. */
export function optionalTextSchema(most: number) {
  return textSchema(most, 0)
    .transform((text) => text || null)
    .nullable();
}

/** A page of a list: where it goes on (null = at its end). */
export const cursorSchema = z.string().max(400).optional();
export const nextSchema = z.string().nullable();

/** Yes or no in an address (`true`/`false`). */
export const yesNoQuerySchema = z.enum(['true', 'false']).transform((text) => text === 'true');
