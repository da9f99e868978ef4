import { type BidBasis, PAST_AT_MOST } from '#shared/contracts/bids-basis.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { daysHeldUntilSold } from '../../domain/days-held.ts';
import { daysToSell, type SellingTime } from '../../domain/days-to-sell.ts';
import { LEVELS } from '../../domain/contingency.ts';
import { ladderRows } from '../../domain/ladder-rows.ts';
import { overrunByCategory } from '../../domain/overrun.ts';
import { hoursBias } from '../../domain/plan-starts.ts';
import { daysHeld, rebuildProfit } from '../../domain/profit.ts';
import { type Completed, planned, type Priced } from '../../domain/sets.ts';
import { type BasisInput, type Ids, idsOf } from './basis-input.ts';
import { startsOf, surprisesOf } from './basis-kinds.ts';

/**
 * Everything that a pre-bid sheet is worked out from, small enough to be kept on a phone: what past rebuilds say is
 * worked out here for every kind of car that there is, and the sheet only picks.
 */
export function bidBasis(input: BasisInput): BidBasis {
  const { shop, today, feeTable, ruleInForce, words } = input;
  const ids = idsOf(words);
  const past = planned(shop.rebuilds) as (ShopRebuild & Completed)[];
  return {
    asOf: today,
    booksVersion: shop.booksVersion,
    wantedCentsPerHour: shop.wantedCentsPerHour,
    feeTable,
    ...words,
    ruleInForce,
    ladder: ladderOf(input, ids),
    starts: startsOf(past, ids),
    bias: biasOf(input, ids),
    hoursBias: hoursBias(shop.rebuilds),
    selling: sellingOf(input, ids),
    surprises: surprisesOf(input, ids),
    past: past
      .toSorted(latestFirst)
      .slice(0, PAST_AT_MOST)
      .map((one) => pastOf(one, ids)),
    pastTotal: past.length,
  };
}

function ladderOf({ shop }: BasisInput, ids: Ids): BidBasis['ladder'] {
  return ladderRows(shop.rebuilds, LEVELS).map(({ rung, percent, twoPart, ...car }) => ({
    rung,
    ...ids.traits(car),
    percent: { n: percent.n, taken: percent.taken.map((one) => one && [...one]) },
    twoPart: { ...twoPart, flatCents: [...twoPart.flatCents] },
  }));
}

function biasOf({ shop }: BasisInput, ids: Ids): BidBasis['bias'] {
  const found = overrunByCategory(shop.rebuilds).filter(({ n }) => n > 0);
  return ids.inOrder(
    new Map(
      found.map(({ category, n, estimateCents, actualCents }) => [
        category,
        { n, planCents: estimateCents, actualCents },
      ]),
    ),
  );
}

function sellingOf({ shop, today }: BasisInput, ids: Ids): BidBasis['selling'] {
  const { overall, classes } = daysToSell(shop.rebuilds, today);
  const rows = [{ class: null, ...overall }, ...classes];
  return rows.map(({ class: name, ...time }) => ({
    classId: ids.classId(name),
    toSell: waitOf(time),
    held: daysHeldUntilSold(name === null ? shop.rebuilds : shop.rebuilds.filter((one) => one.class === name), today),
  }));
}

function waitOf({ n, soldCount, otherExitCount, median }: SellingTime): BidBasis['selling'][number]['toSell'] {
  const { days, lower, upper } = median;
  return { n, soldCount, unsoldCount: n - soldCount - otherExitCount, otherExitCount, median: days, lower, upper };
}

function pastOf(one: ShopRebuild & Completed, ids: Ids): BidBasis['past'][number] {
  const { id, tag, name, exit, estimateCents, planningCents, plannedSeconds, ownSeconds, paidSeconds } = one;
  const isPriced = (rebuild: Completed): rebuild is Priced => rebuild.purchaseCents !== null;
  return {
    id,
    tag,
    name,
    ...ids.traits(one),
    leftOn: exit.on,
    estimateCents,
    actualCents: planningCents,
    plannedSeconds,
    actualSeconds: ownSeconds === null || paidSeconds === null ? null : ownSeconds + paidSeconds,
    daysHeld: daysHeld(one),
    keptCents: isPriced(one) ? rebuildProfit(one).profitCents : null,
    proceedsCents: exit.proceedsCents,
    expectedSaleCents: one.expectedSaleCents || null,
  };
}

function latestFirst(a: Completed, b: Completed): number {
  if (a.exit.on !== b.exit.on) return a.exit.on < b.exit.on ? 1 : -1;
  return a.id < b.id ? -1 : 1;
}
