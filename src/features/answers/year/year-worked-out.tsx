import { Link } from 'react-router-dom';
import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { RebuildLink, useShopPath } from '../rebuild-link.tsx';
import { WorkedOutBasis } from '../worked-out-basis.tsx';

/** The year's formula in words, then with this shop's figures, then where the rows stand. */
export function YearWorkedOut({ answer }: { answer: YearAnswer }) {
  const format = useFormatter();
  const path = useShopPath();
  const exact = (cents: number) => format.money(cents, 'always');
  const { money, perHour, year, withoutOne } = answer;
  const work = money.categories.reduce((sum, one) => sum + one.cents, 0);
  const { own } = perHour;
  return (
    <>
      <p>
        Kept = what the rebuilds that left in the year were sold for (or brought otherwise) − what they cost to buy −
        every entry on them, whenever it is dated − overhead dated in the year. Own hours are no cost.
      </p>
      <p className="tabular-nums">
        {exact(money.proceedsCents)} − {exact(money.purchaseCents)} − {exact(work)} − {exact(money.overheadCents)} ={' '}
        {exact(money.keptCents)}, over {format.count(answer.n, 'rebuild')}.
      </p>
      {own.pooledCents !== null && (
        <p className="tabular-nums">
          By the hour = their profit before overhead ÷ own hours, both only of rebuilds whose hours are known:{' '}
          {exact(own.profitCents)} ÷ {format.hours(own.ownSeconds, true)} h = {exact(own.pooledCents)}, over{' '}
          {format.count(own.n, 'rebuild')}.
          {own.medianCents !== null && ` The typical rebuild, middle of all: ${exact(own.medianCents)}.`}
        </p>
      )}
      <p>
        The rows: <a href="#rows">the rebuilds of {year}</a>,{' '}
        <Link to={path(`ledger?rebuild=none&from=${answer.from}&to=${answer.through}`)}>overhead of the year</Link>,{' '}
        <Link to={path(`rebuilds?year=${year}`)}>the same rebuilds in the list</Link>.
      </p>
      <WorkedOutBasis
        answer={answer}
        n={answer.n}
        headline="what was kept"
        withoutOne={withoutOne.kept}
        write={exact}
        definition="kept"
      />
      {withoutOne.perHour && (
        <p className="tabular-nums">
          By the hour it is <RebuildLink rebuild={withoutOne.perHour.rebuild} short />: without it{' '}
          {exact(Math.round(withoutOne.perHour.value))}.
        </p>
      )}
    </>
  );
}
