import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import type { Kind } from './kind.ts';

/** How far any one rebuild moves the figure. */
export function WithoutOne({ answer: { percent, twoPart }, kind }: { answer: ContingencyAnswer; kind: Kind }) {
  const format = useFormatter();
  if (kind === 'percent') {
    const { without, uplift } = percent;
    if (without === null)
      return uplift === null ? null : <p>Without any one rebuild there are too few for this level.</p>;
    const most = Math.max(...Object.values(without.uplift).map((one) => Math.abs(one - (uplift ?? 0))));
    return (
      <p className="tabular-nums">
        One rebuild changes this by at most {format.number(most * 100, 2)} points: without any one of them it lies
        between {format.percent(without.uplift.lowest, 2)} and {format.percent(without.uplift.highest, 2)}.
      </p>
    );
  }
  const { without, flatCents } = twoPart;
  if (without === null)
    return flatCents === null ? null : <p>Without any one rebuild there are too few for this level.</p>;
  const { creepPercent, flatCents: flat } = without;
  return (
    <p className="tabular-nums">
      Without any one rebuild the percentage lies between {creepPercent.lowest}% and {creepPercent.highest}%, and the
      sum between {format.money(flat.lowest, 'always')} and {format.money(flat.highest, 'always')}.
    </p>
  );
}
