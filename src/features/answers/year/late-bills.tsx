import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { RebuildLink } from '../rebuild-link.tsx';

/** Bills dated after their rebuild had left: in the year's figures already, and named here. */
export function LateBills({ late }: { late: YearAnswer['late'] }) {
  const format = useFormatter();
  if (late.count === 0) return null;
  return (
    <Panel
      className="mb-6"
      title={`Late bills: ${format.money(late.cents)} in ${format.count(late.count, 'entry', 'entries')}`}
      subtitle="Dated after the rebuild had left. They count in the year of the sale, so a closed year can still move."
    >
      <ul className="flex flex-wrap gap-x-6 gap-y-1">
        {late.rebuilds.map((rebuild) => (
          <li key={rebuild.id} className="min-h-6">
            <RebuildLink rebuild={rebuild} />{' '}
            <span className="text-soft">
              {format.money(rebuild.cents)} in {format.count(rebuild.count, 'entry', 'entries')}
            </span>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
