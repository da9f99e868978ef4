import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import type { Formatter } from '#shared/formatter.ts';
import { DotStrip } from '../../../charts/dot-strip.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { useRebuildPath } from '../rebuild-link.tsx';
import { worstCategories } from '../sentences/overruns.ts';
import { stripRows } from './strip-rows.ts';

/** Per category each rebuild a dot, the locked estimate at zero. */
export function OverrunsPicture({ answer }: { answer: OverrunsAnswer }) {
  const format = useFormatter();
  const path = useRebuildPath();
  if (answer.total.n === 0) return null;
  const note = answer.marks === 'binned' ? ' So many rebuilds: the spread alone is drawn.' : '';
  return (
    <Panel
      className="mb-6"
      title="Over and under the locked estimate"
      subtitle={`A dot is a rebuild; the thick mark is the middle one, the line holds 8 in 10. Hatched: the share of the overrun that was a surprise; the rest is known work costing more.${note}`}
    >
      <DotStrip caption={captionOf(answer, format)} rows={stripRows(answer, path)} format={format} />
    </Panel>
  );
}

function captionOf(answer: OverrunsAnswer, format: Formatter): string {
  const { parts } = answer.total;
  const worst = worstCategories(answer);
  const most = worst ? `Most money runs over in ${worst.most.name}. ` : '';
  if (parts.surpriseShare === null) return `${most}Over the estimates in all: ${format.signed(parts.overCents)}.`;
  return (
    `${most}Of ${format.money(parts.overCents)} over, ${format.percent(parts.surpriseShare)} was surprises and the rest ` +
    `known work costing more (${format.count(parts.n, 'rebuild')} where every entry says which).`
  );
}
