import { Link } from 'react-router-dom';
import type { WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import type { Formatter } from '#shared/formatter.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { useShopPath } from '../rebuild-link.tsx';
import { capital } from '../../../lib/capital.ts';
import { fitsOf, type Group, leads, nameOf, type PayView } from '../sentences/what-pays.ts';
import { groupSearch } from './groups.ts';

/** How a kind's figure comes about, worked through on the one that leads. */
export function PaysWorkedOut({ answer, view }: { answer: WhatPaysAnswer; view: PayView }) {
  const format = useFormatter();
  const path = useShopPath();
  const fits = fitsOf(answer, view);
  const isHour = view === 'per-hour';
  const [lead] = leads(fits);
  const fit = lead?.fit ?? fits.cells;
  const group = lead?.found.best ?? fit.groups.find((one) => one.pulled !== null);
  return (
    <>
      <p>
        For each finished rebuild: {isHour ? 'what it kept ÷ own hours' : 'what it kept ÷ all-in cost'}. For a kind, the
        mean of these, then pulled toward the shop&rsquo;s average: the fewer its rebuilds and the more they differ
        among themselves, the further. Kinds are ranked by the lower end of the 95% interval, from five rebuilds on.
      </p>
      {group?.pulled && fit.average && fit.withinVariance !== null && (
        <>
          <Pull
            group={group}
            fit={{ ...fit, withinVariance: fit.withinVariance, average: fit.average }}
            isHour={isHour}
            format={format}
          />
          <p>
            The plain figure beside it is sum over sum: {format.money(group.profitCents, 'always')} ÷{' '}
            {isHour ? `${format.hours(group.ownSeconds, true)} h` : format.money(group.costCents, 'always')} ={' '}
            {group.plain === null ? 'not known' : writer(isHour, format)(group.plain)}. The rows:{' '}
            <Link to={path(`rebuilds?${groupSearch(group)}`)}>{nameOf(group)} in the list</Link>.
          </p>
        </>
      )}
      <p>One far rebuild can move a small group a lot; the best and the worst of many small groups are partly luck.</p>
    </>
  );
}

const writer = (isHour: boolean, format: Formatter) => (value: number) =>
  isHour ? format.money(value, 'always') : format.percent(value, 2);

function Pull(props: {
  group: Group;
  fit: { withinVariance: number; average: { mean: number; betweenVariance: number } };
  isHour: boolean;
  format: Formatter;
}) {
  const { group, fit, isHour, format } = props;
  const { pulled } = group;
  if (!pulled) return null;
  const write = writer(isHour, format);
  // Variances are of cents; in the text they stand in whole units of money, as the figures do.
  const square = (value: number) => format.number(isHour ? value / 10_000 : value, isHour ? 1 : 5);
  const share = format.number(pulled.weight, 3);
  return (
    <p className="tabular-nums">
      {capital(nameOf(group))}: mean {write(group.mean)} over {format.count(group.n, 'rebuild')}. Weight of its own mean
      = spread between kinds ÷ (that + spread within ÷ n) = {square(fit.average.betweenVariance)} ÷ (
      {square(fit.average.betweenVariance)} + {square(fit.withinVariance)} ÷ {group.n}) = {share}. So {share} ×{' '}
      {write(group.mean)} + {format.number(1 - pulled.weight, 3)} × {write(fit.average.mean)} = {write(pulled.value)};
      its interval is ± 1.96 × {write(pulled.standardError)}: {write(pulled.lower)} to {write(pulled.upper)}.
    </p>
  );
}
