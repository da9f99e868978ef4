import type { BidBasis, Start, Surprises } from '../contracts/bids-basis.ts';
import type { CarTraits } from './ladder-rungs.ts';

/** From this many past rebuilds on, a kind of car speaks for itself here; what is shown is no rule, and says its n. */
export const FEWEST_ALIKE = 5;

/** Where a plan may start: the past of this class and damage, else of this damage, else all of it. */
export function startFor(starts: readonly Start[], { classId, damageId }: CarTraits): Start | null {
  const of = (aClass: string | null, damage: string | null) =>
    starts.find((one) => one.classId === aClass && one.damageId === damage && one.n >= FEWEST_ALIKE);
  const [same, damaged] =
    damageId === null ? [] : [classId === null ? undefined : of(classId, damageId), of(null, damageId)];
  return same ?? damaged ?? starts.find((one) => one.classId === null && one.damageId === null) ?? null;
}

/** What surprised on such cars: of this damage and seen or not, else of this damage, else all. */
export function surprisesFor(groups: readonly Surprises[], { damageId, isSeen }: CarTraits): Surprises | null {
  const of = (seen: boolean | null) =>
    groups.find((one) => one.damageId === damageId && one.isSeen === seen && one.n >= FEWEST_ALIKE);
  const [same, damaged] = damageId === null ? [] : [isSeen === null ? undefined : of(isSeen), of(null)];
  return same ?? damaged ?? groups.find((one) => one.damageId === null) ?? null;
}

/** Days to sell and days held of this class; of all classes where fewer than five of it were ever sold. */
export function sellingFor(selling: BidBasis['selling'], classId: string | null): BidBasis['selling'][number] | null {
  const same = selling.find((one) => one.classId !== null && one.classId === classId);
  if (same && same.toSell.soldCount >= FEWEST_ALIKE) return same;
  return selling.find((one) => one.classId === null) ?? null;
}
