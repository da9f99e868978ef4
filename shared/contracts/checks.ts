import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import { daySchema, idSchema, optionalTextSchema } from '../fields.ts';

/** The answers that a fault in the books can bend. */
export const CHECKED_ANSWERS = ['year', 'what-pays', 'overruns', 'time-to-sell', 'contingency'] as const;
export type CheckedAnswer = (typeof CHECKED_ANSWERS)[number];

/** How grave: a figure may be wrong; a rebuild is left out of an answer; a figure is less sure than it looks. */
export const CHECK_GRADES = ['wrong', 'left out', 'unsure'] as const;
export type CheckGrade = (typeof CHECK_GRADES)[number];

export const CHECK_KINDS = [
  'receipt twice',
  'refund as cost',
  'vehicle twice',
  'rows put aside',
  'long day',
  'no purchase price',
  'no purchase day',
  'no estimate',
  'estimate written over',
  'no own hours',
  'no planned hours',
  'no listing day',
  'dates out of order',
  'no class',
  'no damage',
  'foreseen not said',
  'seen not said',
  'entry without a day',
  'entry before purchase',
  'day to come',
  'thin estimate',
  'guessed figure',
  'vehicle number',
] as const;
export type CheckKind = (typeof CHECK_KINDS)[number];

/** Named things that a finding lists at most; the rest is counted. */
export const CHECK_ITEMS_LISTED = 100;

/** One thing to look at: a rebuild, an entry or two, hours, or a file. */
export const checkItemSchema = z.object({
  /** Names it among those of its kind, for saying that it is right. */
  key: z.string(),
  rebuild: z.object({ id: idSchema, tag: z.string(), name: z.string() }).nullable(),
  /** Its entries; the ledger opens at them. */
  entryIds: z.array(idSchema),
  importId: idSchema.nullable(),
  on: daySchema.nullable(),
  /** Money in question, in cents. */
  cents: z.int().nullable(),
  /** What stands there, or what would fit. */
  text: z.string().nullable(),
  isSettled: z.boolean(),
});
export type CheckItem = z.output<typeof checkItemSchema>;

export const findingSchema = z.object({
  kind: z.enum(CHECK_KINDS),
  grade: z.enum(CHECK_GRADES),
  answers: z.array(z.enum(CHECKED_ANSWERS)),
  /** Open ones, and those that somebody said are right. */
  count: z.int(),
  settledCount: z.int(),
  /** Rebuilds that it is looked for on; null = it is not counted by rebuild. */
  among: z.int().nullable(),
  /** Money in question on the open ones, in cents; null = no money hangs on it. */
  cents: z.int().nullable(),
  items: z.array(checkItemSchema),
});
export type Finding = z.output<typeof findingSchema>;

export const checksAnswerSchema = z.object({
  asOf: daySchema,
  rebuildCount: z.int(),
  finishedCount: z.int(),
  /** The gravest first. */
  findings: z.array(findingSchema),
});
export type ChecksAnswer = z.output<typeof checksAnswerSchema>;

export const settleCheckSchema = z.strictObject({
  kind: z.enum(CHECK_KINDS),
  key: z.string().min(1).max(200),
  isSettled: z.boolean(),
  note: optionalTextSchema(300).optional(),
});

export const checksApi = {
  show: {
    method: 'GET',
    path: '/api/checks',
    summary: 'What is missing or odd in the books, with the answers that it bends, the gravest first',
    response: checksAnswerSchema,
  },
  settle: {
    method: 'PUT',
    path: '/api/checks/settled',
    summary: 'Say that something on the data check is right as it is, or take that back; asked twice, it holds once',
    body: settleCheckSchema,
    response: z.object({ kind: z.enum(CHECK_KINDS), key: z.string(), isSettled: z.boolean() }),
  },
} as const satisfies FeatureApi;
