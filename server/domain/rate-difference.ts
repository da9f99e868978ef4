import type { Difference } from './ratio-difference.ts';
import { FEW, type Rate } from './statistics.ts';

/**
 * How far two shares lie apart, first − second, with a 95 % interval put together from the two Wilson intervals
 * (Newcombe 1998, method 10): d − √((p₁ − l₁)² + (u₂ − p₂)²) to d + √((u₁ − p₁)² + (p₂ − l₂)²).
 * null = nothing was tried on one side. Example: 56 of 70 against 48 of 80: 0.20, from 0.052 to 0.334.
 */
export function rateDifference(a: Rate, b: Rate): Difference | null {
  if (a.rate === null || b.rate === null) return null;
  const below = (one: Rate) => (one.rate ?? 0) - (one.lower ?? 0);
  const above = (one: Rate) => (one.upper ?? 0) - (one.rate ?? 0);
  const difference = a.rate - b.rate;
  return {
    difference,
    lower: difference - Math.hypot(below(a), above(b)),
    upper: difference + Math.hypot(above(a), below(b)),
    isThin: Math.min(a.n, b.n) < FEW,
  };
}
