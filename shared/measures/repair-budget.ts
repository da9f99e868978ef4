import type { Cents } from '../money.ts';
import { flatReserve, type Overran, reserve, twoPartReserve } from './reserves.ts';

/**
 * How a repair plan is cushioned: as it stands, by a percentage of one's own, or by a rule from past rebuilds. The
 * figures of a rule are those of the rung that carries it; null = too few past rebuilds on every rung.
 */
export type RepairRule =
  | { readonly kind: 'none' }
  | { readonly kind: 'flat'; readonly percent: number }
  | { readonly kind: 'percent'; readonly taken: Overran | null }
  | { readonly kind: 'two-part'; readonly creepPercent: number | null; readonly flatCents: Cents | null };

/**
 * Plan and cushion, cents (definitions §18.5), each cushion raised to the cent as in §10 and §18.3. null = the rule has
 * too few past rebuilds. Example: 27 % and 930.00 on a plan of 2,100.00 make 3,597.00.
 */
export function repairBudget(planCents: Cents, rule: RepairRule): Cents | null {
  switch (rule.kind) {
    case 'none':
      return planCents;
    case 'flat':
      return planCents + flatReserve(rule.percent, planCents);
    case 'percent':
      return rule.taken && planCents + reserve(rule.taken, planCents);
    case 'two-part': {
      const { creepPercent, flatCents } = rule;
      return creepPercent === null || flatCents === null
        ? null
        : planCents + twoPartReserve(creepPercent, flatCents, planCents);
    }
  }
}
