import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import { cursorSchema, idSchema, nextSchema, yesNoQuerySchema } from '../fields.ts';
import { FORESEEN, REBUILD_DATES, type RebuildDate } from '../vocabulary.ts';

/** What one row of the file holds. */
export const SHAPES = ['expenses', 'vehicles', 'hours'] as const;
export type Shape = (typeof SHAPES)[number];

/** How a row of the file ended; every row ends as exactly one of these. */
export const OUTCOMES = ['taken', 'put aside', 'not data'] as const;
export type Outcome = (typeof OUTCOMES)[number];

/** Why a row or a cell was put aside. */
export const ASIDE_REASONS = [
  'bad-date',
  'bad-amount',
  'missing-amount',
  'ambiguous-amount',
  'bad-hours',
  'missing-vehicle',
  'ambiguous-vehicle',
  'duplicate',
  'malformed-row',
  'cell-too-long',
  'currency',
  'not-a-data-row',
  'bad-value',
] as const;
export type AsideReason = (typeof ASIDE_REASONS)[number];

/** Why a whole file is refused. */
export const REFUSALS = [
  'empty',
  'not-text',
  'unclosed-quote',
  'cell-too-long',
  'too-wide',
  'currency',
  'shape',
] as const;
export type RefusalKind = (typeof REFUSALS)[number];

/** Kinds of row that hold nothing for the books. */
export const NOT_DATA = ['blank', 'title', 'heading', 'total', 'note'] as const;
export type NotData = (typeof NOT_DATA)[number];

const DATE_MEANINGS = REBUILD_DATES.map(([field]) => field) as [RebuildDate, ...RebuildDate[]];

/** What a column may hold. `cost` and `estimate` go with a category. */
export const MEANINGS = [
  'ignore',
  'derived',
  'date',
  'vehicle',
  'category',
  'what',
  'vendor',
  'foreseen',
  'amount',
  'credit',
  'stock number',
  'year',
  'make',
  'model',
  'trim',
  'vin',
  'class',
  'damage',
  'second damage',
  'title brand',
  'odometer',
  'seen',
  'bought from',
  'notes',
  ...DATE_MEANINGS,
  'purchase',
  'cost',
  'estimate',
  'hours',
  'estimated hours',
  'sale',
  'asking',
  'expected sale',
  'person',
  'task',
] as const;
export const meaningSchema = z.enum(MEANINGS);
export type Meaning = z.infer<typeof meaningSchema>;

export const columnChoiceSchema = z.strictObject({
  /** 1 = the first column. */
  col: z.int().min(1).max(1000),
  meaning: meaningSchema,
  category: z.string().max(120).nullable(),
});
export type ColumnChoice = z.infer<typeof columnChoiceSchema>;

export const columnSchema = columnChoiceSchema.extend({
  heading: z.string(),
  samples: z.array(z.string()),
  /** Why the column is taken so, in words. */
  why: z.string(),
});
export type Column = z.infer<typeof columnSchema>;

export const choiceSchema = z.object({
  id: z.string(),
  kind: z.enum(['date-order', 'columns', 'vehicle', 'category', 'duplicate', 'amount-column']),
  question: z.string(),
  column: z.string().nullable(),
  options: z.array(z.object({ value: z.string(), label: z.string() })),
  /** What is done unless someone answers otherwise. */
  preset: z.string(),
  answer: z.string().nullable(),
  /** The file cannot tell: the import waits for an answer. */
  mustAsk: z.boolean(),
  why: z.string(),
});
export type Choice = z.infer<typeof choiceSchema>;

export const lineSchema = z.object({
  kind: z.enum(['entry', 'purchase', 'sale', 'asking', 'expected sale', 'estimate', 'hours', 'estimated hours']),
  /** Place in `rebuilds`; null = overhead. */
  rebuild: z.int().nullable(),
  category: z.string().nullable(),
  on: z.string().nullable(),
  cents: z.int(),
  seconds: z.int(),
  vendor: z.string().nullable(),
  what: z.string().nullable(),
  foreseen: z.enum(FORESEEN).nullable(),
  isExtra: z.boolean(),
  person: z.string().nullable(),
  isGuess: z.boolean(),
  row: z.int(),
  col: z.int(),
});
export type Line = z.infer<typeof lineSchema>;

export const asideSchema = z.object({
  row: z.int(),
  /** The cell at fault; null = the whole row. */
  col: z.int().nullable(),
  /** A cell of a row that came in otherwise, or the row itself? */
  isCell: z.boolean(),
  reason: z.enum(ASIDE_REASONS),
  text: z.string(),
  /** Readable money on it, in cents; null = none. */
  cents: z.int().nullable(),
});
export type Aside = z.infer<typeof asideSchema>;

