import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { exitsOf, useAddress, yearOf } from '../features/answers/address.ts';
import { AnswerFrame } from '../features/answers/answer-frame.tsx';
import { EmptyAnswer } from '../features/answers/empty-answer.tsx';
import { LeftOutList } from '../features/answers/left-out.tsx';
import { PerHourViews } from '../features/answers/per-hour-views.tsx';
import { yearQuery } from '../features/answers/queries.ts';
import { oldSheetYear, sayYear } from '../features/answers/sentences/year.ts';
import { LateBills } from '../features/answers/year/late-bills.tsx';
import { YearMoney } from '../features/answers/year/year-money.tsx';
import { YearPictures } from '../features/answers/year/year-pictures.tsx';
import { YearRebuilds } from '../features/answers/year/year-rebuilds.tsx';
import { YearSwitch } from '../features/answers/year/year-switch.tsx';
import { YearWorkedOut } from '../features/answers/year/year-worked-out.tsx';
import { YearsTable } from '../features/answers/year/years-table.tsx';
import { useMayWrite } from '../features/answers/may-write.ts';
import { useFormatter } from '../ui/formatter-context.tsx';
import { Panel, Panels } from '../ui/panel.tsx';

/** Did the work pay? One shop year, against the one before. */
export function YearPage() {
  const format = useFormatter();
  const { search } = useAddress();
  const year = yearOf(search);
  const exits = exitsOf(search);
  const query = { ...(year !== null && { year }), ...(exits && { exits }) };
  const result = useQuery({ ...yearQuery(query), placeholderData: keepPreviousData });
  const isPast = result.data && !result.data.isRunning;
  return (
    <AnswerFrame
      question={isPast ? `Did the work pay in ${result.data.year}?` : 'Did the work pay this year?'}
      title="Year"
      result={result}
      empty={
        <EmptyAnswer
          title="What was kept will stand here"
          teaches="What the year's sales left after purchase, parts and every other bill; by the hour; and against the same day last year."
          canImport={useMayWrite()}
        />
      }
      filters={(answer) => <YearSwitch answer={answer} />}
      say={(answer) => sayYear(answer, format)}
      oldSheet={(answer) => oldSheetYear(answer, format)}
      howWorkedOut={(answer) => <YearWorkedOut answer={answer} />}
    >
      {(answer) => (
        <>
          <YearPictures answer={answer} />
          <YearRebuilds answer={answer} />
          <LateBills late={answer.late} />
          <Panels>
            <Panel title="By the hour, three ways" subtitle="The headline counts own, unpaid hours.">
              <PerHourViews views={answer.perHour} />
            </Panel>
            <YearMoney answer={answer} />
          </Panels>
          <YearsTable answer={answer} />
          <LeftOutList leftOut={answer.leftOut} />
        </>
      )}
    </AnswerFrame>
  );
}
