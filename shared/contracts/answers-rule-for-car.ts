import { z } from 'zod';
import { daySchema, idSchema } from '../fields.ts';
import { LADDER_RUNGS } from '../measures/ladder-rungs.ts';
import { LEVELS } from '../vocabulary.ts';
import { cents, count, figure } from './answers-parts.ts';

/** The car that a rule is wanted for. What is left out is not known, and then like no past rebuild. */
export const ruleForCarQuerySchema = z.strictObject({
  level: z.enum(LEVELS).default('4/5'),
  class: idSchema.optional(),
  damage: idSchema.optional(),
  seen: z.enum(['yes', 'no']).optional(),
});

/** What a rule for the car is based on. `rung` null = too few yet on every rung; n and k are then those of all. */
const footing = {
  rung: z.enum(LADDER_RUNGS).nullable(),
  n: count,
  k: count,
  guarantee: figure,
  band: z.object({ lower: z.number(), upper: z.number() }).nullable(),
  /** From the finest rung to the widest; the first that carries is taken. */
  tried: z.array(z.object({ rung: z.enum(LADDER_RUNGS), n: count, k: count, carries: z.boolean() })),
};

/** The contingency rule for such a car, from the finest rung of past rebuilds that carries it. */
export const ruleForCarSchema = z.object({
  asOf: daySchema,
  level: z.enum(LEVELS),
  /** The overrun taken, and that raised to a whole percent. */
  percent: z.object({ ...footing, uplift: figure, percent: z.int().nullable() }),
  twoPart: z.object({
    ...footing,
    creepPercent: z.int().nullable(),
    flatCents: cents.nullable(),
    /** Raised to whole units of money. */
    adoptFlatCents: cents.nullable(),
  }),
});
export type RuleForCar = z.output<typeof ruleForCarSchema>;
