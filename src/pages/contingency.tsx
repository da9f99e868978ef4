import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { levelOf, useAddress } from '../features/answers/address.ts';
import { AnswerFrame } from '../features/answers/answer-frame.tsx';
import { BackTestPanel } from '../features/answers/contingency/back-test-panel.tsx';
import { ContingencyWorkedOut } from '../features/answers/contingency/contingency-worked-out.tsx';
import { DamageRanges } from '../features/answers/contingency/damage-ranges.tsx';
import { RulesOfThumb } from '../features/answers/contingency/rules-of-thumb.tsx';
import { TwoPartPanel } from '../features/answers/contingency/two-part-panel.tsx';
import { EmptyAnswer } from '../features/answers/empty-answer.tsx';
import { FilterBar } from '../features/answers/filter-bar.tsx';
import { isFiltered } from '../features/answers/filter-words.ts';
import { LeftOutList } from '../features/answers/left-out.tsx';
import { useMayWrite } from '../features/answers/may-write.ts';
import { ANSWERS_KEY, contingencyQuery } from '../features/answers/queries.ts';
import { sayContingency } from '../features/answers/sentences/contingency.ts';
import { cardOf, proposalOf } from '../features/rules/proposal.ts';
import { RuleActs } from '../features/rules/rule-acts.tsx';
import { RuleCard } from '../features/rules/rule-card.tsx';
import { RulesHistory } from '../features/rules/rules-history.tsx';
import { useSession } from '../lib/session.ts';
import { useFormatter } from '../ui/formatter-context.tsx';
import { Panels } from '../ui/panel.tsx';

/** How much cushion should next year's budgets carry? Worked out, judged on later rebuilds, adopted for a year. */
export function ContingencyPage() {
  const format = useFormatter();
  const { search, filter } = useAddress();
  const mayAdopt = useMayWrite();
  const result = useQuery({ ...contingencyQuery(filter, levelOf(search)), placeholderData: keepPreviousData });
  const answer = result.data;
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
        say={(one) => sayContingency(one, format)}
        howWorkedOut={(one) => <ContingencyWorkedOut answer={one} />}
      >
        {(one) => (
          <>
            <BackTestPanel answer={one} />
            <RuleActs
              answer={one}
              proposal={proposalOf(one, format)}
              mayAdopt={mayAdopt}
              isFiltered={isFiltered(filter)}
              alsoOld={[ANSWERS_KEY]}
            />
            <Panels>
              <RulesOfThumb test={one.backTest} />
              <DamageRanges answer={one} />
            </Panels>
            <TwoPartPanel answer={one} />
            <RulesHistory />
            <LeftOutList leftOut={one.leftOut} />
          </>
        )}
      </AnswerFrame>
      {answer && <Card answer={answer} />}
    </>
  );
}

function Card({ answer }: { answer: ContingencyAnswer }) {
  const format = useFormatter();
  const { shop } = useSession();
  const card = cardOf(answer, proposalOf(answer, format));
  if (!card) return null;
  const { percent } = answer;
  const basis = card.rule
    ? `Based on ${format.count(card.rule.rebuildCount, 'finished rebuild')} up to ${format.day(card.rule.dataUntil)}.`
    : `Based on ${format.count(percent.n, 'finished rebuild')} up to ${format.day(answer.asOf)}.`;
  return <RuleCard {...card} shopName={shop.name} basis={basis} />;
}
