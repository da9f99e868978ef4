import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { payViewOf, useAddress } from '../features/answers/address.ts';
import { AnswerFrame } from '../features/answers/answer-frame.tsx';
import { EmptyAnswer } from '../features/answers/empty-answer.tsx';
import { FilterBar } from '../features/answers/filter-bar.tsx';
import { LeftOutList } from '../features/answers/left-out.tsx';
import { useMayWrite } from '../features/answers/may-write.ts';
import { PerHourViews } from '../features/answers/per-hour-views.tsx';
import { whatPaysQuery } from '../features/answers/queries.ts';
import { oldSheetPays, sayWhatPays } from '../features/answers/sentences/what-pays.ts';
import { OldSheetPanel } from '../features/answers/what-pays/old-sheet-panel.tsx';
import { PaysGrid } from '../features/answers/what-pays/pays-grid.tsx';
import { PaysRanking } from '../features/answers/what-pays/pays-ranking.tsx';
import { PaysTotals } from '../features/answers/what-pays/pays-totals.tsx';
import { PaysWorkedOut } from '../features/answers/what-pays/pays-worked-out.tsx';
import { useFormatter } from '../ui/formatter-context.tsx';
import { Panel, Panels } from '../ui/panel.tsx';

/** Which wrecks pay? By the hour or on cost, each with its range and its count. */
export function WhatPaysPage() {
  const format = useFormatter();
  const { search, asked } = useAddress();
  const result = useQuery({
    ...whatPaysQuery({ ...asked, view: payViewOf(search) }),
    placeholderData: keepPreviousData,
  });
  return (
    <AnswerFrame
      question="Which wrecks pay?"
      title="What pays"
      result={result}
      empty={
        <EmptyAnswer
          title="A grid of your own wrecks will stand here"
          teaches="Vehicle classes down, damage across; in each field what such a car kept by the hour, how sure that is, and how many it rests on. From five of a kind on, it says something."
          canImport={useMayWrite()}
        />
      }
      filters={(answer) => <FilterBar options={answer.filters} />}
      say={(answer) => sayWhatPays(answer, format)}
      oldSheet={(answer) => oldSheetPays(answer, format)}
      howWorkedOut={(answer) => <PaysWorkedOut answer={answer} />}
    >
      {(answer) => (
        <>
          <PaysGrid answer={answer} />
          <PaysRanking answer={answer} />
          <OldSheetPanel answer={answer} />
          <Panels>
            <Panel title="By the hour, three ways" subtitle="The headline counts own, unpaid hours.">
              <PerHourViews views={answer.views} />
            </Panel>
            <PaysTotals answer={answer} />
          </Panels>
          <LeftOutList leftOut={answer.leftOut} />
        </>
      )}
    </AnswerFrame>
  );
}
