import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import { cursorSchema, idSchema, nextSchema, yesNoQuerySchema } from '../fields.ts';
import { columnChoiceSchema, lineSchema, readingSchema } from './import-reading.ts';
import { OUTCOMES, SHAPES } from './import-words.ts';

export const IMPORT_STATES = ['reading', 'ready', 'committing', 'committed', 'undone', 'refused', 'discarded'] as const;
export type ImportState = (typeof IMPORT_STATES)[number];

/** One cell as a person corrected it; the raw cell is kept beside it. */
export const cellEditSchema = z.strictObject({
  sheet: z.int().min(1).max(2000),
  row: z.int().min(1).max(10_000_000),
  col: z.int().min(1).max(1000),
  text: z
    .string()
    .max(2000)
    .refine((text) => !/\p{Surrogate}/u.test(text), 'This text is damaged.'),
});
export type CellEdit = z.infer<typeof cellEditSchema>;

/** What a person says about a file: what columns hold, answers to its questions (id → value), cells put right, rows left out. */
export const importSettingsSchema = z.strictObject({
  columns: z.array(columnChoiceSchema).max(1000).optional(),
  answers: z.record(z.string().max(400), z.string().max(400)).optional(),
  /** All corrections so far: the list sent takes the place of the one before. */
  cells: z.array(cellEditSchema).max(5000).optional(),
  leftOut: z
    .array(cellEditSchema.pick({ sheet: true, row: true }))
    .max(5000)
    .optional(),
});
export type ImportSettings = z.infer<typeof importSettingsSchema>;

export const importSummarySchema = z.object({
  id: idSchema,
  fileName: z.string(),
  byteSize: z.int(),
  state: z.enum(IMPORT_STATES),
  shape: z.enum(SHAPES).nullable(),
  refusal: z.string().nullable(),
  createdBy: z.string(),
  createdAt: z.string(),
  committedAt: z.string().nullable(),
  undoneAt: z.string().nullable(),
  rowsTaken: z.int().nullable(),
  rowsPutAside: z.int().nullable(),
  version: z.int(),
});
export type ImportSummary = z.infer<typeof importSummarySchema>;

export const importSchema = importSummarySchema.extend({
  /** Share of the file gone through, 0–1, while it is read or committed. */
  progress: z.number().nullable(),
  reading: readingSchema.nullable(),
  /** Every file of this import; pasted cells count as one. */
  files: z.array(z.object({ number: z.int(), name: z.string(), byteSize: z.int() })),
  /** What people said of it so far. */
  settings: importSettingsSchema,
});
export type Import = z.infer<typeof importSchema>;

export const importRowSchema = z.object({
  sheet: z.int(),
  row: z.int(),
  cells: z.array(z.string()),
  outcome: z.enum(OUTCOMES),
  reason: z.string().nullable(),
  /** What was read from it, by cell. Booked entries carry their id. */
  lines: z.array(lineSchema.extend({ entryId: idSchema.nullable() })),
});
export type ImportRow = z.infer<typeof importRowSchema>;

/** One event of the stream: the state, and the share of the file gone through, 0–1. */
export const progressSchema = z.object({ state: z.enum(IMPORT_STATES), progress: z.number().nullable() });
export type Progress = z.infer<typeof progressSchema>;

const params = z.strictObject({ importId: idSchema });
const reply = importSchema;

export const importsApi = {
  list: {
    method: 'GET',
    path: '/api/imports',
    summary: 'Files brought in, newest first',
    query: z.strictObject({ cursor: cursorSchema }),
    response: z.object({ rows: z.array(importSummarySchema), next: nextSchema }),
  },
  upload: {
    method: 'POST',
    path: '/api/imports',
    summary:
      'Upload workbooks or spreadsheets as text (field "file", up to twenty); they are read as one, nothing is booked yet',
    query: z.strictObject({ importAnyway: yesNoQuerySchema.optional() }),
    upload: true,
    response: reply,
    once: true,
  },
  show: {
    method: 'GET',
    path: '/api/imports/:importId',
    summary: 'How a file was understood',
    params,
    response: reply,
  },
  progress: {
    method: 'GET',
    path: '/api/imports/:importId/progress',
    summary: 'Follow an import while it is read or booked; the stream ends when it is done',
    params,
    response: progressSchema,
    stream: true,
  },
  rows: {
    method: 'GET',
    path: '/api/imports/:importId/rows',
    summary: 'Rows of a file, booked or only read, each with how it ended and what was read from it',
    params,
    query: z.strictObject({
      cursor: cursorSchema,
      outcome: z.enum(OUTCOMES).optional(),
      /** Start at this row of this sheet. */
      sheet: z.coerce.number().int().min(1).max(2000).optional(),
      row: z.coerce.number().int().min(1).max(10_000_000).optional(),
    }),
    response: z.object({ rows: z.array(importRowSchema), next: nextSchema }),
  },
  change: {
    method: 'PATCH',
    path: '/api/imports/:importId',
    summary: 'Say what columns hold or answer questions; the file is read again',
    params,
    body: importSettingsSchema,
    response: reply,
    edits: true,
  },
  commit: {
    method: 'POST',
    path: '/api/imports/:importId/commit',
    summary: 'Book everything that was understood, at once or not at all; asked twice, it books once',
    params,
    response: reply,
    edits: 'optional',
  },
  undo: {
    method: 'POST',
    path: '/api/imports/:importId/undo',
    summary: 'Take an import out of the books as if it had never been',
    params,
    response: reply,
  },
  discard: {
    method: 'DELETE',
    path: '/api/imports/:importId',
    summary: 'Drop a file that is not booked',
    params,
    response: reply,
  },
} as const satisfies FeatureApi;
