import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { LEVELS } from '#shared/vocabulary.ts';
import { BackTestBars } from '../../../charts/back-test-bars.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { Segmented } from '../../../ui/segmented.tsx';
import { useAddress } from '../address.ts';
import { useRebuildPath } from '../rebuild-link.tsx';
import { levelWords, scoreOf } from '../sentences/contingency.ts';

/** Each rebuild against the rule it would have had when it was bought, and the choice of level. */
export function BackTestPanel({ answer }: { answer: ContingencyAnswer }) {
  const format = useFormatter();
  const path = useRebuildPath();
  const { change } = useAddress();
  const bars = answer.trail.map((one) => ({
    label: one.tag,
    href: path(one.id),
    year: one.year,
    rate: one.overrun,
    ruleRate: one.uplift,
    shortCents: one.asked?.shortCents ?? null,
  }));
  const latest =
    answer.trailTotal > bars.length ? ` The latest ${bars.length} of ${format.number(answer.trailTotal)}.` : '';
  return (
    <Panel
      className="mb-6"
      title="Each rebuild against the rule it would have had at the time"
      subtitle={`Bars: actual over (up) or under (down) the locked estimate, in order of leaving. Gray: too few before it to set a rule.${latest}`}
      actions={
        <Segmented
          label="How often the cushion must hold"
          options={LEVELS.map((level) => ({ value: level, label: levelWords(level) }))}
          value={answer.level}
          onChange={(level) => change({ level: level === '4/5' ? null : level.replace('/', '-') })}
        />
      }
    >
      {bars.length === 0 ? (
        <p className="text-soft">No finished rebuild has a locked estimate yet.</p>
      ) : (
        <BackTestBars caption={captionOf(answer)} bars={bars} format={format} />
      )}
    </Panel>
  );
}

function captionOf({ backTest }: ContingencyAnswer): string {
  const score = scoreOf(backTest, 'percent');
  const early = backTest.skippedCount + backTest.tooFewCount;
  const gray = early > 0 ? ` ${early} came too early for a rule.` : '';
  if (!score || score.n === 0) return `No rebuild came after enough others to be judged.${gray}`;
  return `Rules set this way, each on what was known when the car was bought, would have covered ${score.x} of ${score.n}.${gray}`;
}