export const rebuildFoundSchema = z.object({
  tag: z.string(),
  /** The rebuild of the books that these rows belong to; null = a new one. */
  existingId: z.string().nullable(),
  year: z.int().nullable(),
  make: z.string().nullable(),
  model: z.string().nullable(),
  trim: z.string().nullable(),
  vin: z.string().nullable(),
  className: z.string().nullable(),
  damageName: z.string().nullable(),
  secondDamageName: z.string().nullable(),
  titleBrand: z.string().nullable(),
  odometer: z.int().nullable(),
  isSeen: z.boolean().nullable(),
  boughtFrom: z.string().nullable(),
  notes: z.string().nullable(),
  purchaseCents: z.int().nullable(),
  askingCents: z.int().nullable(),
  saleCents: z.int().nullable(),
  expectedSaleCents: z.int().nullable(),
  dates: z.record(z.string(), z.string()),
  /** How the file writes it. */
  spellings: z.array(z.string()),
  row: z.int(),
});
export type RebuildFound = z.infer<typeof rebuildFoundSchema>;

export const statedTotalSchema = z.object({
  row: z.int(),
  col: z.int(),
  label: z.string(),
  measure: z.enum(['money', 'hours']),
  /** Cents or seconds. */
  stated: z.int(),
  imported: z.int(),
  /** On rows and cells put aside under it, as far as readable. */
  putAside: z.int(),
  explanation: z.string(),
});
export type StatedTotal = z.infer<typeof statedTotalSchema>;

export const controlSchema = z.object({
  /** Rows that hold anything: taken + put aside + not data. */
  rowsRead: z.int(),
  taken: z.int(),
  putAside: z.int(),
  notData: z.int(),
  blankRows: z.int(),
  rebuilds: z.int(),
  entries: z.int(),
  /** Cents per category, the purchase under `purchase`. */
  centsByCategory: z.record(z.string(), z.int()),
  /** Purchases and entries together. */
  costCents: z.int(),
  creditCents: z.int(),
  saleCents: z.int(),
  estimateCents: z.int(),
  /** Readable money on what was put aside. */
  putAsideCents: z.int(),
  hoursSeconds: z.int(),
});
export type Control = z.infer<typeof controlSchema>;

export const firstRowSchema = z.object({
  row: z.int(),
  cells: z.array(z.string()),
  outcome: z.enum(OUTCOMES),
  reason: z.string().nullable(),
  lines: z.array(lineSchema),
});
export type FirstRow = z.infer<typeof firstRowSchema>;

export const readingSchema = z.object({
  format: z.object({
    encoding: z.string(),
    delimiter: z.string(),
    decimal: z.enum(['.', ',']),
    headingRow: z.int().nullable(),
  }),
  shape: z.enum(SHAPES).nullable(),
  refusal: z.object({ kind: z.enum(REFUSALS), message: z.string(), row: z.int().nullable() }).nullable(),
  columns: z.array(columnSchema),
  choices: z.array(choiceSchema),
  rebuilds: z.array(rebuildFoundSchema),
  firstRows: z.array(firstRowSchema),
  asides: z.array(asideSchema),
  asideCount: z.int(),
  notData: z.record(z.enum(NOT_DATA), z.int()),
  statedTotals: z.array(statedTotalSchema),
  control: controlSchema,
  remarks: z.array(z.string()),
});
export type Reading = z.infer<typeof readingSchema>;

export const IMPORT_STATES = ['reading', 'ready', 'committing', 'committed', 'undone', 'refused', 'discarded'] as const;
export type ImportState = (typeof IMPORT_STATES)[number];

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
});
export type Import = z.infer<typeof importSchema>;

export const importRowSchema = z.object({
  row: z.int(),
  cells: z.array(z.string()),
  outcome: z.enum(OUTCOMES),
  reason: z.string().nullable(),
});
export type ImportRow = z.infer<typeof importRowSchema>;

/** What a person says about a file: what columns hold, and answers to its questions (id → value). */
export const importSettingsSchema = z.strictObject({
  columns: z.array(columnChoiceSchema).max(1000).optional(),
  answers: z.record(z.string().max(400), z.string().max(400)).optional(),
});
export type ImportSettings = z.infer<typeof importSettingsSchema>;

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
    summary: 'Upload a spreadsheet as text (field "file"); it is read, nothing is booked yet',
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
  rows: {
    method: 'GET',
    path: '/api/imports/:importId/rows',
    summary: 'Rows of a file that came in, each with how it ended',
    params,
    query: z.strictObject({ cursor: cursorSchema, outcome: z.enum(OUTCOMES).optional() }),
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
