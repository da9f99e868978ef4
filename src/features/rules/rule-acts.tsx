import { useState } from 'react';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { Button } from '../../ui/button.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { AdoptDialog, type Proposal } from './adopt-dialog.tsx';
import { InForce } from './in-force.tsx';
import { printRuleCard } from './rule-card.tsx';
import { ruleText } from './rule-words.ts';

type Props = {
  answer: ContingencyAnswer;
  proposal: Proposal;
  /** Owner or bookkeeper. */
  mayAdopt: boolean;
  /** Rules are adopted over all rebuilds: not while a filter is set. */
  isFiltered: boolean;
  alsoOld: readonly (readonly string[])[];
};

/** Adopt, print, and what is in force. */
export function RuleActs({ answer, proposal, mayAdopt, isFiltered, alsoOld }: Props) {
  const format = useFormatter();
  const [isOpen, setOpen] = useState(false);
  const best = proposal.percent ?? proposal['two-part'];
  const years = [answer.thisYear, answer.nextYear];
  const canPrint = best !== null || years.some((one) => one.rule !== null);
  return (
    <section aria-label="The rule" className="mb-6 grid gap-3">
      <div className="no-print flex flex-wrap items-center gap-3">
        {mayAdopt && best && !isFiltered && (
          <Button kind="main" size="large" onClick={() => setOpen(true)}>
            Adopt {ruleText(best, format)} for {answer.nextYear.year}
          </Button>
        )}
        {canPrint && (
          <Button size="large" onClick={printRuleCard}>
            Print the rule card
          </Button>
        )}
      </div>
      {mayAdopt && isFiltered && (
        <p className="text-soft">A rule is adopted over all rebuilds: show all of them to adopt one.</p>
      )}
      <InForce years={years} />
      {isOpen && (
        <AdoptDialog
          proposal={proposal}
          years={years.map(({ year, rule }) => ({ year, inForce: rule }))}
          alsoOld={alsoOld}
          onClose={() => setOpen(false)}
        />
      )}
    </section>
  );
}
