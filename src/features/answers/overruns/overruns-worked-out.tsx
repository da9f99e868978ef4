import { Link } from 'react-router-dom';
import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { useShopPath } from '../rebuild-link.tsx';
import { WorkedOutBasis } from '../worked-out-basis.tsx';
import { worstCategories } from '../sentences/overruns.ts';

/** Overrun in words, then with this shop's sums. */
export function OverrunsWorkedOut({ answer }: { answer: OverrunsAnswer }) {
  const format = useFormatter();
  const path = useShopPath();
  const exact = (cents: number) => format.money(cents, 'always');
  const { total, surprises } = answer;
  const worst = worstCategories(answer);
  return (
    <>
      <p>
        Overrun = (actual − locked estimate) ÷ locked estimate, all together as sum over sum: large rebuilds weigh more.
        Actual leaves out extras chosen on purpose; what came free counts at its market value, since the next one must
        be paid for. Purchase is no part of it.
      </p>
      {total.pooled !== null && (
        <p className="tabular-nums">
          ({exact(total.actualCents)} − {exact(total.estimateCents)}) ÷ {exact(total.estimateCents)} ={' '}
          {format.signedPercent(total.pooled, 2)}, over {format.count(total.n, 'rebuild')}.
          {total.median !== null && ` The middle one of them: ${format.signedPercent(total.median, 2)}.`}
        </p>
      )}
      {worst && (
        <p className="tabular-nums">
          {worst.furthest.name}: ({exact(worst.furthest.actualCents)} − {exact(worst.furthest.estimateCents)}) ÷{' '}
          {exact(worst.furthest.estimateCents)} = {format.signedPercent(worst.furthest.pooled ?? 0, 2)}, over the{' '}
          {format.count(worst.furthest.n, 'rebuild')} that planned for it.{' '}
          <Link to={path(`ledger?category=${worst.furthest.categoryId}`)}>Its entries in the ledger</Link>.
        </p>
      )}
      {surprises.rate !== null && (
        <p className="tabular-nums">
          Surprise rate = rebuilds with at least one surprise ÷ rebuilds where every entry says: {surprises.x} ÷{' '}
          {surprises.n} = {format.percent(surprises.rate, 1)}; 95% Wilson interval.
        </p>
      )}
      <p>
        The rows: <a href="#rows">category by category</a>,{' '}
        <Link to={path('rebuilds?sort=overrun&order=down')}>rebuilds by overrun</Link>.
      </p>
      <WorkedOutBasis
        answer={answer}
        n={total.n}
        headline="the overrun of all together"
        withoutOne={answer.withoutOne}
        write={(rate) => format.signedPercent(rate, 2)}
        definition="overrun"
      />
    </>
  );
}
