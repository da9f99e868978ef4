import { Link } from 'react-router-dom';
import type { RuleReview } from '#shared/contracts/answers-rule-review.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { useShopPath } from '../rebuild-link.tsx';

/** How a grade comes about, with this rule's figures put in. */
export function ReviewWorkedOut({ reviewed }: Pick<RuleReview, 'reviewed'>) {
  const format = useFormatter();
  const path = useShopPath();
  return (
    <>
      <p>
        Looked at are the rebuilds bought after the day on which the rule was adopted, inside its year, and before a
        later rule took its place. One is held when it cost no more than its locked estimate and the cushion that the
        rule gives on it. No rule is set anew on what it is judged by; the next one is, and is then judged on what comes
        after it.
      </p>
      {reviewed && <Figures reviewed={reviewed} format={format} />}
      <p>
        <Link to={path('definitions#contingency')}>The definition in full</Link>
      </p>
    </>
  );
}

type FiguresProps = { reviewed: NonNullable<RuleReview['reviewed']>; format: ReturnType<typeof useFormatter> };

function Figures({ reviewed, format }: FiguresProps) {
  const { record, grade, evidence } = reviewed;
  return (
    <>
      <p className="tabular-nums">
        It was number {evidence.k} of {evidence.n} in order of overrun, so of {record.n} later ones {record.n} ×{' '}
        {evidence.k} ÷ ({evidence.n} + 1) = {format.number(grade.expectedCount, 1)} were to be expected.
        {record.n > 0 &&
          ` Held were ${record.x}. If nothing has changed, chance alone brings as few or fewer in ${format.percent(grade.chanceOfFew, 1)} of such years, and as many or more in ${format.percent(grade.chanceOfMany, 1)}.`}
      </p>
      <p>
        It is called more than luck only where chance would do it one time in 40 or less, either way. A rule rounded up
        holds a little more often than said here; one of percentage and sum only roughly so often.
      </p>
    </>
  );
}
