import { Link } from 'react-router-dom';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { RebuildLink, useShopPath } from '../rebuild-link.tsx';
import type { Kind } from './kind.ts';
import { SortedOverruns } from './sorted-overruns.tsx';
import { WithoutOne } from './without-one.tsx';

type Props = { answer: ContingencyAnswer; kind: Kind };

/** The order statistic in words, this shop's figures put in, the sorted rows to do it again by hand, and the definition. */
export function ContingencyWorkedOut({ answer, kind }: Props) {
  const path = useShopPath();
  const { leftOut } = answer;
  const { n } = answer[kind === 'percent' ? 'percent' : 'twoPart'];
  return (
    <>
      {kind === 'percent' ? <PercentWorkedOut answer={answer} /> : <TwoPartWorkedOut answer={answer} />}
      <p>
        Judged only on rebuilds that came after: each gets the rule that those finished before it was bought would have
        given, unrounded, from five of them on.
      </p>
      <WithoutOne answer={answer} kind={kind} />
      <p>
        Rows used: {n}.{' '}
        {leftOut.length > 0 && (
          <>
            Left out: {leftOut.map(({ count, reason }) => `${count} ${reason}`).join(', ')} (
            <a href="#left-out">which ones</a>).
          </>
        )}
      </p>
      <SortedOverruns answer={answer} kind={kind} />
      <p>
        <Link to={path('definitions#contingency')}>The definition in full</Link> ·{' '}
        <Link to={path('rebuilds?sort=overrun&order=down')}>All rebuilds by overrun</Link>
      </p>
    </>
  );
}

function PercentWorkedOut({ answer: { percent, level } }: { answer: ContingencyAnswer }) {
  const format = useFormatter();
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
    </>
  );
}

function TwoPartWorkedOut({ answer: { twoPart, level } }: { answer: ContingencyAnswer }) {
  const format = useFormatter();
  const [p = '', q = ''] = level.split('/');
  const exact = (cents: number) => format.money(cents, 'always');
  if (twoPart.creepPercent === null) return <p>No finished rebuild says of every entry whether it was foreseen.</p>;
  return (
    <>
      <p>
        A percentage starves small plans and swells large ones; a sum for surprises does not grow with the plan. First
        the percentage: what known work cost beyond its estimates, all rebuilds together, surprises left out. Then of
        each rebuild what is left over beyond estimate and percentage; in order, smallest first, the k-th is the sum.
      </p>
      <p className="tabular-nums">
        Known work came to {exact(twoPart.creepCents)} beyond {exact(twoPart.estimateCents)} of estimates, raised to{' '}
        {twoPart.creepPercent}%. ({twoPart.n} + 1) × {p} ÷ {q}, raised, is k = {twoPart.k}: number {twoPart.k} of{' '}
        {twoPart.n} is {twoPart.flatCents === null ? 'not there, too few yet' : exact(twoPart.flatCents)}
        {twoPart.adoptFlatCents !== null && `, raised to ${format.money(twoPart.adoptFlatCents)}`}.
      </p>
      <p>
        Both parts come from the same rebuilds, so the chance of k ÷ (n + 1) is only a rough one: judge this rule by how
        it would have done.
      </p>
    </>
  );
}
