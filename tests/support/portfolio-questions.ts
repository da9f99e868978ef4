import { z } from 'zod';
import type { Level } from '../../server/domain/contingency.ts';
import type { Car } from '../../server/domain/ladder.ts';
import type { BidTerms } from '#shared/measures/walk-away-bid.ts';

/** What a reference portfolio of format 2 asks besides its answers (definitions §18): rules for cars, and bids. */
export interface Questions {
  readonly ladder: readonly LadderQuestion[];
  readonly bids: readonly BidQuestion[];
}

export interface LadderQuestion {
  readonly car: Car;
  readonly level: Level;
  readonly planCents: number;
}

export interface BidQuestion {
  readonly id: string;
  readonly repair:
    | { readonly rule: 'none'; readonly planCents: number }
    | { readonly rule: 'flat'; readonly planCents: number; readonly percent: number }
    | ({ readonly rule: 'percent' | 'two-part' } & LadderQuestion);
  readonly terms: Omit<BidTerms, 'repairBudgetCents'>;
}

const cents = z.int();
const level = z.string().regex(/^\d+\/\d+$/);
const car = { class: z.string().nullish(), damage: z.string().nullish(), seen: z.boolean().nullish(), level };

export const ladderSchema = z
  .object({ ...car, plan_cents: cents })
  .transform(({ plan_cents: planCents, ...asked }): LadderQuestion => ({ ...carOf(asked), planCents }));

const repairSchema = z.discriminatedUnion('rule', [
  z.object({ rule: z.literal('none'), plan_cents: cents }),
  z.object({ rule: z.literal('flat'), plan_cents: cents, percent: z.int().min(0) }),
  z.object({ rule: z.enum(['percent', 'two-part']), plan_cents: cents, ...car }),
]);

export const bidSchema = z
  .object({
    id: z.string(),
    sale_cents: cents,
    repair: repairSchema,
    transport_cents: cents,
    selling_cents: cents,
    holding_cents_per_day: cents,
    days: z.int(),
    paid_labor_cents: cents,
    own_hours: z.number().min(0),
    wanted_cents_per_hour: z.int().min(0),
    wanted_profit_cents: cents,
    tax: z.tuple([z.int().min(0), z.int().min(1)]),
    fee_steps: z.array(z.tuple([z.int().min(0), cents])),
    fee_flat_cents: cents,
    bid_step_cents: z.int().min(1),
  })
  .transform((bid): BidQuestion => ({ id: bid.id, repair: repairOf(bid.repair), terms: termsOf(bid) }));

/** §18.2: hours mean round(3600·h) whole seconds. */
export function wholeSeconds(hours: number): number {
  return Math.round(3600 * hours);
}

function carOf(asked: z.infer<z.ZodObject<typeof car>>): Omit<LadderQuestion, 'planCents'> {
  const [p = 0, q = 0] = asked.level.split('/').map(Number);
  const { class: vehicle = null, damage = null, seen = null } = asked;
  return { car: { class: vehicle, damage, seen }, level: { p, q } };
}

function repairOf(repair: z.infer<typeof repairSchema>): BidQuestion['repair'] {
  const planCents = repair.plan_cents;
  if (repair.rule === 'none') return { rule: repair.rule, planCents };
  if (repair.rule === 'flat') return { rule: repair.rule, planCents, percent: repair.percent };
  return { rule: repair.rule, planCents, ...carOf(repair) };
}

function termsOf(bid: Omit<z.input<typeof bidSchema>, 'repair'>): BidQuestion['terms'] {
  return {
    saleCents: bid.sale_cents,
    transportCents: bid.transport_cents,
    sellingCents: bid.selling_cents,
    holdingCentsPerDay: bid.holding_cents_per_day,
    days: bid.days,
    paidLaborCents: bid.paid_labor_cents,
    ownSeconds: wholeSeconds(bid.own_hours),
    wantedCentsPerHour: bid.wanted_cents_per_hour,
    wantedProfitCents: bid.wanted_profit_cents,
    tax: { p: bid.tax[0], q: bid.tax[1] },
    feeSteps: bid.fee_steps,
    feeFlatCents: bid.fee_flat_cents,
    bidStepCents: bid.bid_step_cents,
  };
}
