import type { z } from 'zod';
import type { contingencyAnswerSchema, contingencyQuerySchema } from '#shared/contracts/answers-contingency.ts';
import type { Rule } from '#shared/contracts/rules.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { type Trial, walkForward } from '../../domain/back-test.ts';
import { byOverrun, contingency, type Level, levelOf, rankAt, wholePercent } from '../../domain/contingency.ts';
import { grouped } from '../../domain/grouped.ts';
import { ruleRecord } from '../../domain/rule-record.ts';
import { type Completed, isOverwritten, type PlannedOutcome, plannedOutcomes } from '../../domain/sets.ts';
import { quantiles, sum } from '../../domain/statistics.ts';
import { shopYearOf, yearSpan } from '../../domain/years.ts';
import { driftOf } from './contingency-drift.ts';
import { pastBidsOf } from './contingency-past-bids.ts';
import { percentOf, twoPartOf } from './contingency-rules.ts';
import { backTestOf, FLAT_RULES } from './contingency-scores.ts';
import { trailOf } from './contingency-trail.ts';
import { filtered, filterOptions } from './filter.ts';
import { type AnswerInput, leftOut, rebuildOf } from './input.ts';

type Answer = z.input<typeof contingencyAnswerSchema>;

/** From this many rebuilds on a damage type gets a figure of its own (decisions 27). */
const OWN_FIGURE_FROM = 9;

/** How much cushion should next year's budgets carry? (definitions §10, §11, §11b, §18.3; trade: drift, past bids) */
export function contingencyAnswer(input: AnswerInput, query: z.output<typeof contingencyQuerySchema>): Answer {
  const { level: name, ...filter } = query;
  const level = levelOf(name);
  const rebuilds = filtered(input, filter, 'left');
  const done = rebuilds.filter((one): one is ShopRebuild & Completed => one.exit !== null);
  const set = done.filter((one) => one.estimateCents > 0 && !isOverwritten(one));
  const outcomes = plannedOutcomes(set);
  const told = outcomes.filter(({ id }) => !rebuildOf(input, id).hasUnknownForeseen);
  const [twoPartTest] = walkForward(told, { levels: [level], knowledge: 'asKnown', withTwoPart: true });
  // Where every entry says whether it was foreseen, both are the same rebuilds, and one walk serves both.
  const [test] =
    told.length === outcomes.length
      ? [twoPartTest]
      : walkForward(outcomes, { levels: [level], knowledge: 'asKnown', withTwoPart: false });
  const trials = test?.trials.percent ?? [];
  const twoPartTrials = twoPartTest?.trials.twoPart ?? [];
  // In order of overrun once: sorting what is sorted costs next to nothing.
  const sorted = outcomes.toSorted(byOverrun);
  const twoPart = twoPartOf(told, level);
  const { creepPercent } = twoPart;
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
    percent: percentOf(input, sorted, level),
    twoPart,
    backTest: backTestOf(test, ['percent', ...FLAT_RULES]),
    twoPartBackTest: backTestOf(twoPartTest, ['percent', 'twoPart', ...FLAT_RULES]),
    trail: trailOf(input, { sorted, told, trials, twoPartTrials, creepPercent }),
    trailTotal: trials.length,
    drift: driftOf(sorted, level, input.today),
    wantedCentsPerHour: input.shop.wantedCentsPerHour,
    pastBids: { percent: pastBidsOf(input, trials), twoPart: pastBidsOf(input, twoPartTrials) },
    damages: damagesOf(input, outcomes, level),
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

function damagesOf(input: AnswerInput, outcomes: readonly PlannedOutcome[], level: Level): Answer['damages'] {
  const byDamage = grouped(outcomes, ({ id }) => rebuildOf(input, id).damage);
  return input.shop.damages.flatMap(({ id, name }) => {
    const members = byDamage.get(name) ?? [];
    if (members.length === 0) return [];
    const rates = members.map((one) => one.overrunCents / one.estimateCents);
    const [middle = null, q10 = null, q90 = null] = quantiles(rates, [0.5, 0.1, 0.9]);
    const { uplift, taken } = contingency(members, level);
    const hasOwn = members.length >= OWN_FIGURE_FROM && taken !== null;
    return [
      {
        damageId: id,
        name,
        n: members.length,
        k: rankAt(members.length, level),
        median: middle,
        q10,
        q90,
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
