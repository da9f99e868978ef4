import type { RuleReview } from '#shared/contracts/answers-rule-review.ts';
import { BackTestBars } from '../../../charts/back-test-bars.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { useRebuildPath } from '../rebuild-link.tsx';
import { Meanings } from './side-by-side.tsx';

/** Every rebuild bought under the rule and finished, against the cushion that it gave. */
export function ReviewTrials({ reviewed }: { reviewed: NonNullable<RuleReview['reviewed']> }) {
  const format = useFormatter();
  const path = useRebuildPath();
  const { record, trials } = reviewed;
  if (trials.length === 0) return null;
  const bars = trials.map((trial) => ({
    label: trial.tag,
    href: path(trial.id),
    year: trial.year,
    rate: trial.overrunCents / trial.estimateCents,
    ruleRate: trial.reserveCents / trial.estimateCents,
    shortCents: trial.shortCents,
  }));
  const latest = record.n > trials.length ? ` The latest ${trials.length} of ${format.number(record.n)}.` : '';
  return (
    <Panel
      className="mb-6"
      title="Each rebuild bought under it, against the cushion it had"
      subtitle={`Bars: actual over (up) or under (down) the locked estimate, in order of leaving.${latest}`}
    >
      <BackTestBars
        caption={`${record.x} of ${record.n} covered by ${format.money(record.reserveCents)} of cushion: short by ${format.money(record.shortCents)}, ${format.money(record.unusedCents)} unused.`}
        bars={bars}
        format={format}
      />
      <Meanings />
    </Panel>
  );
}
