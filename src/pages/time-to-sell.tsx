import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useAddress } from '../features/answers/address.ts';
import { AnswerFrame } from '../features/answers/answer-frame.tsx';
import { EmptyAnswer } from '../features/answers/empty-answer.tsx';
import { FilterBar } from '../features/answers/filter-bar.tsx';
import { LeftOutList } from '../features/answers/left-out.tsx';
import { useMayWrite } from '../features/answers/may-write.ts';
import { timeToSellQuery } from '../features/answers/queries.ts';
import { oldSheetSelling, sayTimeToSell } from '../features/answers/sentences/time-to-sell.ts';
import { ClassStages } from '../features/answers/time-to-sell/class-stages.tsx';
import { SellingCurve } from '../features/answers/time-to-sell/selling-curve.tsx';
import { SellingTable } from '../features/answers/time-to-sell/selling-table.tsx';
import { SellingWorkedOut } from '../features/answers/time-to-sell/selling-worked-out.tsx';
import { StagesTable } from '../features/answers/time-to-sell/stages-table.tsx';
import { UnsoldList } from '../features/answers/time-to-sell/unsold-list.tsx';
import { useFormatter } from '../ui/formatter-context.tsx';
import { Panels } from '../ui/panel.tsx';

/** How long until the money is back? Unsold ones count as waiting, not as absent. */
export function TimeToSellPage() {
  const format = useFormatter();
  const { asked } = useAddress();
  const result = useQuery({ ...timeToSellQuery(asked), placeholderData: keepPreviousData });
  return (
    <AnswerFrame
      question="How long until the money is back?"
      title="Time to sell"
      result={result}
      empty={
        <EmptyAnswer
          title="How long cars take to sell will stand here"
          teaches="The share still unsold by day since listing, unsold ones counted as waiting; days in the shop beside it; and what is still in hand, with the money in it."
          canImport={useMayWrite()}
        />
      }
      filters={(answer) => <FilterBar options={answer.filters} />}
      say={(answer) => sayTimeToSell(answer, format)}
      oldSheet={(answer) => oldSheetSelling(answer, format)}
      howWorkedOut={(answer) => <SellingWorkedOut answer={answer} />}
    >
      {(answer) => (
        <>
          <Panels wide>
            <SellingCurve answer={answer} />
            <StagesTable answer={answer} />
          </Panels>
          {answer.overall.n > 0 && <SellingTable answer={answer} />}
          <ClassStages rows={answer.classStages} />
          <UnsoldList unsold={answer.unsold} />
          <LeftOutList leftOut={answer.leftOut} />
        </>
      )}
    </AnswerFrame>
  );
}
