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
  id: idSchema,
  importId: idSchema.nullable(),
  importSheet: z.int().nullable(),
  importRow: z.int().nullable(),
  version: z.int(),
});
export type Rebuild = z.output<typeof rebuildSchema>;

/** One line of the list. Money is absent (null) for a mechanic's list, which has its own route. */
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

/** An estimate: the plan before work starts (the baseline once locked), or a later revision beside it. */
export const estimateFieldsSchema = z.strictObject({
  lines: z
    .array(z.strictObject({ categoryId: idSchema, cents: positiveCentsSchema }))
    .max(60)
    .refine((lines) => new Set(lines.map((line) => line.categoryId)).size === lines.length, {
      error: 'A category stands here twice.',
    }),
  plannedSeconds: count.nullable(),
  expectedSaleCents: positiveCentsSchema.nullable(),
  expectedDays: count.max(10_000).nullable(),
  note: optionalTextSchema(1000),
});
export type EstimateFields = z.output<typeof estimateFieldsSchema>;

export const estimateSchema = z.object({
  ...estimateFieldsSchema.shape,
  id: idSchema,
  rebuildId: idSchema,
  revision: z.int(),
  isBaseline: z.boolean(),
  madeOn: day,
  lockedAt: z.string().nullable(),
  version: z.int(),
});
export type Estimate = z.output<typeof estimateSchema>;

const rebuildParams = z.strictObject({ rebuildId: idSchema });

export const rebuildsApi = {
  list: {
    method: 'GET',
    path: '/api/rebuilds',
    summary: 'Rebuilds with what each cost and brought, a hundred a page',
    query: rebuildsQuerySchema,
    response: z.object({ rows: z.array(rebuildRowSchema), total: z.int(), next: nextSchema }),
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
} as const satisfies FeatureApi;
