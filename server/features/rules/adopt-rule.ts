import type { z } from 'zod';
import { MOST_PERCENT, type newRuleSchema, type Rule } from '#shared/contracts/rules.ts';
import type { Day } from '#shared/day.ts';
import { type NewRule, readRules, ruleStore } from '../../books/rules.ts';
import type { ShopScope } from '../../books/scope.ts';
import { readShopFacts, type ShopFacts } from '../../books/shop-facts.ts';
import { shopYearOf } from '../../domain/years.ts';
import { rawHandle } from '../../platform/database.ts';
import { impossible } from '../../platform/problems.ts';
import { reviewedBy } from './reviewed-by.ts';
import { ruleFigure } from './rule-figure.ts';

type Wish = z.output<typeof newRuleSchema> & { readonly userId: string; readonly today: Day };

/**
 * Adopts a rule for this shop year or the next: what the books ask for today, worked out here anew from all the shop's
 * rebuilds (what a page shows is never taken on trust), or what the shop wants above it. Below it a reason must be
 * given; a rule that was looked at and kept is one.
 */
export async function adoptRule(scope: ShopScope, wish: Wish): Promise<{ before: Rule | null; after: Rule }> {
  const raw = await rawHandle(scope.db);
  const shop = readShopFacts(raw, scope.shopId);
  mustBeNear(wish.year, shopYearOf(wish.today, shop.startMonth));
  const asked = mustBeAsked(shop, wish);
  const wanted = wantedFigures(wish, asked);
  const rules = readRules(raw, scope.shopId);
  const review = reviewedBy(shop, rules, { ...wish, ...wanted });
  mustHaveReason(wish, wanted, asked, review);
  const before = rules.find(({ year }) => year === wish.year) ?? null;
  const { year, kind, level, today } = wish;
  const rule: NewRule = { ...asked, ...wanted, year, kind, level, note: wish.note ?? null, review, adoptedOn: today };
  const id = await ruleStore(scope, wish.userId).adopt(rule);
  const after = readRules(raw, scope.shopId).find((one) => one.id === id);
  if (!after) throw new Error('the adopted rule is not there');
  return { before, after };
}

type Figures = Pick<Rule, 'percent' | 'flatCents'>;

function mustBeNear(year: number, thisYear: number): void {
  if (year === thisYear || year === thisYear + 1) return;
  throw impossible('/year', `A rule can be adopted for ${thisYear} or ${thisYear + 1}.`);
}

function mustBeAsked(shop: ShopFacts, wish: Wish) {
  const figure = ruleFigure(shop, wish);
  if (!figure) {
    throw impossible('/level', 'Too few finished rebuilds with an estimate yet for a rule at this level.');
  }
  if (figure.percent > MOST_PERCENT) {
    throw impossible(
      '/level',
      `The books ask for ${figure.percent}%: no plan can carry that. Look at the estimates first.`,
    );
  }
  return figure;
}

/** What the shop wants, or what the books ask for where it says nothing. */
function wantedFigures({ kind, percent, flatCents }: Wish, asked: Figures): Figures {
  if (kind === 'percent' && flatCents !== undefined) {
    throw impossible('/flatCents', 'A rule of one percentage has no sum for surprises.');
  }
  return { percent: percent ?? asked.percent, flatCents: flatCents ?? asked.flatCents };
}

function mustHaveReason(wish: Wish, wanted: Figures, asked: Figures, review: Rule['review']): void {
  const isBelow = wanted.percent < asked.percent || (wanted.flatCents ?? 0) < (asked.flatCents ?? 0);
  if (!isBelow || wish.note || review?.decision === 'kept') return;
  throw impossible('/note', 'This is less than the books ask for. Say why, so that next year knows.');
}
