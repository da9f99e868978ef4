import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import type { Formatter } from '#shared/formatter.ts';
import type { Proposal } from './adopt-dialog.tsx';
import type { RuleFigures } from './rule-words.ts';

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

/** What the card shows: the rule of next year, or of this one, or what would be adopted. */
export function cardOf(answer: ContingencyAnswer, proposal: Proposal) {
  const adopted = answer.nextYear.rule ? answer.nextYear : answer.thisYear;
  const rule = adopted.rule;
  const figures: RuleFigures | null = rule ?? proposal.percent ?? proposal['two-part'];
  if (!figures) return null;
  return { year: rule ? adopted.year : answer.nextYear.year, figures, rule, level: rule?.level ?? answer.level };
}
