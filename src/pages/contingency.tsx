import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { levelOf, useAddress } from '../features/answers/address.ts';
import { AnswerFrame } from '../features/answers/answer-frame.tsx';
import { BackTestPanel } from '../features/answers/contingency/back-test-panel.tsx';
import { ContingencyWorkedOut } from '../features/answers/contingency/contingency-worked-out.tsx';
import { DamageRanges } from '../features/answers/contingency/damage-ranges.tsx';
import { DriftPanel } from '../features/answers/contingency/drift-panel.tsx';
import { type Kind, kindOf } from '../features/answers/contingency/kind.ts';
import { PastBidsPanel } from '../features/answers/contingency/past-bids-panel.tsx';
import { RuleForCarPanel } from '../features/answers/contingency/rule-for-car-panel.tsx';
import { SideBySide } from '../features/answers/contingency/side-by-side.tsx';
import { EmptyAnswer } from '../features/answers/empty-answer.tsx';
import { FilterBar } from '../features/answers/filter-bar.tsx';
import { isFiltered } from '../features/answers/filter-words.ts';
import { LeftOutList } from '../features/answers/left-out.tsx';
import { useMayWrite } from '../features/answers/may-write.ts';
import { ANSWERS_KEY, contingencyQuery } from '../features/answers/queries.ts';
import { useShopPath } from '../features/answers/rebuild-link.tsx';
import { sayContingency } from '../features/answers/sentences/contingency.ts';
import { printedOf, proposalOf } from '../features/rules/proposal.ts';
import { RuleActs } from '../features/rules/rule-acts.tsx';
import { RuleCard } from '../features/rules/rule-card.tsx';
import { RuleSheet } from '../features/rules/rule-sheet.tsx';
import { useSession } from '../lib/session.ts';
import { useFormatter } from '../ui/formatter-context.tsx';
import { Panels } from '../ui/panel.tsx';

/** How much cushion should next year's budgets carry? Worked out, judged on later rebuilds, adopted for a year. */
export function ContingencyPage() {
  const format = useFormatter();
  const { search, filter } = useAddress();
  const path = useShopPath();
  const mayAdopt = useMayWrite();
  const kind = kindOf(search);
  const result = useQuery({ ...contingencyQuery(filter, levelOf(search)), placeholderData: keepPreviousData });
  return (
    <>
      <AnswerFrame
        question="How much cushion should next year's budgets carry?"
        title="Contingency"
        result={result}
        empty={
          <EmptyAnswer
            title="Next year's rule will stand here"
            teaches="What to add to a repair estimate so that it holds four times in five, from your own finished rebuilds, and how often rules set this way would have been enough."
            canImport={mayAdopt}
          />
        }
        filters={(one) => <FilterBar options={one.filters} />}
        say={(one) => sayContingency(one, format, kind)}
        howWorkedOut={(one) => <ContingencyWorkedOut answer={one} kind={kind} />}
      >
        {(one) => (
          <>
            <BackTestPanel answer={one} kind={kind} />
            <RuleActs
              answer={one}
              proposal={proposalOf(one, format)}
              kind={kind}
              mayAdopt={mayAdopt}
              isFiltered={isFiltered(filter)}
              reviewPath={path('contingency/review')}
              alsoOld={[ANSWERS_KEY]}
            />
            <Panels>
              <SideBySide answer={one} kind={kind} />
              <div className="grid content-start gap-6">
                <RuleForCarPanel options={one.filters} level={one.level} kind={kind} />
                <DriftPanel drift={one.drift} />
              </div>
            </Panels>
            <Panels>
              <PastBidsPanel answer={one} kind={kind} />
              <DamageRanges answer={one} />
            </Panels>
            <LeftOutList leftOut={one.leftOut} />
          </>
        )}
      </AnswerFrame>
      {result.data && <OnPaper answer={result.data} kind={kind} />}
    </>
  );
}

/** The card and the sheet: seen on paper only. */
function OnPaper({ answer, kind }: { answer: ContingencyAnswer; kind: Kind }) {
  const format = useFormatter();
  const { shop } = useSession();
  const printed = printedOf(answer, { proposal: proposalOf(answer, format), kind, shopName: shop.name }, format);
  return (
    printed && (
      <>
        <RuleCard {...printed} />
        <RuleSheet {...printed} />
      </>
    )
  );
}
