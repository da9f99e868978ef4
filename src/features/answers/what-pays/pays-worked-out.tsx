import { Link } from 'react-router-dom';
import type { WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import type { Formatter } from '#shared/formatter.ts';
import type { PayView } from '#shared/vocabulary.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { useShopPath } from '../rebuild-link.tsx';
import { capital } from '../../../lib/capital.ts';
import { type Group, leads, nameOf } from '../sentences/what-pays.ts';
import { WorkedOutBasis } from '../worked-out-basis.tsx';
import { groupSearch } from './groups.ts';
import { VIEW_WORDS } from './view-words.ts';

/** How a kind's figure comes about, worked through on the one that leads. */
export function PaysWorkedOut({ answer }: { answer: WhatPaysAnswer }) {
  const format = useFormatter();
  const path = useShopPath();
  const { fits, view } = answer;
  const write = writer(view, format);
  const [lead] = leads(fits);
  const fit = lead?.fit ?? fits.cells;
  const group = lead?.found.best ?? fit.groups.find((one) => one.pulled !== null);
  return (
    <>
      <p>
        For each finished rebuild: {VIEW_WORDS[view].each}. For a kind, the mean of these, then pulled toward the
        shop&rsquo;s average: the fewer its rebuilds and the more they differ among themselves, the further. Kinds are
        ranked by the lower end of the 95% interval, from five rebuilds on.
      </p>
      {group?.pulled && fit.average && fit.withinVariance !== null && (
        <>
          <Pull
            group={group}
            fit={{ ...fit, withinVariance: fit.withinVariance, average: fit.average }}
            view={view}
            format={format}
          />
          <p>
            The plain figure beside it is sum over sum: {plainParts(group, view, format)} ={' '}
            {group.plain === null ? 'not known' : write(group.plain)}. The rows:{' '}
            <Link to={path(`rebuilds?${groupSearch(group)}`)}>{nameOf(group)} in the list</Link>.
          </p>
        </>
      )}
      <p>One far rebuild can move a small group a lot; the best and the worst of many small groups are partly luck.</p>
      <WorkedOutBasis
        answer={answer}
        n={fit.n}
        headline={group ? nameOf(group) : 'it'}
        withoutOne={group?.withoutOne ?? null}
        write={write}
        definition="pulled"
      />
    </>
  );
}

const writer = (view: PayView, format: Formatter) => (value: number) =>
  view === 'on-cost' ? format.percent(value, 2) : format.money(Math.round(value), 'always');

/** What the plain figure divides by what. */
function plainParts(group: Group, view: PayView, format: Formatter): string {
  const kept = format.money(group.profitCents, 'always');
  const hours = (seconds: number) => `${format.hours(seconds, true)} h`;
  switch (view) {
    case 'per-hour':
      return `${kept} ÷ ${hours(group.ownSeconds)}`;
    case 'all-hours':
      return `(${kept} + ${format.money(group.laborCents, 'always')} of wages) ÷ ${hours(group.allSeconds)}`;
    case 'after-wage':
      return `(${kept} − ${hours(group.ownSeconds)} × the wanted pay) ÷ ${group.n}`;
    case 'on-cost':
      return `${kept} ÷ ${format.money(group.costCents, 'always')}`;
  }
}

function Pull(props: {
  group: Group;
  fit: { withinVariance: number; average: { mean: number; betweenVariance: number } };
  view: PayView;
  format: Formatter;
}) {
  const { group, fit, view, format } = props;
  const isMoney = view !== 'on-cost';
  const { pulled } = group;
  if (!pulled) return null;
  const write = writer(view, format);
  // Variances are of cents; in the text they stand in whole units of money, as the figures do.
  const square = (value: number) => format.number(isMoney ? value / 10_000 : value, isMoney ? 1 : 5);
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
