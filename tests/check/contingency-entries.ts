import type { BackTestLevel, RuleName, Score } from '../../server/domain/back-test.ts';
import type { Contingency, Level } from '../../server/domain/contingency.ts';
import type { TwoPartRule } from '../../server/domain/two-part-rule.ts';
import { reserve, twoPartReserve } from '#shared/measures/reserves.ts';
import type { Entry } from './answers-document.ts';

/** The plan that the reference answers quote a reserve for, cents. */
const PLAN_CENTS = 500_000;

export function levelText({ p, q }: Level): string {
  return `${p}/${q}`;
}

export function contingencyEntry(one: Contingency): Entry {
  return {
    k: one.k,
    attainable: one.taken !== null,
    guarantee: one.guarantee,
    uplift: one.uplift,
    reserve_on_500000_cents: one.taken && reserve(one.taken, PLAN_CENTS),
  };
}

export function twoPartEntry({ level, k, creepPercent, flatCents }: TwoPartRule): Entry {
  const isAttainable = creepPercent !== null && flatCents !== null;
  return {
    level: levelText(level),
    k,
    attainable: isAttainable,
    flat_cents: flatCents,
    reserve_on_500000_cents: isAttainable ? twoPartReserve(creepPercent, flatCents, PLAN_CENTS) : null,
  };
}

export function backTestEntry(one: BackTestLevel): Entry {
  return {
    level: levelText(one.level),
    not_attainable: one.notAttainableCount,
    percent: scoreEntry(one.scores.percent),
    ...(one.scores.twoPart && { two_part: scoreEntry(one.scores.twoPart) }),
    flat_rules: flatEntries(one, [10, 15, 20, 25]),
  };
}

export function flatEntries(one: BackTestLevel, percents: readonly (10 | 15 | 20 | 25)[]): Entry {
  const names = percents.map((percent): RuleName => `flat${percent}`);
  return Object.fromEntries(names.map((name) => [name, scoreEntry(one.scores[name])]));
}

export function scoreEntry(score: Score | undefined): Entry {
  if (!score) throw new TypeError('rule was not scored');
  return {
    scored: score.n,
    covered: score.x,
    coverage: score.rate,
    shortfall_cents: score.shortCents,
    idle_reserve_cents: score.unusedCents,
    reserve_cents: score.reserveCents,
  };
}
