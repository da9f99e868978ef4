import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { useAddress, yearOf } from '../features/answers/address.ts';
import { AnswerFrame } from '../features/answers/answer-frame.tsx';
import { GradesPanel } from '../features/answers/contingency/grades-panel.tsx';
import { ruleReviewQuery } from '../features/answers/contingency/queries.ts';
import { ReviewTrials } from '../features/answers/contingency/review-trials.tsx';
import { ReviewWorkedOut } from '../features/answers/contingency/review-worked-out.tsx';
import { EmptyAnswer } from '../features/answers/empty-answer.tsx';
import { LeftOutList } from '../features/answers/left-out.tsx';
import { useMayWrite } from '../features/answers/may-write.ts';
import { ANSWERS_KEY } from '../features/answers/queries.ts';
import { useShopPath } from '../features/answers/rebuild-link.tsx';
import { sayReview } from '../features/answers/sentences/rule-review.ts';
import { Decide } from '../features/rules/decide.tsx';
import { useFormatter } from '../ui/formatter-context.tsx';

/** Did the rule hold? Judged on what was bought under it; then kept or changed for the next year. */
export function RuleReviewPage() {
  const format = useFormatter();
  const path = useShopPath();
  const { search } = useAddress();
  const mayAdopt = useMayWrite();
  const result = useQuery({ ...ruleReviewQuery(yearOf(search)), placeholderData: keepPreviousData });
  return (
    <AnswerFrame
      question="Did the rule hold?"
      title="Yearly review of the rule"
      result={result}
      empty={
        <EmptyAnswer
          title="Each year's rule will be graded here"
          teaches="A contingency rule, once adopted, is judged only on the rebuilds bought under it; then you keep it or change it for the next year."
          canImport={mayAdopt}
        />
      }
      filters={() => <Link to={path('contingency')}>Back to Contingency</Link>}
      say={(one) => sayReview(one, format)}
      howWorkedOut={(one) => <ReviewWorkedOut reviewed={one.reviewed} />}
    >
      {(one) => (
        <>
          {one.reviewed && <ReviewTrials reviewed={one.reviewed} />}
          {one.reviewed && <Decide reviewed={one.reviewed} mayAdopt={mayAdopt} alsoOld={[ANSWERS_KEY]} />}
          <GradesPanel history={one.history} />
          <LeftOutList leftOut={one.leftOut} />
        </>
      )}
    </AnswerFrame>
  );
}
