import { z } from 'zod';
import { ProblemError } from './problems.ts';

/** Where a page of a list ends: the values that the next one starts after. Opaque to the caller. */
export function writeCursor(parts: readonly (string | number | null)[]): string {
  return Buffer.from(JSON.stringify(parts)).toString('base64url');
}

const text = z.string().transform((cursor, context): unknown => {
  try {
    return JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
  } catch {
    context.addIssue({ code: 'custom', message: 'Not a cursor.' });
    return z.NEVER;
  }
});

/** Reads a cursor back; null = the first page. One that this list did not write is the caller's mistake. */
export function readCursor<S extends z.ZodType>(cursor: string | undefined, parts: S): z.output<S> | null {
  if (cursor === undefined) return null;
  const parsed = text.pipe(parts as z.ZodType<z.output<S>, unknown>).safeParse(cursor);
  if (parsed.success) return parsed.data;
  throw new ProblemError(400, {
    detail: 'This list cannot go on from there. Open it anew.',
    errors: [{ pointer: '/cursor', detail: 'Not a cursor of this list.' }],
  });
}

/** A typed word as a LIKE pattern that finds it anywhere; use with ESCAPE '\'. */
export function likePattern(word: string): string {
  return `%${word.trim().replace(/[\\%_]/g, '\\$&')}%`;
}
