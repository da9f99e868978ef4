import type { z } from 'zod';
import type { overrunsAnswerSchema } from '#shared/contracts/answers-overruns.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { rebuildProfit } from '../../domain/profit.ts';
import { worked } from '../../domain/profit-per-hour.ts';
import { rateDifference } from '../../domain/rate-difference.ts';
import { joined, NO_SUMS, ratioDifference, type RatioSums, ratioSums } from '../../domain/ratio-difference.ts';
import { FEW, ratio, wilson } from '../../domain/statistics.ts';
import type { AnswerInput } from './input.ts';

type Answer = z.input<typeof overrunsAnswerSchema>;

/** What is compared: estimate under overrun, rebuilds under surprised ones. */
export interface Looked {
  readonly overrun: RatioSums;
  /** Of those where every entry says whether it was foreseen: how many, and how many had a surprise. */
  readonly told: number;
  readonly surprised: number;
}

const NOTHING: Looked = { overrun: NO_SUMS, told: 0, surprised: 0 };

/** The finished rebuilds whose estimate counts stand in `set`; surprises look at all of `done`. */
export function lookedAt(set: readonly ShopRebuild[], done: readonly ShopRebuild[]): Looked {
  let [told, surprised] = [0, 0];
  for (const { hasUnknownForeseen, categories } of done) {
    if (hasUnknownForeseen) continue;
    told += 1;
    for (const { surpriseCount } of categories.values()) {
      if (surpriseCount === 0) continue;
      surprised += 1;
      break;
    }
  }
  const pairs = set.map((one) => [one.estimateCents, one.planningCents - one.estimateCents] as const);
  return { overrun: ratioSums(pairs), told, surprised };
}

function together(a: Looked, b: Looked): Looked {
  return { overrun: joined(a.overrun, b.overrun), told: a.told + b.told, surprised: a.surprised + b.surprised };
}

function shown({ overrun: { n, x, y }, told, surprised }: Looked) {
  return { n, pooled: ratio(y, x), isThin: n < FEW, surprises: wilson(surprised, told) };
}

/** Kept by own hour: seconds under cents times 3,600. */
function keptSums(done: readonly ShopRebuild[]): RatioSums {
  return ratioSums(worked(done).map((one) => [one.ownSeconds, rebuildProfit(one).profitCents * 3600] as const));
}

export function keptByHour(done: readonly ShopRebuild[]): Answer['seen'][number]['perHour'] {
  const { n, x, y } = keptSums(done);
  return { n, pooledCents: ratio(y, x) };
}

/** Unseen − seen in each figure, with its interval. */
export function seenDifference(set: readonly ShopRebuild[], done: readonly ShopRebuild[]): Answer['seenDifference'] {
  const of = (list: readonly ShopRebuild[], seen: boolean) => list.filter((one) => one.seen === seen);
  const [unseen, seen] = [false, true].map((value) => lookedAt(of(set, value), of(done, value)));
  if (!unseen || !seen) return { overrun: null, surprised: null, perHour: null };
  return {
    overrun: ratioDifference(unseen.overrun, seen.overrun),
    surprised: rateDifference(wilson(unseen.surprised, unseen.told), wilson(seen.surprised, seen.told)),
    perHour: ratioDifference(keptSums(of(done, false)), keptSums(of(done, true))),
  };
}

/**
 * Is it the damage, or the look? Each damage against all others, both split by seen. Sums of a damage are worked out once
 * and those of the others put together from them.
 */
export function byDamage(
  { shop }: AnswerInput,
  set: readonly ShopRebuild[],
  done: readonly ShopRebuild[],
): Answer['damages'] {
  const [planned, finished] = [bySeen(set), bySeen(done)];
  const named = shop.damages.map(({ id, name }) => {
    const [own, all] = [planned.get(name) ?? NOBODY, finished.get(name) ?? NOBODY];
    return {
      damageId: id,
      name,
      seen: lookedAt(own.seen, all.seen),
      unseen: lookedAt(own.unseen, all.unseen),
    };
  });
  return named
    .filter(({ seen, unseen }) => seen.overrun.n + unseen.overrun.n > 0)
    .sort((a, b) => countOf(b) - countOf(a))
    .map((one) => {
      const others = named.filter(({ name }) => name !== one.name);
      const rest = {
        seen: others.reduce((sums, { seen }) => together(sums, seen), NOTHING),
        unseen: others.reduce((sums, { unseen }) => together(sums, unseen), NOTHING),
      };
      return {
        damageId: one.damageId,
        name: one.name,
        own: { seen: shown(one.seen), unseen: shown(one.unseen) },
        others: { seen: shown(rest.seen), unseen: shown(rest.unseen) },
        look: ratioDifference(one.unseen.overrun, one.seen.overrun),
        lookOthers: ratioDifference(rest.unseen.overrun, rest.seen.overrun),
        damageSeen: ratioDifference(one.seen.overrun, rest.seen.overrun),
        damageUnseen: ratioDifference(one.unseen.overrun, rest.unseen.overrun),
      };
    });
}

interface BySeen {
  readonly seen: ShopRebuild[];
  readonly unseen: ShopRebuild[];
}
const NOBODY: BySeen = { seen: [], unseen: [] };

/** By the name of the damage; where it is not said whether one was seen, it is in neither. */
function bySeen(list: readonly ShopRebuild[]): Map<string, BySeen> {
  const damages = new Map<string, BySeen>();
  for (const one of list) {
    if (one.damage === null || one.seen === null) continue;
    let own = damages.get(one.damage);
    if (!own) {
      own = { seen: [], unseen: [] };
      damages.set(one.damage, own);
    }
    own[one.seen ? 'seen' : 'unseen'].push(one);
  }
  return damages;
}

function countOf({ seen, unseen }: { seen: Looked; unseen: Looked }): number {
  return seen.overrun.n + unseen.overrun.n;
}
