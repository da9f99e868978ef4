import type { CarTraits } from './ladder-rungs.ts';

/** What a past rebuild may have in common with a car; from the one that tells most to the one that tells least. */
const TRAITS = { seen: 'isSeen', damage: 'damageId', class: 'classId' } as const;
export type Trait = keyof typeof TRAITS;
const TRAIT_NAMES = ['seen', 'damage', 'class'] as const satisfies readonly Trait[];

/** A finished rebuild with an estimate > 0, in cents, that was not written over. */
export interface PastRebuild extends CarTraits {
  readonly id: string;
  readonly estimateCents: number;
  readonly leftOn: string;
}

/** A past rebuild beside the car in question. */
export interface Similar<T> {
  readonly rebuild: T;
  /** What the two have in common; what is not known of either is not in common. */
  readonly inCommon: readonly Trait[];
  /** Its plan ÷ the plan in question: 1 = of the same size. null = nothing is planned yet. */
  readonly planRatio: number | null;
}

/**
 * The past rebuilds most like a car with a repair plan of `planCents`, nearest first, at most `count`: those with more
 * in common of seen, damage and class; of as many, those alike in seen, then in damage; of equals the nearest in plan
 * size (half and double are equally far; without a plan all are), then the one that left last. None in the past: none.
 */
export function similarRebuilds<T extends PastRebuild>(
  past: readonly T[],
  { planCents, ...car }: CarTraits & { readonly planCents: number },
  count = 3,
): Similar<T>[] {
  const measured = past.map((rebuild) => {
    const inCommon = TRAIT_NAMES.filter((name) => isAlike(rebuild, car, TRAITS[name]));
    const planRatio = planCents > 0 ? rebuild.estimateCents / planCents : null;
    const apart = planRatio === null ? 0 : Math.abs(Math.log(planRatio));
    return { rebuild, inCommon, planRatio, alike: likeness(inCommon), apart };
  });
  measured.sort((a, b) => b.alike - a.alike || a.apart - b.apart || latestFirst(a.rebuild, b.rebuild));
  return measured.slice(0, count).map(({ rebuild, inCommon, planRatio }) => ({ rebuild, inCommon, planRatio }));
}

function isAlike(past: CarTraits, car: CarTraits, trait: keyof CarTraits): boolean {
  return car[trait] !== null && past[trait] === car[trait];
}

/** First by how many traits are in common, then by which. */
function likeness(inCommon: readonly Trait[]): number {
  return inCommon.length * 8 + inCommon.reduce((total, trait) => total + 4 / 2 ** TRAIT_NAMES.indexOf(trait), 0);
}

/** Ids of one shop are of one alphabet, so plain order is order by code point. */
function latestFirst(a: PastRebuild, b: PastRebuild): number {
  if (a.leftOn !== b.leftOn) return a.leftOn < b.leftOn ? 1 : -1;
  return a.id < b.id ? -1 : 1;
}
