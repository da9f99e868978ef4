import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import { daySchema, idSchema, positiveCentsSchema, textSchema } from '../fields.ts';

/** A word of the shop's own lists: a vehicle class, a damage type or a cost category. */
export const listItemSchema = z.object({
  id: idSchema,
  name: z.string(),
  position: z.int(),
  /** Kept for old rebuilds, no longer offered. */
  isRetired: z.boolean(),
  version: z.int(),
});
export const categorySchema = listItemSchema.extend({ isPaidLabor: z.boolean() });
export const workerSchema = z.object({
  id: idSchema,
  name: z.string(),
  isPaid: z.boolean(),
  userId: idSchema.nullable(),
  isRetired: z.boolean(),
  version: z.int(),
});
export type ListItem = z.output<typeof listItemSchema>;
export type Category = z.output<typeof categorySchema>;
export type Worker = z.output<typeof workerSchema>;

/** The lists that forms offer; without money, so every member may read them. */
export const listsSchema = z.object({
  classes: z.array(listItemSchema),
  damages: z.array(listItemSchema),
  categories: z.array(categorySchema),
  workers: z.array(workerSchema),
});
export type Lists = z.output<typeof listsSchema>;

export const LIST_KINDS = ['classes', 'damages', 'categories'] as const;
export type ListKind = (typeof LIST_KINDS)[number];

const isTimeZone = (name: string) => Intl.supportedValuesOf('timeZone').includes(name) || name === 'UTC';
const isLocale = (name: string) => {
  try {
    return Intl.NumberFormat.supportedLocalesOf(name).length > 0;
  } catch {
    return false;
  }
};
/** A currency with two decimals: the only kind the books hold. */
const isTwoDecimalCurrency = (code: string) =>
  /^[A-Z]{3}$/.test(code) &&
  Intl.supportedValuesOf('currency').includes(code) &&
  new Intl.NumberFormat('en', { style: 'currency', currency: code }).resolvedOptions().maximumFractionDigits === 2;

export const shopFieldsSchema = z.strictObject({
  name: textSchema(80),
  currency: z
    .string()
    .refine(isTwoDecimalCurrency, { error: 'Give the three letters of a currency with two decimals.' }),
  locale: z.string().max(35).refine(isLocale, { error: 'Give a language and region, such as en-US.' }),
  timeZone: z.string().refine(isTimeZone, { error: 'Give a time zone, such as America/Chicago.' }),
  yearStartMonth: z.int().min(1).max(12),
  wantedCentsPerHour: positiveCentsSchema.max(100_000_00, { error: 'That pay is too large.' }).nullable(),
});
export const shopSchema = z.object({
  ...shopFieldsSchema.shape,
  id: idSchema,
  isDemo: z.boolean(),
  fixedToday: daySchema.nullable(),
  version: z.int(),
});
export type Shop = z.output<typeof shopSchema>;

const listParams = z.strictObject({ kind: z.enum(LIST_KINDS) });
const itemParams = listParams.extend({ itemId: idSchema });
const itemBody = z.strictObject({ name: textSchema(60) });
const itemChange = z.strictObject({
  name: textSchema(60).optional(),
  position: z.int().min(0).max(1000).optional(),
  isRetired: z.boolean().optional(),
});
const workerBody = z.strictObject({ name: textSchema(80), isPaid: z.boolean() });

export const shopApi = {
  get: { method: 'GET', path: '/api/shop', summary: 'The shop and how it counts', response: shopSchema },
  update: {
    method: 'PATCH',
    path: '/api/shop',
    summary: 'Change the shop',
    body: shopFieldsSchema.partial(),
    response: shopSchema,
    edits: true,
  },
  lists: {
    method: 'GET',
    path: '/api/shop/lists',
    summary: 'Classes, damage types, categories and workers',
    response: listsSchema,
  },
  addItem: {
    method: 'POST',
    path: '/api/shop/lists/:kind',
    summary: 'Add a class, damage type or category',
    params: listParams,
    body: itemBody,
    response: listItemSchema,
    once: true,
  },
  changeItem: {
    method: 'PATCH',
    path: '/api/shop/lists/:kind/:itemId',
    summary: 'Rename, move or retire a class, damage type or category',
    params: itemParams,
    body: itemChange,
    response: listItemSchema,
    edits: true,
  },
  addWorker: {
    method: 'POST',
    path: '/api/shop/workers',
    summary: 'Add someone who works on rebuilds',
    body: workerBody,
    response: workerSchema,
    once: true,
  },
  changeWorker: {
    method: 'PATCH',
    path: '/api/shop/workers/:workerId',
    summary: 'Rename a worker, say whether they are paid, or retire them',
    params: z.strictObject({ workerId: idSchema }),
    body: workerBody.extend({ isRetired: z.boolean() }).partial(),
    response: workerSchema,
    edits: true,
  },
} as const satisfies FeatureApi;
