import { z } from 'zod';
import { HINTS } from './import-words.ts';

/** Something worth knowing about a place in the file that is no datum: a comment on a cell, a hidden row. */
export const hintSchema = z.object({
  sheet: z.int(),
  row: z.int(),
  /** null = the whole row, or the whole column where `row` is 0. */
  col: z.int().nullable(),
  kind: z.enum(HINTS),
  text: z.string(),
});
export type Hint = z.infer<typeof hintSchema>;

/** An earlier import whose rows stand in this file, too: they are not taken again. */
export const earlierSchema = z.object({
  importId: z.string(),
  fileName: z.string(),
  committedAt: z.string(),
  /** Rows of this file that came in then, and rows that look like one of then with something changed. */
  sameRows: z.int(),
  changedRows: z.int(),
});
export type Earlier = z.infer<typeof earlierSchema>;
