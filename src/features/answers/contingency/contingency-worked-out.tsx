import { Link } from 'react-router-dom';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { RebuildLink, useShopPath } from '../rebuild-link.tsx';

/** The order statistic in words, then the very rebuild that the figure comes from, then both parts of the other rule. */
export function ContingencyWorkedOut({ answer }: { answer: ContingencyAnswer }) {
  const format = useFormatter();
  const path = useShopPath();
  const { percent, twoPart, level } = answer;
  const [p = '', q = ''] = level.split('/');
  const exact = (cents: number) => format.money(cents, 'always');
  return (
    <>
      <p>
        Put the overruns of all finished rebuilds with a locked estimate in order, smallest first, and take the k-th, k
        = (n + 1) × {p} ÷ {q} raised to a whole number. No curve is fitted and nothing between two rebuilds is made up.
        The next car like these stays within it with a chance of k ÷ (n + 1).
      </p>
      <p className="tabular-nums" hidden={percent.n === 0}>
        ({percent.n} + 1) × {p} ÷ {q}, raised, is k = {percent.k}
        {percent.k > percent.n && `: more than the ${percent.n} there are, so nothing can be said at this level`}.
        {percent.taken && percent.uplift !== null && (
          <>
            {' '}
            Number {percent.k} is <RebuildLink rebuild={percent.taken} />: {exact(percent.taken.overrunCents)} over{' '}
            {exact(percent.taken.estimateCents)} = {format.percent(percent.uplift, 2)}, raised to{' '}
            {format.number(percent.percent ?? 0)}%. Chance {percent.k} ÷ {percent.n + 1} ={' '}
            {format.percent(percent.guarantee ?? 0, 1)}.
          </>
        )}
      </p>
      {twoPart.creepPercent !== null && (
        <p className="tabular-nums">
          In two parts: known work came to {exact(twoPart.creepCents)} beyond {exact(twoPart.estimateCents)} of
          estimates, raised to {twoPart.creepPercent}%. What then is left over of each rebuild, in order, number{' '}
          {twoPart.k} of {twoPart.n}: {twoPart.flatCents === null ? 'too few yet' : exact(twoPart.flatCents)}
          {twoPart.adoptFlatCents !== null && `, raised to ${format.money(twoPart.adoptFlatCents)}`}.
        </p>
      )}
      <p>
        Judged only on rebuilds that came after: each gets the rule that those finished before it was bought would have
        given, unrounded, from five of them on. A shop that changes (a dearer paint shop, another kind of car) makes old
        years a poor guide: filter by years to set it on the newer ones. The rows:{' '}
        <Link to={path('rebuilds?sort=overrun&order=down')}>rebuilds by overrun</Link>.
      </p>
    </>
  );
}
