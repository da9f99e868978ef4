import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import {
  centsSchema,
  cursorSchema,
  daySchema,
  idSchema,
  nextSchema,
  optionalTextSchema,
  positiveCentsSchema,
  textSchema,
} from '../fields.ts';
import { FORESEEN } from '../vocabulary.ts';

/** What a person may say of an entry. A credit is negative. Without a rebuild it is overhead and needs a day. */
const entryFields = z.strictObject({
  rebuildId: idSchema.nullable(),
  categoryId: idSchema,
  datedOn: daySchema.nullable(),
  cents: centsSchema,
  vendor: optionalTextSchema(200),
  what: optionalTextSchema(500),
  foreseen: z.enum(FORESEEN).nullable(),
  /** Chosen extra: counts in cost and profit, never in overrun, surprises or contingency. */
  isExtra: z.boolean(),
  /** Market value of something received free; then `cents` is 0. */
  freeValueCents: positiveCentsSchema.nullable(),
  receipt: optionalTextSchema(200),
});
export const entryFieldsSchema = entryFields;
export type EntryFields = z.output<typeof entryFieldsSchema>;

const OVERHEAD_DAY = 'Overhead needs a day, so that it falls in a year.';
const FREE_COSTS_NOTHING = 'What came free costs 0; its value stands beside it.';

export const newEntrySchema = entryFields
  .partial()
  .required({ categoryId: true, cents: true })
  .refine((entry) => entry.rebuildId || entry.datedOn, { path: ['datedOn'], error: OVERHEAD_DAY })
  .refine((entry) => entry.freeValueCents == null || entry.cents === 0, { path: ['cents'], error: FREE_COSTS_NOTHING });

export const entryChangeSchema = entryFields.partial();

/** One bill over several rebuilds by whole-number weights; a share without a rebuild is overhead. */
export const newSplitSchema = entryFields
  .omit({ rebuildId: true, freeValueCents: true })
  .partial()
  .required({ categoryId: true, cents: true })
  .extend({
    shares: z
      .array(z.strictObject({ rebuildId: idSchema.nullable(), weight: z.int().min(0).max(1_000_000) }))
      .min(2, { error: 'Name at least two rebuilds to split over.' })
      .max(50)
      .refine((shares) => new Set(shares.map((share) => share.rebuildId)).size === shares.length, {
        error: 'A rebuild stands here twice.',
      }),
  })
  .refine((split) => split.datedOn || split.shares.every((share) => share.rebuildId), {
    path: ['datedOn'],
    error: OVERHEAD_DAY,
  });

/** What must hold of an entry once a change is put into it. Gives the faults, by field. */
export function entryFaults(
  entry: Pick<EntryFields, 'rebuildId' | 'datedOn' | 'cents' | 'freeValueCents'>,
): { pointer: string; detail: string }[] {
  const faults: { pointer: string; detail: string }[] = [];
  if (!entry.rebuildId && !entry.datedOn) faults.push({ pointer: '/datedOn', detail: OVERHEAD_DAY });
  if (entry.freeValueCents !== null && entry.cents !== 0) {
    faults.push({ pointer: '/cents', detail: FREE_COSTS_NOTHING });
  }
  return faults;
}

export const entrySchema = z.object({
  ...entryFields.shape,
  id: idSchema,
  splitId: idSchema.nullable(),
  isGuess: z.boolean(),
  importId: idSchema.nullable(),
  importSheet: z.int().nullable(),
  importRow: z.int().nullable(),
  importCol: z.int().nullable(),
  voidedAt: z.string().nullable(),
  voidReason: z.string().nullable(),
  version: z.int(),
});
export type Entry = z.output<typeof entrySchema>;

/** An entry as lists show it: with the words for its ids. */
export const entryRowSchema = entrySchema.extend({
  rebuildTag: z.string().nullable(),
  categoryName: z.string(),
});
export type EntryRow = z.output<typeof entryRowSchema>;

