import type { ReactNode } from 'react';
import { useWatch } from 'react-hook-form';
import type { BidBasis, Surprises } from '#shared/contracts/bids-basis.ts';
import type { Formatter } from '#shared/formatter.ts';
import { surprisesFor } from '#shared/measures/like-cars.ts';
import { wilson } from '#shared/measures/wilson.ts';
import { WALK_ROUND_CAUTION } from '#shared/trade-cautions.ts';
import { GOES_TOGETHER, tradeChecks } from '#shared/trade-checks.ts';
import { capital } from '../../lib/capital.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { type SheetFormApi, useCar } from './use-sheet.ts';

type Props = { form: SheetFormApi; basis: BidBasis };

/** What tends to surprise on such a car, as a list to tick: the shop's own surprises above the trade's common checks. */
export function WalkRound({ form, basis }: Props) {
  const format = useFormatter();
  const car = useCar(form);
  const second = useWatch({ control: form.control, name: 'secondDamageId' });
  const surprises = surprisesFor(basis.surprises, car);
  const nameOf = (id: string | null) => basis.damages.find((one) => one.id === id)?.name;
  const own = surprises?.categories.filter(({ x }) => x > 0) ?? [];
  const category = (id: string) => capital(basis.categories.find((one) => one.id === id)?.name ?? 'another category');
  return (
    <Panel
      title="Walk round it"
      id="walk-round"
      subtitle="What tends to surprise on such a car. Tick what you looked at."
    >
      <p className="caution-note mb-4">{WALK_ROUND_CAUTION}</p>
      <div className="walk-columns">
        <section>
          <h3 className="mb-1 font-[660]">Your own surprises</h3>
          <p className="mb-2 text-label text-soft">
            {groupWords(surprises, nameOf(surprises?.damageId ?? null), format)}
          </p>
          <ul>
            {surprises &&
              own.slice(0, 8).map((one) => (
                <Tick key={one.categoryId} form={form} id={`own-${one.categoryId}`} title={category(one.categoryId)}>
                  {ownWords(one, surprises.n, format)}
                </Tick>
              ))}
          </ul>
        </section>
        <section>
          <h3 className="mb-1 font-[660]">Common in the trade</h3>
          <p className="mb-2 text-label text-soft">What may hide behind such damage, and where it shows.</p>
          <ul>
            {tradeChecks([nameOf(car.damageId), nameOf(second)]).map(({ key, surprise, look }) => (
              <Tick key={key} form={form} id={key} title={surprise}>
                {look}
              </Tick>
            ))}
          </ul>
        </section>
      </div>
      <details className="mt-4">
        <summary className="inline-flex min-h-11 items-center text-steel underline underline-offset-3">
          What goes together, as a rule
        </summary>
        <ul className="mt-1">
          {GOES_TOGETHER.map(({ key, work, also }) => (
            <Tick key={key} form={form} id={key} title={work}>
              {capital(also)}.
            </Tick>
          ))}
        </ul>
      </details>
    </Panel>
  );
}

function Tick({ form, id, title, children }: { form: SheetFormApi; id: string; title: string; children: ReactNode }) {
  const ticks = useWatch({ control: form.control, name: 'ticks' });
  const isTicked = ticks.includes(id);
  const onChange = () =>
    form.setValue('ticks', isTicked ? ticks.filter((one) => one !== id) : [...ticks, id], { shouldDirty: true });
  return (
    <li>
      <label className="tick">
        <input type="checkbox" checked={isTicked} onChange={onChange} />
        <span className="font-[620]">
          {title}
          <span className="block font-[440] text-soft">{children}</span>
        </span>
      </label>
    </li>
  );
}

function groupWords(surprises: Surprises | null, damage: string | undefined, format: Formatter): string {
  if (!surprises || surprises.n === 0)
    return 'None known yet: no finished rebuild says what was foreseen and what was not.';
  const seen =
    surprises.isSeen === null ? '' : surprises.isSeen ? ', seen before bidding' : ', not seen before bidding';
  const kind = damage ? `with ${damage}${seen}` : 'of every kind';
  return `${format.number(surprises.x)} of ${format.count(surprises.n, 'rebuild')} ${kind} had at least one.`;
}

/** `9 of 31 had one here (16% to 47%), half above $520. Most often: radiator (4), condenser (2).` */
function ownWords(one: Surprises['categories'][number], n: number, format: Formatter): string {
  const { lower, upper } = wilson(one.x, n);
  const range = lower === null || upper === null ? '' : ` (${format.percent(lower)} to ${format.percent(upper)})`;
  const whats = one.whats.map(({ what, x }) => `${what} (${x})`).join(', ');
  const most = whats ? ` Most often: ${whats}.` : '';
  return `${one.x} of ${n} had one here${range}; it came to ${format.money(Math.round(one.medianCents))} in the middle.${most}`;
}
