import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import {
  cursorSchema,
  daySchema,
  idSchema,
  nextSchema,
  optionalTextSchema,
  secondsSchema,
  textSchema,
} from '../fields.ts';
import { STAGES } from '../vocabulary.ts';

/** Hours on a rebuild, kept as whole seconds. Person and day may be unknown (a total from an old sheet). */
export const hoursFieldsSchema = z.strictObject({
  rebuildId: idSchema,
  workerId: idSchema.nullable(),
  workedOn: daySchema.nullable(),
  seconds: secondsSchema,
  /** Paid work is in the costs already; "per hour" counts unpaid hours. */
  isPaid: z.boolean(),
  task: optionalTextSchema(200),
});
export type HoursFields = z.output<typeof hoursFieldsSchema>;

export const hoursEntrySchema = z.object({
  ...hoursFieldsSchema.shape,
  id: idSchema,
  isGuess: z.boolean(),
  importId: idSchema.nullable(),
  importSheet: z.int().nullable(),
  importRow: z.int().nullable(),
  voidedAt: z.string().nullable(),
  voidReason: z.string().nullable(),
  version: z.int(),
});
export type HoursEntry = z.output<typeof hoursEntrySchema>;

/** Left out, the paid flag is the worker's own; hours of nobody in particular are unpaid. */
export const newHoursSchema = hoursFieldsSchema.partial().required({ rebuildId: true, seconds: true });

/** Hours as lists show them: with the words for their ids. */
export const hoursRowSchema = hoursEntrySchema.extend({
  rebuildTag: z.string(),
  rebuildName: z.string(),
  workerName: z.string().nullable(),
});
export type HoursRow = z.output<typeof hoursRowSchema>;

export const hoursQuerySchema = z.strictObject({
  cursor: cursorSchema,
  rebuild: idSchema.optional(),
  /** A worker, or 'none': nobody said who. */
  worker: z.union([idSchema, z.literal('none')]).optional(),
  paid: z.enum(['yes', 'no']).optional(),
  /** First and last day, both included. */
  from: daySchema.optional(),
  to: daySchema.optional(),
  dated: z.enum(['yes', 'no']).optional(),
  find: z.string().max(80).optional(),
  import: idSchema.optional(),
  void: z.enum(['hide', 'show', 'only']).optional(),
});
export type HoursQuery = z.output<typeof hoursQuerySchema>;

/** One open rebuild as a mechanic sees it: hours, no money. Seconds. */
export const boardRowSchema = z.object({
  id: idSchema,
  tag: z.string(),
  name: z.string(),
  damageName: z.string().nullable(),
  stage: z.enum(STAGES),
  loggedSeconds: z.int(),
  /** Of the locked plan, else of the plan as it stands; null = no hours planned. */
  plannedSeconds: z.int().nullable(),
});
export type BoardRow = z.output<typeof boardRowSchema>;

/** One's own hours, with whether they can still be changed: those logged today. */
export const ownHoursSchema = z.object({
  id: idSchema,
  rebuildId: idSchema,
  rebuildTag: z.string(),
  rebuildName: z.string(),
  workedOn: daySchema.nullable(),
  seconds: z.int(),
  task: z.string().nullable(),
  canChange: z.boolean(),
  version: z.int(),
});
export type OwnHours = z.output<typeof ownHoursSchema>;

const DAY_SECONDS = 86_400;
const ownFields = hoursFieldsSchema.pick({ rebuildId: true, task: true }).extend({
  workedOn: daySchema,
  seconds: z.int().min(1, { error: 'Choose how long.' }).max(DAY_SECONDS, { error: 'A day has 24 hours.' }),
});
export const newOwnHoursSchema = ownFields.partial({ task: true });

const hoursParams = z.strictObject({ hoursId: idSchema });
const reason = z.strictObject({ reason: textSchema(300) });

export const hoursApi = {
  list: {
    method: 'GET',
    path: '/api/hours',
    summary: 'Hours, newest day first and undated ones last, a hundred a page, with the sum of all that match',
    query: hoursQuerySchema,
    response: z.object({
      rows: z.array(hoursRowSchema),
      /** Over everything that the filter matches and is not void. Only with the first page; null after it. */
      totals: z.object({ count: z.int(), ownSeconds: z.int(), paidSeconds: z.int() }).nullable(),
      next: nextSchema,
    }),
  },
  create: {
    method: 'POST',
    path: '/api/hours',
    summary: 'Add hours on a rebuild',
    body: newHoursSchema,
    response: hoursRowSchema,
    once: true,
  },
  update: {
    method: 'PATCH',
    path: '/api/hours/:hoursId',
    summary: 'Change hours that are not void',
    params: hoursParams,
    body: hoursFieldsSchema.partial(),
    response: hoursRowSchema,
    edits: true,
  },
  void: {
    method: 'POST',
    path: '/api/hours/:hoursId/void',
    summary: 'Void hours, with a reason',
    params: hoursParams,
    body: reason,
    response: hoursRowSchema,
    edits: true,
  },
  board: {
    method: 'GET',
    path: '/api/board',
    summary: 'Open rebuilds with hours planned and logged; no money',
    response: z.array(boardRowSchema),
  },
  mine: {
    method: 'GET',
    path: '/api/my-hours',
    summary: 'Your own latest hours',
    response: z.array(ownHoursSchema),
  },
  logMine: {
    method: 'POST',
    path: '/api/my-hours',
    summary: 'Log your own hours on an open rebuild',
    body: newOwnHoursSchema,
    response: ownHoursSchema,
    once: true,
  },
  changeMine: {
    method: 'PATCH',
    path: '/api/my-hours/:hoursId',
    summary: 'Change hours of your own that you logged today',
    params: hoursParams,
    body: ownFields.partial(),
    response: ownHoursSchema,
    edits: true,
  },
  voidMine: {
    method: 'POST',
    path: '/api/my-hours/:hoursId/void',
    summary: 'Void hours of your own that you logged today',
    params: hoursParams,
    body: reason,
    response: ownHoursSchema,
    edits: true,
  },
} as const satisfies FeatureApi;
