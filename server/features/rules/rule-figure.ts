import type { Rule } from '#shared/contracts/rules.ts';
import type { Day } from '#shared/day.ts';
import type { ShopFacts } from '../../books/shop-facts.ts';
import { askedRule } from '../../domain/asked-rule.ts';
import { backTest, backTestTwoPart } from '../../domain/back-test.ts';
import { levelOf } from '../../domain/contingency.ts';
import type { RebuildFacts } from '../../domain/facts.ts';

type Asked = Pick<Rule, 'kind' | 'level'> & { readonly today: Day };
type Figure = Pick<Rule, 'percent' | 'flatCents' | 'rebuildCount' | 'dataUntil' | 'evidence'>;

/** What the books ask for, with what it rests on. null = too few yet at this level. */
export function ruleFigure(shop: ShopFacts, { kind, level: name, today }: Asked): Figure | null {
  const facts = shop.rebuilds.filter(({ exit }) => exit !== null && exit.on <= today);
  const level = levelOf(name);
  const asked = askedRule(facts, { kind, level });
  if (!asked) return null;
  const { percent, flatCents, n, k, dataUntil, uplift, exactFlatCents } = asked;
  const basis = { n, k, guarantee: k / (n + 1), uplift, flatCents: exactFlatCents, booksVersion: shop.booksVersion };
  const evidence = { ...basis, askedPercent: percent, askedFlatCents: flatCents, ...scoreOf(facts, kind, level) };
  return { percent, flatCents, rebuildCount: n, dataUntil, evidence };
}

/** Rules set this way, on what was known when each rebuild was bought: covered so many of so many. */
function scoreOf(
  facts: readonly RebuildFacts[],
  kind: Rule['kind'],
  level: ReturnType<typeof levelOf>,
): { covered: number; scored: number } {
  const isPercent = kind === 'percent';
  const [test] = (isPercent ? backTest : backTestTwoPart)(facts, [level], 'asKnown');
  const score = test?.scores[isPercent ? 'percent' : 'twoPart'];
  return { covered: score?.x ?? 0, scored: score?.n ?? 0 };
}
