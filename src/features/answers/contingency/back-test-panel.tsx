import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { LEVELS } from '#shared/vocabulary.ts';
import { BackTestBars } from '../../../charts/back-test-bars.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { Segmented } from '../../../ui/segmented.tsx';
import { useAddress } from '../address.ts';
import { useRebuildPath } from '../rebuild-link.tsx';
import { levelWords, scoreOf } from '../sentences/contingency.ts';
import { KINDS, type Kind, testOf, trailOf } from './kind.ts';

/** Each rebuild against the rule it would have had when it was bought, and the choice of level and kind. */
export function BackTestPanel({ answer, kind }: { answer: ContingencyAnswer; kind: Kind }) {
  const format = useFormatter();
  const path = useRebuildPath();
  const bars = trailOf(answer, kind).map(({ row, asked }) => ({
    label: row.tag,
    href: path(row.id),
    year: row.year,
    rate: row.overrun,
    ruleRate: kind === 'percent' ? row.uplift : asked && asked.reserveCents / row.estimateCents,
    shortCents: asked?.shortCents ?? null,
  }));
  const isCut = answer.trailTotal > answer.trail.length;
  const latest = isCut ? ` From the latest ${bars.length} of ${format.number(answer.trailTotal)}.` : '';
  return (
    <Panel
      className="mb-6"
      title="Each rebuild against the rule it would have had at the time"
      subtitle={`Bars: actual over (up) or under (down) the locked estimate, in order of leaving. Gray: too few before it to set a rule.${latest}`}
    >
      <Choices level={answer.level} kind={kind} />
      {bars.length === 0 ? (
        <p className="text-soft">No finished rebuild has a locked estimate yet.</p>
      ) : (
        <BackTestBars caption={captionOf(answer, kind)} bars={bars} format={format} />
      )}
    </Panel>
  );
}

function Choices({ level, kind }: { level: ContingencyAnswer['level']; kind: Kind }) {
  const { change } = useAddress();
  return (
    <div className="no-print mb-4 flex flex-wrap gap-3">
      <Segmented
        label="How often the cushion must hold"
        options={LEVELS.map((value) => ({ value, label: levelWords(value) }))}
        value={level}
        onChange={(value) => change({ level: value === '4/5' ? null : value.replace('/', '-') })}
      />
      <Segmented
        label="Kind of rule"
        options={KINDS}
        value={kind}
        onChange={(value) => change({ rule: value === 'percent' ? null : value })}
      />
    </div>
  );
}

function captionOf(answer: ContingencyAnswer, kind: Kind): string {
  const test = testOf(answer, kind);
  const score = scoreOf(test, kind);
  const early = test.skippedCount + test.tooFewCount;
  const gray = early > 0 ? ` ${early} came too early for a rule.` : '';
  if (!score || score.n === 0) return `No rebuild came after enough others to be judged.${gray}`;
  return `Rules set this way, each on what was known when the car was bought, would have covered ${score.x} of ${score.n}.${gray}`;
}
