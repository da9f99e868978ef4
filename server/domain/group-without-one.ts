import type { GroupComparison } from './group-comparison.ts';
import { randomEffects } from './random-effects.ts';
import type { WithoutOne } from './ratio-without-one.ts';
import { sum } from './statistics.ts';

/**
 * A group's pulled figure (definitions §9) without the member that lies furthest from its mean. The fit is done again
 * from the groups' means and the spread within, with nothing else touched; where groups cannot be pooled it is the mean
 * of the others. null = the member is alone. Example: 1, 2 and 9 with nothing to pool: without the 9, 1.5.
 */
export function withoutFurthest(
  { groups, withinVariance }: GroupComparison,
  at: number,
  members: readonly { readonly id: string; readonly value: number }[],
): WithoutOne | null {
  const group = groups[at];
  if (!group || group.n < 2) return null;
  const away = ({ value }: { readonly value: number }) => Math.abs(value - group.mean);
  const furthest = members.reduce((a, b) => (away(b) > away(a) ? b : a));
  const { n } = group;
  const mean = (n * group.mean - furthest.value) / (n - 1);
  const free = sum(groups.map((one) => one.n - 1));
  const squares = (withinVariance ?? 0) * free - (away(furthest) ** 2 * n) / (n - 1);
  const within = free > 1 ? Math.max(0, squares) / (free - 1) : 0;
  const fit = randomEffects(
    groups.map((one, i) =>
      i === at ? { mean, variance: within / (n - 1) } : { mean: one.mean, variance: within / one.n },
    ),
  );
  return { id: furthest.id, value: fit?.groups[at]?.value ?? mean };
}
