import type { Rule } from '#shared/contracts/rules.ts';
import type { Day } from '#shared/day.ts';
import type { ShopFacts } from '../../books/shop-facts.ts';
import { backTest, backTestTwoPart } from '../../domain/back-test.ts';
import { contingency, levelOf, wholePercent } from '../../domain/contingency.ts';
import type { RebuildFacts } from '../../domain/facts.ts';
import { planned, plannedAndTold, plannedOutcomes } from '../../domain/sets.ts';
import { twoPartRule } from '../../domain/two-part-rule.ts';

type Asked = Pick<Rule, 'kind' | 'level'> & { readonly today: Day };
type Figure = Pick<Rule, 'percent' | 'flatCents' | 'rebuildCount' | 'dataUntil' | 'evidence'>;

/**
 * The figure to adopt, with what it rests on: the overrun taken raised to a whole percent, or the creep in percent
 * and the flat part raised to a whole unit of money. null = too few yet at this level.
 */
export function ruleFigure(shop: ShopFacts, { kind, level: name, today }: Asked): Figure | null {
  const facts = shop.rebuilds.filter(({ exit }) => exit !== null && exit.on <= today);
  const level = levelOf(name);
  const isPercent = kind === 'percent';
  const outcomes = plannedOutcomes(isPercent ? planned(facts) : plannedAndTold(facts));
  const dataUntil = outcomes.at(-1)?.exitOn;
  const figure = isPercent ? percentFigure(outcomes, level) : twoPartFigure(outcomes, level);
  if (!figure || dataUntil === undefined) return null;
  const { percent, flatCents, k, uplift, unrounded } = figure;
  const n = outcomes.length;
  const basis = { n, k, guarantee: k / (n + 1), uplift, flatCents: unrounded, booksVersion: shop.booksVersion };
  const evidence = { ...basis, ...scoreOf(facts, kind, level) };
  return { percent, flatCents, rebuildCount: n, dataUntil, evidence };
}

type Outcomes = ReturnType<typeof plannedOutcomes>;
type Level = ReturnType<typeof levelOf>;

function percentFigure(outcomes: Outcomes, level: Level) {
  const { k, taken, uplift } = contingency(outcomes, level);
  return taken && { percent: wholePercent(taken), flatCents: null, k, uplift, unrounded: null };
}

function twoPartFigure(outcomes: Outcomes, level: Level) {
  const { k, creepPercent, flatCents } = twoPartRule(outcomes, level);
  if (creepPercent === null || flatCents === null) return null;
  const adopted = Math.ceil(flatCents / 100) * 100;
  return { percent: creepPercent, flatCents: adopted, k, uplift: null, unrounded: flatCents };
}

/** Rules set this way, on what was known when each rebuild was bought: covered so many of so many. */
function scoreOf(
  facts: readonly RebuildFacts[],
  kind: Rule['kind'],
  level: Level,
): { covered: number; scored: number } {
  const [percentTest] = backTest(facts, [level], 'asKnown');
  const [twoPartTest] = backTestTwoPart(facts, [level], 'asKnown');
  const score = kind === 'percent' ? percentTest?.scores.percent : twoPartTest?.scores.twoPart;
  return { covered: score?.x ?? 0, scored: score?.n ?? 0 };
}
