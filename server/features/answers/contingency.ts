import type { z } from 'zod';
import type { contingencyAnswerSchema, contingencyQuerySchema } from '#shared/contracts/answers-contingency.ts';
import { MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import type { Rule } from '#shared/contracts/rules.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { type Trial, walkForward } from '../../domain/back-test.ts';
import { contingency, type Level, levelOf, rankAt, wholePercent } from '../../domain/contingency.ts';
import { ruleRecord } from '../../domain/rule-record.ts';
import { type Completed, isOverwritten, type PlannedOutcome, plannedOutcomes } from '../../domain/sets.ts';
import { median, quantile, sum } from '../../domain/statistics.ts';
import { twoPartRule } from '../../domain/two-part-rule.ts';
import { shopYearOf, yearSpan } from '../../domain/years.ts';
import { backTestOf, FLAT_RULES } from './contingency-scores.ts';
import { filtered, filterOptions } from './filter.ts';
import { type AnswerInput, leftOut, rebuildOf, refOf } from './input.ts';

type Answer = z.input<typeof contingencyAnswerSchema>;

/** From this many rebuilds on a damage type gets a figure of its own (decisions 27). */
const OWN_FIGURE_FROM = 9;

/** How much cushion should next year's budgets carry? (definitions §10, §11, §11b, §18.3) */
export function contingencyAnswer(input: AnswerInput, query: z.output<typeof contingencyQuerySchema>): Answer {
  const { level: name, ...filter } = query;
  const level = levelOf(name);
  const rebuilds = filtered(input, filter, 'left');
  const done = rebuilds.filter((one): one is ShopRebuild & Completed => one.exit !== null);
  const set = done.filter((one) => one.estimateCents > 0 && !isOverwritten(one));
  const outcomes = plannedOutcomes(set);
  const told = plannedOutcomes(set.filter(({ hasUnknownForeseen }) => !hasUnknownForeseen));
  const [twoPartTest] = walkForward(told, { levels: [level], knowledge: 'asKnown', withTwoPart: true });
  // Where every entry says whether it was foreseen, both are the same rebuilds, and one walk serves both.
  const [test] =
    told.length === outcomes.length
      ? [twoPartTest]
      : walkForward(outcomes, { levels: [level], knowledge: 'asKnown', withTwoPart: false });
  const trials = test?.trials.percent ?? [];
  return {
    asOf: input.today,
    rebuildCount: rebuilds.length,
    filters: filterOptions(input, 'left'),
    leftOut: leftOut([
      ['not sold yet', rebuilds.filter(({ exit }) => exit === null)],
      ['no estimate', done.filter((one) => one.estimateCents === 0)],
      ['estimate written over with what it came to', done.filter(isOverwritten)],
      ['foreseen or surprise not said', set.filter(({ hasUnknownForeseen }) => hasUnknownForeseen)],
      ...unscored(input, trials),
    ]),
    level: name,
    estimateCents: sum(outcomes.map((one) => one.estimateCents)),
    overrunCents: sum(outcomes.map((one) => one.overrunCents)),
    percent: percentOf(input, outcomes, level),
    twoPart: twoPartOf(told, level),
    backTest: backTestOf(test, ['percent', ...FLAT_RULES]),
    twoPartBackTest: backTestOf(twoPartTest, ['percent', 'twoPart', ...FLAT_RULES]),
    trail: trials.slice(-MARKS_AT_MOST).map((trial) => trailOf(input, trial)),
    trailTotal: trials.length,
    damages: damagesOf(input, set, level),
    ...rulesOf(input),
  };
}

/** Those that the back-test could not judge: too little was known when they were bought. */
function unscored(input: AnswerInput, trials: readonly Trial[]) {
  const open = trials.filter(({ asked }) => asked === null);
  const few = (isFew: boolean) =>
    open.filter(({ historySize }) => historySize < 5 === isFew).map(({ id }) => rebuildOf(input, id));
  return [
    ['fewer than five known when it was bought', few(true)],
    ['too few known for this level when it was bought', few(false)],
  ] as const;
}

function percentOf(input: AnswerInput, outcomes: readonly PlannedOutcome[], level: Level): Answer['percent'] {
  const { n, k, guarantee, uplift, taken } = contingency(outcomes, level);
  // The measure hands back the very outcome that it took.
  const outcome = outcomes.find((one) => one === taken);
  return {
    n,
    k,
    isAttainable: taken !== null,
    guarantee,
    uplift,
    percent: taken && wholePercent(taken),
    taken: outcome
      ? {
          ...refOf(rebuildOf(input, outcome.id)),
          estimateCents: outcome.estimateCents,
          overrunCents: outcome.overrunCents,
        }
      : null,
  };
}

function twoPartOf(outcomes: readonly PlannedOutcome[], level: Level): Answer['twoPart'] {
  const { n, k, creepPercent, flatCents } = twoPartRule(outcomes, level);
  return {
    n,
    k,
    isAttainable: flatCents !== null,
    guarantee: flatCents === null ? null : k / (n + 1),
    creepPercent,
    creepCents: sum(outcomes.map((one) => one.overrunCents - one.surpriseCents)),
    estimateCents: sum(outcomes.map((one) => one.estimateCents)),
    flatCents,
    adoptFlatCents: flatCents === null ? null : Math.ceil(flatCents / 100) * 100,
  };
}

function trailOf(input: AnswerInput, trial: Trial): Answer['trail'][number] {
  const { id, exitOn, estimateCents: plan, overrunCents, historySize, asked } = trial;
  return {
    ...refOf(rebuildOf(input, id)),
    exitOn,
    year: shopYearOf(exitOn, input.shop.startMonth),
    estimateCents: plan,
    overrunCents,
    overrun: overrunCents / plan,
    knownCount: historySize,
    uplift: asked?.uplift ?? null,
    reserveCents: asked?.reserveCents ?? null,
    isCovered: asked?.isCovered ?? null,
    shortCents: asked?.shortCents ?? null,
    unusedCents: asked?.unusedCents ?? null,
  };
}

function damagesOf({ shop }: AnswerInput, set: readonly Completed[], level: Level): Answer['damages'] {
  return shop.damages.flatMap(({ id, name }) => {
    const members = set.filter(({ damage }) => damage === name);
    if (members.length === 0) return [];
    const outcomes = plannedOutcomes(members);
    const rates = outcomes.map((one) => one.overrunCents / one.estimateCents);
    const { uplift, taken } = contingency(outcomes, level);
    const hasOwn = members.length >= OWN_FIGURE_FROM && taken !== null;
    return [
      {
        damageId: id,
        name,
        n: members.length,
        k: rankAt(members.length, level),
        median: median(rates),
        q10: quantile(rates, 0.1),
        q90: quantile(rates, 0.9),
        uplift: hasOwn ? uplift : null,
        percent: hasOwn ? wholePercent(taken) : null,
      },
    ];
  });
}

/** The rules of this shop year and the next. Their record counts every rebuild, whatever the page filters. */
function rulesOf({ shop, today, rules }: AnswerInput): Pick<Answer, 'thisYear' | 'nextYear'> {
  const thisYear = shopYearOf(today, shop.startMonth);
  const adopted = rules();
  const inForce = (year: number): Answer['thisYear'] => {
    const rule: Rule | undefined = adopted.find((one) => one.year === year);
    const record = rule && ruleRecord(shop.rebuilds, rule, yearSpan(year, shop.startMonth));
    return { year, rule: rule && record ? { ...rule, record } : null };
  };
  return { thisYear: inForce(thisYear), nextYear: inForce(thisYear + 1) };
}
