import type { Day } from '#shared/day.ts';
import type { RebuildFacts } from './facts.ts';
import { type Curve, kaplanMeier, medianDays, type UnsoldAt, unsoldAt } from './kaplan-meier.ts';
import { type LogRank, logRank } from './log-rank.ts';
import { marketSet, type OnMarket } from './sets.ts';
import { FEW } from './statistics.ts';
import { byCodePoint } from './text-order.ts';

export interface SellingTime {
  readonly n: number;
  readonly soldCount: number;
  /** Left the market otherwise than by sale: watched up to that day. */
  readonly otherExitCount: number;
  readonly median: { readonly days: number | null; readonly lower: number | null; readonly upper: number | null };
  readonly at30: UnsoldAt;
  readonly at60: UnsoldAt;
  readonly at90: UnsoldAt;
  readonly curve: Curve;
  /** Fewer than five sales. */
  readonly isThin: boolean;
}

export interface DaysToSell {
  readonly overall: SellingTime;
  readonly classes: readonly (SellingTime & { readonly class: string })[];
  /** The two classes with the most vehicles, a first by name. null = one class only, or no sale. */
  readonly comparison:
    | (LogRank & { readonly classA: string; readonly classB: string; readonly nA: number; readonly nB: number })
    | null;
  /** Left out of everything: days in an impossible order; sold without a listing day. */
  readonly oddDatesCount: number;
  readonly noListedCount: number;
  /** In the overall curve, but in no class: the class is not known. */
  readonly noClassCount: number;
}

/**
 * How long vehicles take to sell (definitions §7, §18.1), the unsold counted as watched up to `asOf`. Leaving them out,
 * or taking their age as a selling time, would make the time too short. Nothing listed: n 0 and every figure null.
 */
export function daysToSell(facts: readonly RebuildFacts[], asOf: Day): DaysToSell {
  const { members, oddDatesCount, noListedCount } = marketSet(facts, asOf);
  const byClass = new Map<string, OnMarket[]>();
  for (const member of members) {
    if (member.class === null) continue;
    const others = byClass.get(member.class);
    if (others) others.push(member);
    else byClass.set(member.class, [member]);
  }
  const names = [...byClass.keys()].sort(byCodePoint);
  return {
    overall: sellingTime(members),
    classes: names.map((name) => ({ class: name, ...sellingTime(byClass.get(name) ?? []) })),
    comparison: compareLargest(byClass, names),
    oddDatesCount,
    noListedCount,
    noClassCount: members.filter((member) => member.class === null).length,
  };
}

function sellingTime(members: readonly OnMarket[]): SellingTime {
  const curve = kaplanMeier(members);
  return {
    n: members.length,
    soldCount: curve.soldCount,
    otherExitCount: members.filter((member) => member.isOtherExit).length,
    median: medianDays(curve),
    at30: unsoldAt(curve, 30),
    at60: unsoldAt(curve, 60),
    at90: unsoldAt(curve, 90),
    curve,
    isThin: curve.soldCount < FEW,
  };
}

function compareLargest(
  byClass: ReadonlyMap<string, readonly OnMarket[]>,
  names: readonly string[],
): DaysToSell['comparison'] {
  const size = (name: string): number => byClass.get(name)?.length ?? 0;
  // `names` is in order and sorting is stable, so of equal classes the first by name stays first.
  const [classA, classB] = names
    .toSorted((x, y) => size(y) - size(x))
    .slice(0, 2)
    .sort(byCodePoint);
  if (classA === undefined || classB === undefined) return null;
  const test = logRank(byClass.get(classA) ?? [], byClass.get(classB) ?? []);
  return test && { classA, classB, nA: size(classA), nB: size(classB), ...test };
}
