import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { FEWEST_ALIKE } from '#shared/measures/like-cars.ts';
import type { RebuildFacts } from '../../domain/facts.ts';
import { grouped } from '../../domain/grouped.ts';
import { type PlannedFacts, planStart } from '../../domain/plan-starts.ts';
import { completed } from '../../domain/sets.ts';
import { surpriseGroups } from '../../domain/surprise-groups.ts';
import type { BasisInput, Ids } from './basis-input.ts';

/** So many kinds of car have a start of their own, the most frequent ones; the others start as their damage does. */
const KINDS_AT_MOST = 25;

/** Where a plan may start: by class and damage, by damage, over all; kinds with fewer than five are left out. */
export function startsOf(past: readonly PlannedFacts[], ids: Ids): BidBasis['starts'] {
  const known = past.filter(({ damage }) => damage !== null);
  const kinds = [
    ...kindsOf(
      known.filter((one) => one.class !== null),
      (one) => [one.class, one.damage],
    ),
    ...kindsOf(known, ({ damage }) => [null, damage]),
  ]
    .filter(([, members]) => members.length >= FEWEST_ALIKE)
    .sort(([, a], [, b]) => b.length - a.length)
    .slice(0, KINDS_AT_MOST);
  return [...kinds, [[null, null], past] as const].map(([[name, damage], members]) => {
    const { n, categories, hours } = planStart(members);
    return {
      classId: ids.classId(name),
      damageId: ids.damageId(damage),
      n,
      lines: ids.inOrder(categories),
      hours,
    };
  });
}

/** What surprised: by damage and seen, by damage, over all; kinds with fewer than five are left out. */
export function surprisesOf({ shop, surprises }: BasisInput, ids: Ids): BidBasis['surprises'] {
  const told = completed(shop.rebuilds).filter(({ hasUnknownForeseen }) => !hasUnknownForeseen);
  const surprised = new Set(surprises.map(({ rebuildId }) => rebuildId));
  const known = told.filter(({ damage }) => damage !== null);
  const kinds = [
    ...kindsOf(
      known.filter(({ seen }) => seen !== null),
      ({ damage, seen }) => [damage, seen] as const,
    ),
    ...kindsOf(known, ({ damage }) => [damage, null] as const),
  ].filter(([, members]) => members.length >= FEWEST_ALIKE);
  return [...kinds, [[null, null], told] as const].map(([[damage, seen], members]) => {
    const groups = surpriseGroups(surprises, new Set(members.map(({ id }) => id)));
    return {
      damageId: ids.damageId(damage),
      isSeen: seen,
      n: members.length,
      x: members.filter(({ id }) => surprised.has(id)).length,
      categories: groups.map(({ category, x, medianCents, whats }) => {
        return { categoryId: ids.categoryId(category) ?? '', x, medianCents, whats: [...whats] };
      }),
    };
  });
}

/** Rebuilds by what makes them of one kind, in the order of their first. */
function kindsOf<T extends RebuildFacts, K extends readonly unknown[]>(
  rebuilds: readonly T[],
  keyOf: (one: T) => K,
): (readonly [key: K, members: readonly T[]])[] {
  const groups = grouped(rebuilds, (one) => JSON.stringify(keyOf(one)));
  return [...groups.values()].flatMap((members) => (members[0] ? [[keyOf(members[0]), members] as const] : []));
}
