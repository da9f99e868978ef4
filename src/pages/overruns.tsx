import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useAddress } from '../features/answers/address.ts';
import { AnswerFrame } from '../features/answers/answer-frame.tsx';
import { EmptyAnswer } from '../features/answers/empty-answer.tsx';
import { FilterBar } from '../features/answers/filter-bar.tsx';
import { LeftOutList } from '../features/answers/left-out.tsx';
import { useMayWrite } from '../features/answers/may-write.ts';
import { CategoriesByYear } from '../features/answers/overruns/categories-by-year.tsx';
import { DamageLook } from '../features/answers/overruns/damage-look.tsx';
import { OverrunsPicture } from '../features/answers/overruns/overruns-picture.tsx';
import { OverrunsTable } from '../features/answers/overruns/overruns-table.tsx';
import { OverrunsTrends } from '../features/answers/overruns/overruns-trends.tsx';
import { OverrunsWorkedOut } from '../features/answers/overruns/overruns-worked-out.tsx';
import { OverrunsYears } from '../features/answers/overruns/overruns-years.tsx';
import { PartsTable } from '../features/answers/overruns/parts-table.tsx';
import { SeenTable } from '../features/answers/overruns/seen-table.tsx';
import { SurprisesTable } from '../features/answers/overruns/surprises.tsx';
import { overrunsQuery } from '../features/answers/queries.ts';
import { oldSheetOverruns, sayOverruns } from '../features/answers/sentences/overruns.ts';
import { useFormatter } from '../ui/formatter-context.tsx';
import { Panels } from '../ui/panel.tsx';

/** Where does the money run over? Every category against the locked estimates. */
export function OverrunsPage() {
  const format = useFormatter();
  const { asked } = useAddress();
  const result = useQuery({ ...overrunsQuery(asked), placeholderData: keepPreviousData });
  return (
    <AnswerFrame
      question="Where does the money run over?"
      title="Overruns"
      result={result}
      empty={
        <EmptyAnswer
          title="Plan against outcome will stand here"
          teaches="Each finished rebuild a dot in each category, its locked estimate at zero: what always runs over, by how much, and which part of it nobody foresaw."
          canImport={useMayWrite()}
        />
      }
      filters={(answer) => <FilterBar options={answer.filters} />}
      say={(answer) => sayOverruns(answer, format)}
      oldSheet={(answer) => oldSheetOverruns(answer, format)}
      howWorkedOut={(answer) => <OverrunsWorkedOut answer={answer} />}
    >
      {(answer) => (
        <>
          <OverrunsPicture answer={answer} />
          <OverrunsTable answer={answer} />
          <PartsTable answer={answer} />
          <Panels>
            <SurprisesTable surprises={answer.surprises} />
            <SeenTable answer={answer} />
          </Panels>
          <DamageLook damages={answer.damages} />
          <OverrunsTrends trends={answer.trends} />
          <OverrunsYears years={answer.years} />
          <CategoriesByYear answer={answer} />
          <LeftOutList leftOut={answer.leftOut} />
        </>
      )}
    </AnswerFrame>
  );
}
