import type { z } from 'zod';
import type { newRuleSchema, Rule } from '#shared/contracts/rules.ts';
import type { Day } from '#shared/day.ts';
import { type NewRule, readRules, ruleStore } from '../../books/rules.ts';
import type { ShopScope } from '../../books/scope.ts';
import { readShopFacts } from '../../books/shop-facts.ts';
import { shopYearOf } from '../../domain/years.ts';
import { rawHandle } from '../../platform/database.ts';
import { impossible } from '../../platform/problems.ts';
import { ruleFigure } from './rule-figure.ts';

type Wish = z.output<typeof newRuleSchema> & { readonly userId: string; readonly today: Day };

/**
 * Adopts the rule that the books ask for today, for this shop year or the next. The figure is worked out here anew,
 * from all the shop's rebuilds: what a page shows is never taken on trust.
 */
export async function adoptRule(scope: ShopScope, wish: Wish): Promise<{ before: Rule | null; after: Rule }> {
  const raw = await rawHandle(scope.db);
  const shop = readShopFacts(raw, scope.shopId);
  const thisYear = shopYearOf(wish.today, shop.startMonth);
  if (wish.year !== thisYear && wish.year !== thisYear + 1) {
    throw impossible('/year', `A rule can be adopted for ${thisYear} or ${thisYear + 1}.`);
  }
  const figure = ruleFigure(shop, wish);
  if (!figure) {
    throw impossible('/level', 'Too few finished rebuilds with an estimate yet for a rule at this level.');
  }
  const before = readRules(raw, scope.shopId).find(({ year }) => year === wish.year) ?? null;
  const rule: NewRule = {
    year: wish.year,
    kind: wish.kind,
    level: wish.level,
    ...figure,
    note: wish.note ?? null,
    adoptedOn: wish.today,
  };
  const id = await ruleStore(scope, wish.userId).adopt(rule);
  const after = readRules(raw, scope.shopId).find((one) => one.id === id);
  if (!after) throw new Error('the adopted rule is not there');
  return { before, after };
}
