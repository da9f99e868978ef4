import { Link } from 'react-router-dom';
import { addDays } from '#shared/day.ts';
import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import type { Formatter } from '#shared/formatter.ts';
import { StepLine } from '../../../charts/step-line.tsx';
import type { StepPoint, StepSeries } from '../../../charts/step-line-layout.ts';
import { WaterfallBars } from '../../../charts/waterfall-bars.tsx';
import type { WaterfallRow } from '../../../charts/waterfall-layout.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel, Panels } from '../../../ui/panel.tsx';
import { useRebuildPath } from '../rebuild-link.tsx';
import { capital } from '../../../lib/capital.ts';
import { counted } from '../sentences/parts.ts';

/** What was kept through the year against the year before, and where the sale money went. */
export function YearPictures({ answer }: { answer: YearAnswer }) {
  const format = useFormatter();
  const path = useRebuildPath();
  const { steps, before, money } = answer;
  if (steps.now.length === 0 && steps.before.length === 0) return <NothingYet answer={answer} />;
  const now: StepSeries = {
    points: steps.now.map((step) => pointOf(step, path)),
    start: answer.from,
    end: addDays(answer.to, 1),
    knownTo: answer.isRunning ? answer.through : null,
  };
  const then: StepSeries | null = before && {
    points: steps.before.map((step) => pointOf(step, path)),
    start: before.from,
    end: addDays(before.to, 1),
    knownTo: null,
  };
  return (
    <Panels wide>
      <Panel
        title="Kept, added up through the year"
        subtitle={`Steps where a rebuild left; overhead taken off when it was paid.${EVERY[steps.every]}`}
      >
        <StepLine
          caption={stepCaption(answer, format)}
          now={now}
          before={then}
          nowLabel={answer.isRunning ? 'this year' : `in ${answer.year}`}
          beforeLabel={`in all of ${before?.year ?? ''}`}
          format={format}
          height={Math.max(300, moneyRows(money).length * 27 - 6)}
        />
      </Panel>
      <Panel title="Where each sale dollar went" subtitle={moneySubtitle(answer, format)}>
        <WaterfallBars caption={moneyCaption(answer, format)} rows={moneyRows(money)} format={format} />
      </Panel>
    </Panels>
  );
}

/** A year without a step: the last one that has some. */
function NothingYet({ answer }: { answer: YearAnswer }) {
  const last = answer.years
    .filter((row) => row.year < answer.year && row.exitCount > 0)
    .reduce<number | null>((latest, { year }) => Math.max(latest ?? year, year), null);
  if (last === null) return null;
  return (
    <p className="mb-6 text-lead">
      The last year in which a rebuild left is <Link to={`?year=${last}`}>{last}</Link>.
    </p>
  );
}

const EVERY = { change: '', day: ' One step a day.', month: ' One step a month.' };

type Step = YearAnswer['steps']['now'][number];

function pointOf(step: Step, path: (id: string) => string): StepPoint {
  const label = step.rebuild
    ? [step.rebuild.tag, step.rebuild.name].filter(Boolean).join(' · ')
    : step.kind === 'overhead'
      ? 'Overhead'
      : 'Several';
  return { on: step.on, cents: step.totalCents, label, href: step.rebuild ? path(step.rebuild.id) : undefined };
}

function stepCaption({ keptCents, before, isRunning, year }: YearAnswer, format: Formatter): string {
  const amount = `${format.money(keptCents)} ${isRunning ? 'so far this year' : `in ${year}`}`;
  if (!before) return `${amount}; the books do not go back to the year before.`;
  const when = isRunning ? `by the same day of ${before.year}` : `in ${before.year}`;
  return `${amount}, against ${format.money(before.keptCents)} ${when}.`;
}

function moneySubtitle({ n }: YearAnswer, format: Formatter): string {
  if (n === 0) return 'No rebuild left';
  return n === 1 ? 'The one rebuild that left' : `${capital(counted(format, n))} that left, all together`;
}

/** Costs as bars in the books' order; nothing spent, nothing shown. */
function moneyRows(money: YearAnswer['money']): WaterfallRow[] {
  const costs = [
    { label: 'Purchase', cents: money.purchaseCents },
    ...money.categories.map(({ name, cents }) => ({ label: capital(name), cents })),
    { label: 'Overhead', cents: money.overheadCents },
  ].filter(({ cents }) => cents !== 0);
  return [
    { label: 'Sold for', cents: money.proceedsCents, kind: 'total' },
    ...costs.map((cost) => ({ ...cost, kind: 'less' as const })),
    { label: money.keptCents < 0 ? 'Lost' : 'Kept', cents: money.keptCents, kind: 'kept' },
  ];
}

function moneyCaption({ money }: YearAnswer, format: Formatter): string {
  if (money.proceedsCents <= 0) return 'Nothing was taken in yet.';
  const share = format.percent(Math.abs(money.keptCents) / money.proceedsCents);
  const verb = money.keptCents < 0 ? 'lost' : 'kept';
  return `Of ${format.money(money.proceedsCents)} taken in, ${share} was ${verb}.`;
}
