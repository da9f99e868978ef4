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
import { OTHER_EXITS, STAGES } from '../vocabulary.ts';
import { estimateFieldsSchema, estimateSchema } from './estimates.ts';
import {
  categoryOutcomeSchema,
  cautionSchema,
  stageDaysSchema,
  vinCheckSchema,
  warningSchema,
} from './rebuild-outcome.ts';

const count = z.int().min(0);
const day = daySchema.nullable();

/** What a person may say of a rebuild. Fields left out stay as they are; null clears one. */
export const rebuildFieldsSchema = z.strictObject({
  tag: textSchema(40),
  year: z.int().min(1886).max(2100).nullable(),
  make: optionalTextSchema(60),
  model: optionalTextSchema(60),
  trim: optionalTextSchema(60),
  vin: optionalTextSchema(20),
  classId: idSchema.nullable(),
  damageId: idSchema.nullable(),
  secondDamageId: idSchema.nullable(),
  isSeen: z.boolean().nullable(),
  titleBrandBought: optionalTextSchema(60),
  titleBrandSold: optionalTextSchema(60),
  odometer: count.max(9_999_999).nullable(),
  boughtFrom: optionalTextSchema(120),
  purchaseCents: positiveCentsSchema.nullable(),
  askingCents: positiveCentsSchema.nullable(),
  saleCents: positiveCentsSchema.nullable(),
  buyerChannel: optionalTextSchema(120),
  boughtOn: day,
  paidOn: day,
  pickedUpOn: day,
  startedOn: day,
  roadworthyOn: day,
  inspectedOn: day,
  titleIssuedOn: day,
  listedOn: day,
  soldOn: day,
  settledOn: day,
  exitKind: z.enum(OTHER_EXITS).nullable(),
  exitOn: day,
  exitCents: centsSchema.nullable(),
  notes: optionalTextSchema(4000),
  lessons: optionalTextSchema(4000),
});
export type RebuildFields = z.output<typeof rebuildFieldsSchema>;

export const newRebuildSchema = rebuildFieldsSchema.partial().required({ tag: true });
export const rebuildChangeSchema = rebuildFieldsSchema.partial();

export const rebuildSchema = z.object({
  ...rebuildFieldsSchema.shape,
  /** Nobody may type one below zero, but a file may hold more refunds of a price than price; then it is shown so. */
  purchaseCents: centsSchema.nullable(),
  id: idSchema,
  importId: idSchema.nullable(),
  importSheet: z.int().nullable(),
  importRow: z.int().nullable(),
  version: z.int(),
});
export type Rebuild = z.output<typeof rebuildSchema>;

/**
 * One line of the list. `daysHeld` runs to the day it left, or to today. `costCents` is all-in: purchase and entries;
 * null while the purchase is unknown. `keptCents` only for one that has left. A mechanic's list has its own route.
 */
export const rebuildRowSchema = z.object({
  id: idSchema,
  tag: z.string(),
  name: z.string(),
  className: z.string().nullable(),
  damageName: z.string().nullable(),
  stage: z.enum(STAGES),
  isSeen: z.boolean().nullable(),
  boughtOn: day,
  leftOn: day,
  daysHeld: z.int().nullable(),
  purchaseCents: z.int().nullable(),
  costCents: z.int().nullable(),
  proceedsCents: z.int().nullable(),
  keptCents: z.int().nullable(),
  ownSeconds: z.int().nullable(),
  keptPerHourCents: z.number().nullable(),
  estimateCents: z.int().nullable(),
  planningCents: z.int(),
  surpriseCents: z.int(),
  /** (planning actual − locked estimate) ÷ locked estimate, a fraction; null = no locked estimate. */
  overrunRate: z.number().nullable(),
});
export type RebuildRow = z.output<typeof rebuildRowSchema>;

export const REBUILD_SORTS = ['bought', 'left', 'tag', 'kept', 'hours', 'overrun'] as const;

export const rebuildsQuerySchema = z.strictObject({
  cursor: cursorSchema,
  sort: z.enum(REBUILD_SORTS).optional(),
  order: z.enum(['up', 'down']).optional(),
  stage: z.enum(STAGES).optional(),
  class: idSchema.optional(),
  damage: idSchema.optional(),
  seen: z.enum(['yes', 'no', 'unknown']).optional(),
  year: z.coerce.number().int().min(1950).max(2100).optional(),
  find: z.string().max(80).optional(),
});

