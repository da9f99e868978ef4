import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import {
  cursorSchema,
  daySchema,
  idSchema,
  nextSchema,
  optionalTextSchema,
  positiveCentsSchema,
  secondsSchema,
  textSchema,
} from '../fields.ts';
import { bidBasisSchema } from './bids-basis.ts';
import { bidFiguresSchema, feeTableFieldsSchema, feeTableSchema, sheetRuleSchema } from './bids-parts.ts';

export const BID_STATES = ['open', 'bought', 'not bought'] as const;
export type BidState = (typeof BID_STATES)[number];

/**
 * Everything typed on a pre-bid sheet. It begins with the shop's fee table and usual costs, as they were when the sheet
 * was opened. A cost that stands in `lines` is not entered again in a field of its own.
 */
export const bidFieldsSchema = feeTableFieldsSchema.extend({
  /** What the car is called until it is bought: a lot number, a color, a place. */
  name: textSchema(80),
  year: z.int().min(1886).max(2100).nullable(),
  make: optionalTextSchema(60),
  model: optionalTextSchema(60),
  vin: optionalTextSchema(20),
  odometer: z.int().min(0).max(9_999_999).nullable(),
  titleBrand: optionalTextSchema(60),
  seller: optionalTextSchema(120),
  classId: idSchema.nullable(),
  damageId: idSchema.nullable(),
  secondDamageId: idSchema.nullable(),
  isSeen: z.boolean().nullable(),
  expectedSaleCents: positiveCentsSchema,
  /** The sale that the bid counts on, if more careful than the expected one. null = the expected one. */
  countedSaleCents: positiveCentsSchema.nullable(),
  /** Planned repair by category; becomes the locked estimate. */
  lines: z
    .array(z.strictObject({ categoryId: idSchema, cents: positiveCentsSchema }))
    .max(60)
    .refine((lines) => new Set(lines.map((line) => line.categoryId)).size === lines.length, {
      error: 'A category stands here twice.',
    }),
  /** How the plan is cushioned. */
  rule: sheetRuleSchema,
  /** From bought to sold. */
  days: z.int().min(0).max(10_000),
  ownSeconds: secondsSchema,
  /** Hours of paid help: they cost `paidLaborCents`, and count in the hours of the estimate. */
  paidSeconds: secondsSchema,
  paidLaborCents: positiveCentsSchema,
  wantedCentsPerHour: positiveCentsSchema.max(100_000_00, { error: 'That pay is too large.' }),
  /** Keys of what was ticked on the walk round the car. */
  ticks: z.array(z.string().min(1).max(120)).max(200),
  notes: optionalTextSchema(4000),
});
export type BidFields = z.output<typeof bidFieldsSchema>;

/** What the browser showed when the sheet was kept: compared with what the server works out, and never kept itself. */
export const shownSchema = bidFiguresSchema.pick({ repairBudgetCents: true, roomCents: true, bidCents: true });

export const bidSchema = z.object({
  ...bidFieldsSchema.shape,
  id: idSchema,
  state: z.enum(BID_STATES),
  /** Why it was not bought. */
  reason: z.string().nullable(),
  bidMadeCents: z.int().nullable(),
  hammerCents: z.int().nullable(),
  rebuildId: idSchema.nullable(),
  rebuildTag: z.string().nullable(),
  /** What the sheet came to when it was last kept, on the books as they were then. */
  figures: bidFiguresSchema,
  /** The shop's day on which it was first kept. */
  madeOn: daySchema,
  madeByName: z.string(),
  version: z.int(),
});
export type Bid = z.output<typeof bidSchema>;

export const bidRowSchema = bidSchema
  .pick({
    id: true,
    name: true,
    isSeen: true,
    expectedSaleCents: true,
    state: true,
    reason: true,
    bidMadeCents: true,
    hammerCents: true,
    rebuildId: true,
    rebuildTag: true,
    madeOn: true,
    madeByName: true,
    version: true,
  })
  .extend({
    className: z.string().nullable(),
    damageName: z.string().nullable(),
    planCents: z.int(),
    /** The walk-away bid. null = none. */
    bidCents: z.int().nullable(),
  });
export type BidRow = z.output<typeof bidRowSchema>;

/** `agrees`: did the figures that the browser showed come out the same here? null = it sent none. */
export const keptSchema = z.object({ bid: bidSchema, agrees: z.boolean().nullable() });

const bidParams = z.strictObject({ bidId: idSchema });

/** Not bought, and why; or open again. What was bid and what the hammer fell at, as far as known. */
export const outcomeSchema = z
  .strictObject({
    state: z.enum(['open', 'not bought']),
    reason: optionalTextSchema(300),
    bidMadeCents: positiveCentsSchema.nullable(),
    hammerCents: positiveCentsSchema.nullable(),
  })
  .refine(({ state, reason }) => state === 'open' || reason !== null, {
    path: ['reason'],
    error: 'Say why it was not bought.',
  });

/** The sheet becomes a rebuild. */
export const buySchema = z.strictObject({
  tag: textSchema(40),
  boughtOn: daySchema,
  /** What the hammer fell at: the purchase price. Fees and tax are entries of their own. */
  hammerCents: positiveCentsSchema,
});

export const bidsApi = {
  basis: {
    method: 'GET',
    path: '/api/bids/basis',
    summary: 'Everything that a pre-bid sheet is worked out from, to be kept for where there is no signal',
    response: bidBasisSchema,
  },
  feeTable: {
    method: 'GET',
    path: '/api/fee-table',
    summary: 'Fees by bid, bid step, tax and the usual costs of a purchase',
    response: feeTableSchema,
  },
  changeFeeTable: {
    method: 'PUT',
    path: '/api/fee-table',
    summary: 'Change the fee table and the usual costs; kept sheets stay as they are',
    body: feeTableFieldsSchema,
    response: feeTableSchema,
    edits: true,
  },
  list: {
    method: 'GET',
    path: '/api/bids',
    summary: 'Kept pre-bid sheets, the latest first, a hundred a page',
    query: z.strictObject({ cursor: cursorSchema, state: z.enum(BID_STATES).optional() }),
    response: z.object({ rows: z.array(bidRowSchema), total: z.int(), next: nextSchema }),
  },
  get: {
    method: 'GET',
    path: '/api/bids/:bidId',
    summary: 'One kept sheet',
    params: bidParams,
    response: bidSchema,
  },
  create: {
    method: 'POST',
    path: '/api/bids',
    summary: 'Keep a sheet; its figures are worked out here anew',
    body: bidFieldsSchema.extend({ shown: shownSchema.optional() }),
    response: keptSchema,
    once: true,
  },
  change: {
    method: 'PATCH',
    path: '/api/bids/:bidId',
    summary: 'Change a sheet that is still open; its figures are worked out here anew',
    params: bidParams,
    body: bidFieldsSchema.partial().extend({ shown: shownSchema.optional() }),
    response: keptSchema,
    edits: true,
  },
  setOutcome: {
    method: 'POST',
    path: '/api/bids/:bidId/outcome',
    summary: 'Say that it was not bought, and why; or open the sheet again',
    params: bidParams,
    body: outcomeSchema,
    response: bidSchema,
    edits: true,
  },
  buy: {
    method: 'POST',
    path: '/api/bids/:bidId/buy',
    summary:
      'Make the sheet a rebuild, with its estimate locked from the sheet; once bought, it tells that rebuild again',
    params: bidParams,
    body: buySchema,
    response: z.object({ bid: bidSchema, rebuildId: idSchema }),
    once: true,
    edits: true,
  },
} as const satisfies FeatureApi;
