import { z } from 'zod';
import { daySchema, idSchema } from '../fields.ts';
import { LADDER_RUNGS } from '../measures/ladder-rungs.ts';
import { cents, count, figure, rebuildRefSchema } from './answers-parts.ts';
import { feeTableSchema } from './bids-parts.ts';
import { ruleSchema } from './rules.ts';

/** The car that a row is about; what the row does not look at is null. */
const carSchema = { classId: idSchema.nullable(), damageId: idSchema.nullable(), isSeen: z.boolean().nullable() };

/** A cost that the sheet asks for in a field of its own; such a category is not planned for again. */
export const SHEET_PLACES = ['fee', 'tax', 'transport', 'title', 'selling', 'holding', 'paid labor'] as const;
export type SheetPlace = (typeof SHEET_PLACES)[number];

const wordSchema = z.object({ id: idSchema, name: z.string(), isRetired: z.boolean() });
const categoryWordSchema = wordSchema.extend({
  /** Told by its name. null = planned as a line. */
  place: z.enum(SHEET_PLACES).nullable(),
});

/**
 * The rules of one rung at every level, in the order of LEVELS. Only rungs with at least nine rebuilds stand here, and
 * "all" always. k follows from n and level; not attainable = null.
 */
export const ladderRungSchema = z.object({
  rung: z.enum(LADDER_RUNGS),
  ...carSchema,
  /** Percent rule: the overrun taken over its estimate, cents. */
  percent: z.object({ n: count, taken: z.array(z.tuple([cents, cents]).nullable()) }),
  /** Two-part rule: whole percent, and dollars (in cents) for surprises. */
  twoPart: z.object({ n: count, creepPercent: z.int().nullable(), flatCents: z.array(z.int().nullable()) }),
});
export type LadderRow = z.output<typeof ladderRungSchema>;

/** Planned and actual work of past rebuilds by class and damage, damage, or all: where a plan may start. */
export const startSchema = z.object({
  classId: idSchema.nullable(),
  damageId: idSchema.nullable(),
  n: count,
  /** Over those that planned for the category: how many, median planned, median actual. In the shop's order. */
  lines: z.array(z.object({ categoryId: idSchema, n: count, planCents: z.number(), actualCents: z.number() })),
  /** Over those with planned and worked hours known: own and paid together. */
  hours: z.object({ n: count, plannedSeconds: figure, actualSeconds: figure, ownSeconds: figure }),
});
export type Start = z.output<typeof startSchema>;

/** Surprises by damage and seen, damage, or all, by category: the five most frequent at most, those first. */
export const surprisesSchema = z.object({
  damageId: idSchema.nullable(),
  isSeen: z.boolean().nullable(),
  /** Finished rebuilds that say of every entry whether it was foreseen. */
  n: count,
  /** Of these with at least one surprise. */
  x: count,
  categories: z.array(
    z.object({
      categoryId: idSchema,
      /** Rebuilds with at least one here. */
      x: count,
      /** Median of what they cost a rebuild that had one. */
      medianCents: z.number(),
      /** What was written most often, at most three; x = rebuilds. */
      whats: z.array(z.object({ what: z.string(), x: count, medianCents: z.number() })),
    }),
  ),
});
export type Surprises = z.output<typeof surprisesSchema>;

/** Days by Kaplan and Meier, those still waiting counted as such. */
const waitSchema = z.object({
  n: count,
  soldCount: count,
  unsoldCount: count,
  otherExitCount: count,
  /** Half are sold by then. null = half never were. */
  median: figure,
  lower: figure,
  upper: figure,
});

const sellingSchema = z.object({
  /** null = all classes. */
  classId: idSchema.nullable(),
  /** From listed, and from bought. */
  toSell: waitSchema,
  held: waitSchema,
});

/** At most this many past rebuilds go to the browser: the last that left. */
export const PAST_AT_MOST = 100;

/** A past rebuild (set K: finished, its estimate not written over) as sheets look back at it. */
export const pastSchema = rebuildRefSchema.extend({
  ...carSchema,
  leftOn: daySchema,
  estimateCents: cents,
  /** Planning actual: without chosen extras, free things at market value. */
  actualCents: cents,
  /** Own and paid together. */
  plannedSeconds: z.int().nullable(),
  actualSeconds: z.int().nullable(),
  daysHeld: z.int().nullable(),
  keptCents: z.int().nullable(),
  proceedsCents: cents,
  /** Of the locked estimate, above 0. null = none. */
  expectedSaleCents: z.int().nullable(),
});
export type Past = z.output<typeof pastSchema>;

/** What a sheet needs of an adopted rule. */
const ruleInForceSchema = ruleSchema.pick({
  id: true,
  year: true,
  revision: true,
  kind: true,
  level: true,
  percent: true,
  flatCents: true,
  rebuildCount: true,
  adoptedOn: true,
});

export const bidBasisSchema = z.object({
  asOf: daySchema,
  booksVersion: z.int(),
  wantedCentsPerHour: z.int().nullable(),
  feeTable: feeTableSchema,
  classes: z.array(wordSchema),
  damages: z.array(wordSchema),
  categories: z.array(categoryWordSchema),
  /** For this shop year. null = none adopted. */
  ruleInForce: ruleInForceSchema.nullable(),
  /** From the finest rung to "all". */
  ladder: z.array(ladderRungSchema),
  starts: z.array(startSchema),
  /** Own bias: Σ planned and Σ actual over those that planned for it. In the shop's order. */
  bias: z.array(z.object({ categoryId: idSchema, n: count, planCents: cents, actualCents: cents })),
  hoursBias: z.object({ n: count, plannedSeconds: count, actualSeconds: count }),
  selling: z.array(sellingSchema),
  surprises: z.array(surprisesSchema),
  /** The last that left, latest first. `pastTotal` = how many there are in all. */
  past: z.array(pastSchema),
  pastTotal: count,
});
export type BidBasis = z.output<typeof bidBasisSchema>;