/** Over everything that the filter matches. Money only of those whose purchase is known. */
export const rebuildsSummarySchema = z.object({
  total: z.int(),
  leftCount: z.int(),
  lossCount: z.int(),
  /** Left, but the purchase is not known: in no money figure. */
  noPurchaseCount: z.int(),
  keptCents: z.int(),
  openCount: z.int(),
  openCostCents: z.int(),
});

/** One rebuild with everything its page shows, but for entries and hours: lists of their own. */
export const rebuildDetailSchema = z.object({
  rebuild: rebuildSchema,
  /** The line that the list shows of it, sums included. */
  row: rebuildRowSchema,
  secondDamageName: z.string().nullable(),
  vinCheck: vinCheckSchema.nullable(),
  warnings: z.array(warningSchema),
  cautions: z.array(cautionSchema),
  estimates: z.array(estimateSchema),
  categories: z.array(categoryOutcomeSchema),
  stageDays: z.array(stageDaysSchema),
  paidSeconds: z.int().nullable(),
  plannedSeconds: z.int().nullable(),
  undatedCount: z.int(),
  unknownForeseenCount: z.int(),
  lateCount: z.int(),
  lateCents: z.int(),
  source: z.object({ importId: idSchema, fileName: z.string(), row: z.int().nullable() }).nullable(),
});
export type RebuildDetail = z.output<typeof rebuildDetailSchema>;

/** What a picker of rebuilds needs. */
export const rebuildNameSchema = z.object({ id: idSchema, tag: z.string(), name: z.string(), isOpen: z.boolean() });
export type RebuildName = z.output<typeof rebuildNameSchema>;

const rebuildParams = z.strictObject({ rebuildId: idSchema });
const estimateParams = rebuildParams.extend({ estimateId: idSchema });

export const rebuildsApi = {
  list: {
    method: 'GET',
    path: '/api/rebuilds',
    summary: 'Rebuilds with what each cost and brought, a hundred a page',
    query: rebuildsQuerySchema,
    response: z.object({ rows: z.array(rebuildRowSchema), summary: rebuildsSummarySchema, next: nextSchema }),
  },
  names: {
    method: 'GET',
    path: '/api/rebuilds/names',
    summary: 'Tag and name of every rebuild, open ones first',
    response: z.array(rebuildNameSchema),
  },
  get: {
    method: 'GET',
    path: '/api/rebuilds/:rebuildId',
    summary: 'One rebuild: plan against actual, dates, estimates, warnings and cautions',
    params: rebuildParams,
    response: rebuildDetailSchema,
  },
  create: {
    method: 'POST',
    path: '/api/rebuilds',
    summary: 'Add a rebuild',
    body: newRebuildSchema,
    response: rebuildSchema,
    once: true,
  },
  update: {
    method: 'PATCH',
    path: '/api/rebuilds/:rebuildId',
    summary: 'Change what is known of a rebuild, its dates and its sale',
    params: rebuildParams,
    body: rebuildChangeSchema,
    response: rebuildSchema,
    edits: true,
  },
  addEstimate: {
    method: 'POST',
    path: '/api/rebuilds/:rebuildId/estimates',
    summary: 'Make the plan, or a revision beside the locked one',
    params: rebuildParams,
    body: estimateFieldsSchema,
    response: estimateSchema,
    once: true,
  },
  changeEstimate: {
    method: 'PATCH',
    path: '/api/rebuilds/:rebuildId/estimates/:estimateId',
    summary: 'Change an estimate that is not locked',
    params: estimateParams,
    body: estimateFieldsSchema.partial(),
    response: estimateSchema,
    edits: true,
  },
  lockEstimate: {
    method: 'POST',
    path: '/api/rebuilds/:rebuildId/estimates/:estimateId/lock',
    summary: 'Lock an estimate; the locked plan is what every overrun is against',
    params: estimateParams,
    response: estimateSchema,
    edits: true,
  },
} as const satisfies FeatureApi;
