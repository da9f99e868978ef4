import type { TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import type { Formatter } from '#shared/formatter.ts';
import { SurvivalCurve } from '../../../charts/survival-curve.tsx';
import type { SurvivalGroup } from '../../../charts/survival-layout.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { capital } from '../../../lib/capital.ts';

type Group = TimeToSellAnswer['overall'];
/** More lines than this cannot be told apart. */
const CLASSES_DRAWN = 5;

/** Share still unsold by day, all together and by class; classes with fewer than five sales are not drawn. */
export function SellingCurve({ answer }: { answer: TimeToSellAnswer }) {
  const format = useFormatter();
  const { overall, classes } = answer;
  if (overall.soldCount === 0) return null;
  const drawn = classes
    .filter((one) => !one.isThin)
    .toSorted((a, b) => b.n - a.n)
    .slice(0, CLASSES_DRAWN)
    // Those that end at the same height are labelled from the longest down, so that no lead crosses another.
    .toSorted((a, b) => (b.steps.at(-1)?.days ?? 0) - (a.steps.at(-1)?.days ?? 0));
  const groups = [lineOf('All together', overall), ...drawn.map((one) => lineOf(capital(one.name), one))];
  const undrawn = classes.length - drawn.length;
  const note =
    undrawn > 0 ? ` ${format.count(undrawn, 'class', 'classes')} with too few sales stand in the table only.` : '';
  return (
    <Panel
      title="Share still unsold, by day"
      subtitle={`The band is the 95% interval of all together. Unsold ones count as waiting until today.${note}`}
    >
      <SurvivalCurve
        caption={captionOf(overall, format)}
        groups={groups}
        axisLabel="days since listed"
        format={format}
      />
    </Panel>
  );
}

function lineOf(label: string, group: Group): SurvivalGroup {
  return {
    label,
    n: group.n,
    medianDays: group.median.days,
    steps: group.steps.map((step) => ({ day: step.days, share: step.unsold, low: step.lower, high: step.upper })),
  };
}

function captionOf({ at30, at60, at90 }: Group, format: Formatter): string {
  const parts = [
    { days: 30, at: at30 },
    { days: 60, at: at60 },
    { days: 90, at: at90 },
  ].flatMap(({ days, at }) => (at.unsold === null ? [] : [`${format.percent(at.unsold)} after ${days} days`]));
  return parts.length === 0 ? 'Nobody has waited 30 days yet.' : `Still unsold: ${parts.join(', ')}.`;
}
