import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import type { Formatter } from '#shared/formatter.ts';
import type { Proposal, RuleKind } from './adopt-dialog.tsx';
import type { PrintedRule } from './printed-rule.ts';

/** What the books ask for at the answer's level, in each kind, with the rounding said. */
export function proposalOf({ level, percent, twoPart }: ContingencyAnswer, format: Formatter): Proposal {
  return {
    level,
    percent:
      percent.percent === null || percent.uplift === null
        ? null
        : {
            percent: percent.percent,
            flatCents: null,
            rounding:
              percent.uplift < 0
                ? `${format.percent(percent.uplift, 2)} as taken; a plan is never cut.`
                : `${format.percent(percent.uplift, 2)} as taken, raised to a whole percent.`,
          },
    'two-part':
      twoPart.creepPercent === null || twoPart.adoptFlatCents === null || twoPart.flatCents === null
        ? null
        : {
            percent: twoPart.creepPercent,
            flatCents: twoPart.adoptFlatCents,
            rounding: `${format.money(twoPart.flatCents, 'always')} as taken, raised to whole units.`,
          },
  };
}

/** What is put on paper: the rule of next year, or of this one, or what would be adopted. null = nothing yet. */
export function printedOf(
  answer: ContingencyAnswer,
  { proposal, kind, shopName }: { proposal: Proposal; kind: RuleKind; shopName: string },
  format: Formatter,
): PrintedRule | null {
  const adopted = answer.nextYear.rule ? answer.nextYear : answer.thisYear;
  const { rule } = adopted;
  if (rule) {
    const { covered, scored } = rule.evidence;
    return {
      shopName,
      year: adopted.year,
      figures: rule,
      level: rule.level,
      basis: `Based on ${format.count(rule.rebuildCount, 'finished rebuild')} up to ${format.day(rule.dataUntil)}.`,
      record: recordText(covered, scored),
      rule,
    };
  }
  const figures = proposal[kind] ?? proposal.percent ?? proposal['two-part'];
  if (!figures) return null;
  const isPercent = figures.flatCents === null;
  const score = (isPercent ? answer.backTest : answer.twoPartBackTest).scores.find(
    (one) => one.rule === (isPercent ? 'percent' : 'two-part'),
  );
  const { n } = isPercent ? answer.percent : answer.twoPart;
  return {
    shopName,
    year: answer.nextYear.year,
    figures,
    level: answer.level,
    basis: `Based on ${format.count(n, 'finished rebuild')} up to ${format.day(answer.asOf)}.`,
    record: score ? recordText(score.x, score.n) : null,
    rule: null,
  };
}

function recordText(covered: number, scored: number): string | null {
  return scored === 0 ? null : `Rules set this way would have covered ${covered} of ${scored}.`;
}
