import type { RebuildFacts } from '../../server/domain/facts.ts';
import { percentOnLadder, type Rung, twoPartOnLadder } from '../../server/domain/ladder.ts';
import type { BidQuestion } from '../support/portfolio-questions.ts';
import { type RepairRule, repairBudget } from '#shared/measures/repair-budget.ts';
import { walkAwayBid } from '#shared/measures/walk-away-bid.ts';
import type { Entry } from './answers-document.ts';

/** The walk-away bid, and the rung its repair budget is based on (§18.5). */
export function bidEntry(facts: readonly RebuildFacts[], { id, repair, terms }: BidQuestion): Entry {
  const { rung, rule } = ruleFor(facts, repair);
  const repairBudgetCents = repairBudget(repair.planCents, rule);
  const bid = walkAwayBid({ ...terms, repairBudgetCents });
  return {
    id,
    rung,
    repair_budget_cents: repairBudgetCents,
    room: bid.roomCents,
    bid_cents: bid.bidCents,
    fee_cents: bid.feeCents,
    tax_cents: bid.taxCents,
    left_cents: bid.leftCents,
  };
}

/** The rule asked for with the figures of its rung; a rule of one's own has no rung. */
function ruleFor(
  facts: readonly RebuildFacts[],
  repair: BidQuestion['repair'],
): { rung: Rung | null; rule: RepairRule } {
  switch (repair.rule) {
    case 'none':
      return { rung: null, rule: { kind: 'none' } };
    case 'flat':
      return { rung: null, rule: { kind: 'flat', percent: repair.percent } };
    case 'percent': {
      const { rung, taken } = percentOnLadder(facts, repair.car, repair.level);
      return { rung, rule: { kind: 'percent', taken } };
    }
    case 'two-part': {
      const { rung, creepPercent, flatCents } = twoPartOnLadder(facts, repair.car, repair.level);
      return { rung, rule: { kind: 'two-part', creepPercent, flatCents } };
    }
  }
}
