import type { z } from 'zod';
import { MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import type { ruleReviewQuerySchema, ruleReviewSchema } from '#shared/contracts/answers-rule-review.ts';
import { RULE_KINDS, type Rule } from '#shared/contracts/rules.ts';
import { askedRule } from '../../domain/asked-rule.ts';
import { levelOf } from '../../domain/contingency.ts';
import { ruleGrade } from '../../domain/rule-grade.ts';
import { type HeldTrial, ruleDays, type RuleRecord, ruleRecord } from '../../domain/rule-record.ts';
import { planned, plannedAndTold } from '../../domain/sets.ts';
import { sum } from '../../domain/statistics.ts';
import { shopYearOf, yearSpan } from '../../domain/years.ts';
import { filterOptions } from './filter.ts';
import { type AnswerInput, leftOut, rebuildOf, refOf } from './input.ts';

type Answer = z.input<typeof ruleReviewSchema>;
interface Looked {
  readonly rule: Rule;
  readonly record: RuleRecord;
  readonly graded: Answer['history'][number];
}

/** Did the rule hold? Each rule on what was bought under it only; nothing is set anew on what is judged. */
export function ruleReview(input: AnswerInput, { year }: z.output<typeof ruleReviewQuerySchema>): Answer {
  const { shop, today } = input;
  const rules = input.rules();
  const thisYear = shopYearOf(today, shop.startMonth);
  const looked = rules.map((rule) => lookAt(input, rule, rules));
  const chosen = choose(looked, thisYear, year);
  const named = (ids: readonly string[]) => ids.map((id) => rebuildOf(input, id));
  return {
    asOf: today,
    rebuildCount: chosen ? chosen.record.n + chosen.record.openCount + chosen.record.noEstimateIds.length : 0,
    filters: filterOptions(input, 'left'),
    leftOut: leftOut([
      ['not sold yet', named(chosen?.record.openIds ?? [])],
      ['no estimate', named(chosen?.record.noEstimateIds ?? [])],
    ]),
    thisYear,
    reviewed: chosen ? reviewedOf(input, chosen, rules, thisYear) : null,
    history: looked.map(({ graded }) => graded).reverse(),
  };
}

/** The rule in force of the year asked for; else the latest so far that has something to be judged on, or the latest. */
function choose(looked: readonly Looked[], thisYear: number, year: number | undefined): Looked | undefined {
  const inForce = looked.filter(({ graded }) => graded.isInForce);
  if (year !== undefined) return inForce.find(({ rule }) => rule.year === year);
  const soFar = inForce.filter(({ rule }) => rule.year <= thisYear);
  return soFar.find(({ record }) => record.n > 0) ?? soFar[0];
}

function lookAt({ shop }: AnswerInput, rule: Rule, rules: readonly Rule[]): Looked {
  const days = ruleDays(rule, rules, yearSpan(rule.year, shop.startMonth));
  const record = ruleRecord(shop.rebuilds, rule, days);
  const { n, k } = rule.evidence;
  const grade = ruleGrade({ n, k, m: record.n, held: record.x });
  const isInForce = rules.every((one) => one.year !== rule.year || one.revision <= rule.revision);
  const reserveCents = sum(record.trials.map((one) => one.reserveCents));
  return { rule, record, graded: { ...rule, ...days, isInForce, record: { ...record, reserveCents }, grade } };
}

function reviewedOf(
  input: AnswerInput,
  { rule, record, graded }: Looked,
  rules: readonly Rule[],
  thisYear: number,
): Answer['reviewed'] {
  const nextYear = Math.max(rule.year + 1, thisYear);
  const { p, q } = levelOf(rule.level);
  const kinds = [rule.kind, ...RULE_KINDS.filter((kind) => kind !== rule.kind)];
  return {
    ...graded,
    trials: record.trials.slice(-MARKS_AT_MOST).map((trial) => trialOf(input, trial)),
    nextYear,
    next: rules.find((one) => one.year === nextYear) ?? null,
    askedNow: kinds.map((kind) => askedNow(input, kind, rule.level)),
    share: p / q,
  };
}

function trialOf(input: AnswerInput, trial: HeldTrial) {
  const year = shopYearOf(trial.exitOn, input.shop.startMonth);
  return { ...trial, ...refOf(rebuildOf(input, trial.id)), year };
}

function askedNow({ shop }: AnswerInput, kind: Rule['kind'], level: Rule['level']) {
  const asked = askedRule(shop.rebuilds, { kind, level: levelOf(level) });
  const n = asked?.n ?? (kind === 'percent' ? planned : plannedAndTold)(shop.rebuilds).length;
  return { kind, level, n, figures: asked && { percent: asked.percent, flatCents: asked.flatCents } };
}
