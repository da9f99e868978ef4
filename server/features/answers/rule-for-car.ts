import type { z } from 'zod';
import type { ruleForCarQuerySchema, ruleForCarSchema } from '#shared/contracts/answers-rule-for-car.ts';
import type { Named } from '../../books/shop-facts.ts';
import { wholeUnits } from '../../domain/asked-rule.ts';
import { levelOf, wholePercent } from '../../domain/contingency.ts';
import { coverageBand } from '../../domain/coverage-band.ts';
import { type Car, type Footing, percentOnLadder, twoPartOnLadder } from '../../domain/ladder.ts';
import type { AnswerInput } from './input.ts';

type Answer = z.input<typeof ruleForCarSchema>;
type Query = z.output<typeof ruleForCarQuerySchema>;

/** What cushion does such a car ask for, and on which past rebuilds does that rest? (definitions §11b, §18.4) */
export function ruleForCar(input: AnswerInput, query: Query): Answer {
  const level = levelOf(query.level);
  const car = carOf(input, query);
  const percent = percentOnLadder(input.shop.rebuilds, car, level);
  const twoPart = twoPartOnLadder(input.shop.rebuilds, car, level);
  const { creepPercent, flatCents } = twoPart;
  return {
    asOf: input.today,
    level: query.level,
    percent: {
      ...footingOf(percent),
      guarantee: percent.guarantee,
      uplift: percent.uplift,
      percent: percent.taken && wholePercent(percent.taken),
    },
    twoPart: {
      ...footingOf(twoPart),
      guarantee: flatCents === null ? null : twoPart.k / (twoPart.n + 1),
      creepPercent,
      flatCents,
      adoptFlatCents: flatCents === null ? null : wholeUnits(flatCents),
    },
  };
}

function footingOf({ rung, n, k, tried }: Footing) {
  return { rung, n, k, band: rung && coverageBand(n, k), tried: [...tried] };
}

function carOf({ shop }: AnswerInput, query: Query): Car {
  // An id that the shop does not know is like no past rebuild, just as one that is not said.
  const nameIn = (list: readonly Named[], id: string | undefined) => list.find((one) => one.id === id)?.name ?? null;
  return {
    class: nameIn(shop.classes, query.class),
    damage: nameIn(shop.damages, query.damage),
    seen: query.seen === undefined ? null : query.seen === 'yes',
  };
}
