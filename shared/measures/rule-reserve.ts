import { twoPartReserve } from './reserves.ts';

/**
 * Cents that an adopted rule puts on top of an estimate: ceil(percent × estimate ÷ 100) + the flat part, as whole
 * numbers; the estimate is never cut. `percent` is whole and ≥ 0, cents are whole, a rule without a flat part has null.
 * Example: 24 % and $450 on $2,001 gives 48,024 + 45,000 = 93,024 cents. (definitions §10, §11b)
 */
export function ruleReserve(rule: { percent: number; flatCents: number | null }, estimateCents: number): number {
  return twoPartReserve(rule.percent, rule.flatCents ?? 0, estimateCents);
}
