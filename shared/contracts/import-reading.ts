import { z } from 'zod';
import { FORESEEN, REBUILD_DATES, type RebuildDate } from '../vocabulary.ts';
import { earlierSchema, hintSchema } from './import-beside.ts';
import { ASIDE_REASONS, CHOICE_KINDS, NOT_DATA, OUTCOMES, REFUSALS, SHAPES } from './import-words.ts';

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

/** The sheet that something stands on; readings kept from before workbooks could be read name none. */
const sheetSchema = z.int().default(1);

export const columnChoiceSchema = z.strictObject({
  /** 1 = the first sheet of a workbook, and the only one of a text file. */
  sheet: z.int().min(1).max(2000).optional(),
  /** 1 = the first column. */
  col: z.int().min(1).max(1000),
  meaning: meaningSchema,
  category: z.string().max(120).nullable(),
});
export type ColumnChoice = z.infer<typeof columnChoiceSchema>;

export const columnSchema = columnChoiceSchema.extend({
  sheet: sheetSchema,
  heading: z.string(),
  samples: z.array(z.string()),
  /** Why the column is taken so, in words. */
  why: z.string(),
});
export type Column = z.infer<typeof columnSchema>;

export const choiceSchema = z.object({
  id: z.string(),
  kind: z.enum(CHOICE_KINDS),
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
  sheet: sheetSchema,
  row: z.int(),
  col: z.int(),
});
export type Line = z.infer<typeof lineSchema>;

export const asideSchema = z.object({
  sheet: sheetSchema,
  row: z.int(),
  /** The cell at fault; null = the whole row. */
  col: z.int().nullable(),
  /** A cell of a row that came in otherwise, or the row itself? */
  isCell: z.boolean(),
  reason: z.enum(ASIDE_REASONS),
  text: z.string(),
  /** Readable money on it, in cents; null = none. */
  cents: z.int().nullable(),
  /** The columns in which another text may mend it; none = it can only be left out, or asked about. */
  cols: z.array(z.int()).default([]),
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
  /** What stands for it in the answer to `vehicle:SPELLING`; null = its spellings are no question. */
  vehicleId: z.string().nullable().default(null),
  /** Its plan equals what it came to in every category, so it was written over and says nothing of overrun. */
  isOverwritten: z.boolean().default(false),
  sheet: sheetSchema,
  row: z.int(),
});
export type RebuildFound = z.infer<typeof rebuildFoundSchema>;

export const statedTotalSchema = z.object({
  sheet: sheetSchema,
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
  sheet: sheetSchema,
  row: z.int(),
  cells: z.array(z.string()),
  outcome: z.enum(OUTCOMES),
  reason: z.string().nullable(),
  lines: z.array(lineSchema),
});
export type FirstRow = z.infer<typeof firstRowSchema>;

export type Earlier = z.infer<typeof earlierSchema>;

/** One sheet of a workbook, and what its rows are taken for. */
export const sheetFoundSchema = z.object({
  number: z.int(),
  /** Which of the files of this import it stands in; 1 = the first. */
  file: z.int().default(1),
  name: z.string(),
  isHidden: z.boolean(),
  /** null = it holds no table that could be read; its rows count as notes, or are put aside. */
  shape: z.enum(SHAPES).nullable(),
  why: z.string(),
});
export type SheetFound = z.infer<typeof sheetFoundSchema>;

export const readingSchema = z.object({
  format: z.object({
    encoding: z.string(),
    delimiter: z.string(),
    decimal: z.enum(['.', ',']),
    headingRow: z.int().nullable(),
  }),
  shape: z.enum(SHAPES).nullable(),
  refusal: z.object({ kind: z.enum(REFUSALS), message: z.string(), row: z.int().nullable() }).nullable(),
  /** The sheets of a workbook or of several files; none for a single text file. */
  sheets: z.array(sheetFoundSchema).default([]),
  columns: z.array(columnSchema),
  choices: z.array(choiceSchema),
  rebuilds: z.array(rebuildFoundSchema),
  firstRows: z.array(firstRowSchema),
  asides: z.array(asideSchema),
  asideCount: z.int(),
  notData: z.partialRecord(z.enum(NOT_DATA), z.int()),
  statedTotals: z.array(statedTotalSchema),
  control: controlSchema,
  remarks: z.array(z.string()),
  hints: z.array(hintSchema).default([]),
  earlier: z.array(earlierSchema).default([]),
  /** The file whose columns and answers were taken over, since its headings are the same; null = none. */
  rememberedFrom: z.object({ importId: z.string(), fileName: z.string() }).nullable().default(null),
});
export type Reading = z.infer<typeof readingSchema>;
