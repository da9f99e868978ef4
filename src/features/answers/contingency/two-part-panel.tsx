import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { ScoreTable } from './rules-of-thumb.tsx';

/** A percentage for known work costing more and a sum for surprises, with how such rules would have done. */
export function TwoPartPanel({ answer }: { answer: ContingencyAnswer }) {
  const format = useFormatter();
  const { twoPart, twoPartBackTest } = answer;
  const { creepPercent, adoptFlatCents } = twoPart;
  if (twoPart.n === 0) return null;
  const figure =
    creepPercent === null || adoptFlatCents === null
      ? `Too few yet: ${format.count(twoPart.n, 'rebuild')} say of every entry whether it was foreseen.`
      : `Add ${format.percent(creepPercent / 100)} for known work costing more and ${format.money(adoptFlatCents)} for surprises.`;
  return (
    <Panel
      className="mb-6"
      title="The same in two parts"
      subtitle="One percentage starves small plans and swells large ones; a sum for surprises does not grow with the plan."
    >
      <p className="mb-4 text-lead font-[640]">{figure}</p>
      {twoPartBackTest.scores.some((score) => score.n > 0) && (
        <ScoreTable caption="One part and two parts on the same rebuilds" test={twoPartBackTest} />
      )}
      <p className="mt-3 text-label text-soft">
        Based on {format.count(twoPart.n, 'rebuild')} where every entry says whether it was foreseen. Its chance is only
        roughly {answer.level.replace('/', ' in ')}, since both parts come from the same rebuilds: judge it by the
        table.
      </p>
    </Panel>
  );
}
