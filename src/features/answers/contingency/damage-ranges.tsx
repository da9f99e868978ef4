import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import type { Formatter } from '#shared/formatter.ts';
import { RangeLines } from '../../../charts/range-lines.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { capital } from '../../../lib/capital.ts';
import { listed } from '../sentences/parts.ts';

/** What each damage type would ask for by itself, from nine rebuilds on. */
export function DamageRanges({ answer }: { answer: ContingencyAnswer }) {
  const format = useFormatter();
  const damages = answer.damages.filter((one) => one.n > 0).toSorted((a, b) => b.n - a.n);
  if (damages.length === 0) return null;
  const shop = answer.percent.percent;
  const fallback = shop === null ? 'too few yet' : `too few yet: use ${format.percent(shop / 100)}`;
  return (
    <Panel
      title="By damage type"
      subtitle="A type gets its own figure from nine rebuilds on; until then it uses the shop's. Lines: 8 in 10 of what happened."
    >
      <RangeLines
        caption={captionOf(damages, format)}
        rows={damages.map((one) => ({
          label: capital(one.name),
          n: one.n,
          low: one.n > 1 ? one.q10 : null,
          high: one.n > 1 ? one.q90 : null,
          value: one.percent === null ? null : one.uplift,
          note: one.percent === null ? fallback : `add ${format.percent(one.percent / 100)}`,
        }))}
        format={format}
      />
    </Panel>
  );
}

function captionOf(damages: ContingencyAnswer['damages'], format: Formatter): string {
  const own = damages.filter((one) => one.percent !== null);
  if (own.length === 0) return 'No damage type has enough rebuilds for a figure of its own.';
  const parts = own.map((one) => `${one.name} asks for ${format.percent((one.percent ?? 0) / 100)}`);
  return `By itself ${listed(parts)}.`;
}
