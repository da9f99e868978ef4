import type { RebuildFacts } from './facts.ts';
import type { Car } from './ladder.ts';
import { type Completed, planned } from './sets.ts';
import { byCodePoint } from './text-order.ts';

/** What a past rebuild may have in common with a car; from the one that tells most to the one that tells least. */
const TRAITS = ['seen', 'damage', 'class'] as const;
export type Trait = (typeof TRAITS)[number];

/** A past rebuild beside the car in question. */
export interface Similar {
  readonly rebuild: Completed;
  /** What the two have in common; what is not known of either is not in common. */
  readonly inCommon: readonly Trait[];
  /** Its plan ÷ the plan in question: 1 = of the same size. */
  readonly planRatio: number;
}

/**
 * The past rebuilds most like a car with a repair plan of `planCents` > 0, nearest first, at most `count`: those with
 * more in common of seen, damage and class; of as many, those alike in seen, then in damage; of equals the nearest in
 * plan size (half and double are equally far), then the one that left last. Over set K: finished, with an estimate.
 * None there: none.
 */
export function similarRebuilds(
  facts: readonly RebuildFacts[],
  { planCents, ...car }: Car & { readonly planCents: number },
  count = 3,
): Similar[] {
  const measured = planned(facts).map((rebuild) => {
    const inCommon = TRAITS.filter((trait) => car[trait] !== null && rebuild[trait] === car[trait]);
    const planRatio = rebuild.estimateCents / planCents;
    return { rebuild, inCommon, planRatio, alike: likeness(inCommon), apart: Math.abs(Math.log(planRatio)) };
  });
  measured.sort((a, b) => b.alike - a.alike || a.apart - b.apart || latestFirst(a.rebuild, b.rebuild));
  return measured.slice(0, count).map(({ rebuild, inCommon, planRatio }) => ({ rebuild, inCommon, planRatio }));
}

/** First by how many traits are in common, then by which. */
function likeness(inCommon: readonly Trait[]): number {
  return inCommon.length * 8 + inCommon.reduce((total, trait) => total + 4 / 2 ** TRAITS.indexOf(trait), 0);
}

function latestFirst(a: Completed, b: Completed): number {
  if (a.exit.on !== b.exit.on) return a.exit.on < b.exit.on ? 1 : -1;
  return byCodePoint(a.id, b.id);
}
