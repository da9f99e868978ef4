import { useState } from 'react';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { Button, LinkButton } from '../../ui/button.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { AdoptDialog, type Proposal, type RuleKind } from './adopt-dialog.tsx';
import { InForce } from './in-force.tsx';
import { printAlone } from './print-alone.ts';
import { ruleText } from './rule-words.ts';

type Props = {
  answer: ContingencyAnswer;
  proposal: Proposal;
  kind: RuleKind;
  /** Owner or bookkeeper. */
  mayAdopt: boolean;
  /** Rules are adopted over all rebuilds: not while a filter is set. */
  isFiltered: boolean;
  /** Where the yearly review stands. */
  reviewPath: string;
  alsoOld: readonly (readonly string[])[];
};

/** Adopt, print, look back, and what is in force. */
export function RuleActs({ answer, proposal, kind, mayAdopt, isFiltered, reviewPath, alsoOld }: Props) {
  const format = useFormatter();
  const [isOpen, setOpen] = useState(false);
  const best = proposal[kind] ?? proposal.percent ?? proposal['two-part'];
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
          <>
            <Button size="large" onClick={() => printAlone('card')}>
              Print the wallet card
            </Button>
            <Button size="large" onClick={() => printAlone('sheet')}>
              Print the sheet
            </Button>
          </>
        )}
        <LinkButton size="large" to={reviewPath}>
          Did the last rule hold?
        </LinkButton>
      </div>
      {mayAdopt && isFiltered && (
        <p className="text-soft">A rule is adopted over all rebuilds: show all of them to adopt one.</p>
      )}
      <InForce years={years} />
      {isOpen && (
        <AdoptDialog
          proposal={proposal}
          kind={kind}
          years={years.map(({ year, rule }) => ({ year, inForce: rule }))}
          alsoOld={alsoOld}
          onClose={() => setOpen(false)}
        />
      )}
    </section>
  );
}
