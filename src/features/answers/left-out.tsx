import type { LeftOut } from '#shared/contracts/answers-parts.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { RebuildLink } from './rebuild-link.tsx';

/** What is not in the figures, and why; each reason opens the rebuilds that it holds for. */
export function LeftOutList({ leftOut }: { leftOut: readonly LeftOut[] }) {
  const format = useFormatter();
  const shown = leftOut.filter((one) => one.count > 0);
  if (shown.length === 0) return null;
  return (
    <section id="left-out" className="scroll-mt-6">
      <Panel title="Left out, and why" subtitle="Not in every figure above; a rebuild may stand here more than once.">
        <ul className="grid gap-1">
          {shown.map((one) => (
            <li key={one.reason}>
              <details>
                <summary className="min-h-6">
                  <strong className="font-[640]">{format.number(one.count)} left out</strong>: {one.reason}
                </summary>
                <ul className="mt-1 mb-3 flex flex-wrap gap-x-5 gap-y-1 border-l-4 border-rule pl-4">
                  {one.rebuilds.map((rebuild) => (
                    <li key={rebuild.id} className="min-h-6">
                      <RebuildLink rebuild={rebuild} />
                    </li>
                  ))}
                  {one.count > one.rebuilds.length && (
                    <li>and {format.number(one.count - one.rebuilds.length)} more</li>
                  )}
                </ul>
              </details>
            </li>
          ))}
        </ul>
      </Panel>
    </section>
  );
}