/** One entry with where it came from and the other shares of its bill. */
export const entryDetailSchema = entryRowSchema.extend({
  source: z
    .object({
      importId: idSchema,
      fileName: z.string(),
      sheet: z.int().nullable(),
      row: z.int().nullable(),
      col: z.int().nullable(),
      /** The row of the file as it was read; null = not kept. */
      cells: z.array(z.string()).nullable(),
    })
    .nullable(),
  shares: z.array(z.object({ id: idSchema, rebuildTag: z.string().nullable(), cents: z.int() })),
});

/** How an entry stands to the plan, as a filter. */
export const ENTRY_KINDS = ['foreseen', 'surprise', 'not said', 'chosen extra'] as const;

export const ledgerQuerySchema = z.strictObject({
  cursor: cursorSchema,
  /** A rebuild, or 'none': overhead. */
  rebuild: z.union([idSchema, z.literal('none')]).optional(),
  category: idSchema.optional(),
  kind: z.enum(ENTRY_KINDS).optional(),
  /** First and last day, both included. */
  from: daySchema.optional(),
  to: daySchema.optional(),
  dated: z.enum(['yes', 'no']).optional(),
  find: z.string().max(80).optional(),
  import: idSchema.optional(),
  /** Void entries are hidden unless asked for; they are in no sum. */
  void: z.enum(['hide', 'show', 'only']).optional(),
});
export type LedgerQuery = z.output<typeof ledgerQuerySchema>;

export const voidSchema = z.strictObject({ reason: textSchema(300) });

/** A receipt from someone who sees no money: the amount goes in and never comes back. */
export const receiptSchema = z.strictObject({
  rebuildId: idSchema,
  categoryId: idSchema,
  cents: centsSchema,
  vendor: optionalTextSchema(200).optional(),
  what: textSchema(500),
  isSurprise: z.boolean(),
});

const entryParams = z.strictObject({ entryId: idSchema });

export const ledgerApi = {
  list: {
    method: 'GET',
    path: '/api/entries',
    summary: 'Entries, newest day first and undated ones last, a hundred a page, with the sum of all that match',
    query: ledgerQuerySchema,
    response: z.object({
      rows: z.array(entryRowSchema),
      /** Over everything that the filter matches and is not void. Only with the first page; null after it. */
      totals: z.object({ count: z.int(), cents: z.int(), freeValueCents: z.int() }).nullable(),
      next: nextSchema,
    }),
  },
  get: {
    method: 'GET',
    path: '/api/entries/:entryId',
    summary: 'One entry, where it came from and the other shares of its bill',
    params: entryParams,
    response: entryDetailSchema,
  },
  create: {
    method: 'POST',
    path: '/api/entries',
    summary: 'Add an entry',
    body: newEntrySchema,
    response: entryRowSchema,
    once: true,
  },
  split: {
    method: 'POST',
    path: '/api/entries/split',
    summary: 'Add one bill over several rebuilds; the shares add up to the cent',
    body: newSplitSchema,
    response: z.array(entryRowSchema),
    once: true,
  },
  update: {
    method: 'PATCH',
    path: '/api/entries/:entryId',
    summary: 'Change an entry that is not void',
    params: entryParams,
    body: entryChangeSchema,
    response: entryRowSchema,
    edits: true,
  },
  void: {
    method: 'POST',
    path: '/api/entries/:entryId/void',
    summary: 'Void an entry, with a reason; of a split bill, every share',
    params: entryParams,
    body: voidSchema,
    response: entryRowSchema,
    edits: true,
  },
  noteReceipt: {
    method: 'POST',
    path: '/api/receipts',
    summary: 'Hand in a receipt or a surprise on an open rebuild; no amount comes back',
    body: receiptSchema,
    response: z.object({ id: idSchema, what: z.string() }),
    once: true,
  },
} as const satisfies FeatureApi;
