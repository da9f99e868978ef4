import type { Rule } from '#shared/contracts/rules.ts';
import type { Day } from '#shared/day.ts';
import { notYetLeft } from '../../books/shop-facts-rows.ts';
import type { ShopFacts } from '../../books/shop-facts.ts';
import { ruleDays, ruleRecord } from '../../domain/rule-record.ts';
import { yearSpan } from '../../domain/years.ts';
import { impossible } from '../../platform/problems.ts';

type Wanted = Pick<Rule, 'kind' | 'level' | 'percent' | 'flatCents'> & {
  readonly reviewedRuleId?: string | undefined;
  readonly today: Day;
};

/** What was seen of the rule looked at, as it stands today, and whether this one is the same again. null = none looked at. */
export function reviewedBy(shop: ShopFacts, rules: readonly Rule[], wanted: Wanted): Rule['review'] {
  const { reviewedRuleId: ruleId, today } = wanted;
  if (ruleId === undefined) return null;
  const rule = rules.find(({ id }) => id === ruleId);
  if (!rule) throw impossible('/reviewedRuleId', 'There is no such rule to look back at.');
  const facts = shop.rebuilds.map((one) => (one.exit && one.exit.on > today ? notYetLeft(one) : one));
  const days = ruleDays(rule, rules, yearSpan(rule.year, shop.startMonth));
  const { x, n, openCount, shortCents, unusedCents } = ruleRecord(facts, rule, days);
  const isKept = (['kind', 'level', 'percent', 'flatCents'] as const).every((name) => rule[name] === wanted[name]);
  const { year, revision } = rule;
  const decision = isKept ? 'kept' : 'changed';
  return { ruleId, year, revision, decision, x, n, openCount, shortCents, unusedCents };
}
