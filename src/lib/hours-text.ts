import { z } from 'zod';

/**
 * Reads hours as people type them, into whole seconds: `3` `3.5` `3,5` `0:45` `3:30` `2h` `2h 30` `45m`. A bare number
 * is hours. null = not readable, or below zero.
 */
export function parseHours(text: string): number | null {
  const typed = text.trim().toLowerCase().replaceAll(',', '.');
  const plain = /^(\d*\.?\d+|\d+\.)\s*h?$/.exec(typed);
  if (plain) return Math.round(Number(plain[1]) * 3600);
  const clock = /^(\d+)\s*(?::|h)\s*([0-5]?\d)\s*m?(?:in)?$/.exec(typed);
  if (clock) return Number(clock[1]) * 3600 + Number(clock[2]) * 60;
  const minutes = /^(\d+)\s*m(?:in)?$/.exec(typed);
  return minutes ? Number(minutes[1]) * 60 : null;
}

/** Typed hours as seconds, for a form's schema. */
export const hoursTextSchema = z.string().transform((text, context) => {
  const seconds = parseHours(text);
  if (seconds !== null) return seconds;
  const message = text.trim() === '' ? 'Type how long.' : `“${text}” cannot be read as hours. Try 3.5 or 3:30.`;
  context.addIssue({ code: 'custom', message });
  return z.NEVER;
});

/** As hoursTextSchema, but an empty field is null: nothing said. */
export const optionalHoursTextSchema = z.union([
  z
    .string()
    .regex(/^\s*$/)
    .transform(() => null),
  hoursTextSchema,
]);

/** Seconds as the text that a field starts with: decimal hours, '' for null. */
export function hoursToText(seconds: number | null): string {
  return seconds === null ? '' : String(Math.round((seconds / 3600) * 100) / 100);
}
