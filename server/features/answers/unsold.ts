import { MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import { AGES, type TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import { type Day, daysBetween } from '#shared/day.ts';
import type { Stage } from '#shared/vocabulary.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { heldOn } from '../../books/spent-by.ts';
import { sum } from '../../domain/statistics.ts';
import { type AnswerInput, refOf } from './input.ts';

type Unsold = TimeToSellAnswer['unsold'];

/** What is still in hand, the longest first, with the money in it and how old that money is. */
export function unsoldOf({ today, spentBy }: AnswerInput, rebuilds: readonly ShopRebuild[]): Unsold {
  const held = heldOn(rebuilds, today);
  const spent = spentBy(
    held.map(({ id }) => id),
    today,
  );
  const rows = held.map((one) => {
    const tiedUpCents = (one.purchaseCents ?? 0) + (spent.get(one.id) ?? 0);
    const since = (day: Day | null) => (day === null || day > today ? null : daysBetween(day, today));
    return {
      ...refOf(one),
      stage: stageOf(one),
      boughtOn: one.boughtOn,
      listedOn: one.listedOn,
      daysSinceBought: since(one.boughtOn),
      daysListed: since(one.listedOn),
      askingCents: one.askingCents,
      tiedUpCents,
    };
  });
  rows.sort((a, b) => (b.daysSinceBought ?? 0) - (a.daysSinceBought ?? 0));
  return {
    on: today,
    total: rows.length,
    cents: sum(rows.map(({ tiedUpCents }) => tiedUpCents)),
    ages: agesOf(rows),
    rebuilds: rows.slice(0, MARKS_AT_MOST),
  };
}

/** `rows` stand oldest first. */
function agesOf(rows: Unsold['rebuilds']): Unsold['ages'] {
  return AGES.map((fromDays, at) => {
    const toDays = AGES[at + 1] ?? Infinity;
    const own = rows.filter(({ daysSinceBought }) => {
      const days = daysSinceBought ?? 0;
      return days >= fromDays && days < toDays;
    });
    const [first] = own;
    const oldest = first ? { id: first.id, tag: first.tag, name: first.name } : null;
    return { fromDays, count: own.length, cents: sum(own.map(({ tiedUpCents }) => tiedUpCents)), oldest };
  });
}

function stageOf({ listedOn, readyOn, startedOn }: ShopRebuild): Stage {
  if (listedOn !== null) return 'listed';
  if (readyOn !== null) return 'ready';
  return startedOn === null ? 'bought' : 'in the shop';
}
