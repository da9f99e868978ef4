import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { points } from '../sentences/judged.ts';
import { TrendsTable } from '../trends-table.tsx';

/** Do the estimates get better? */
export function OverrunsTrends({ trends }: { trends: OverrunsAnswer['trends'] }) {
  const format = useFormatter();
  if (trends.overrun.n === 0 && trends.hours.n === 0) return null;
  const write = (rate: number) => points(rate, format);
  return (
    <Panel
      className="mb-6"
      title="Do the estimates get better?"
      subtitle="A range that holds zero could be luck: with a handful of rebuilds a year a run can show any slope."
    >
      <TrendsTable
        rows={[
          { what: 'Overrun of the money', trend: trends.overrun, better: 'down', write },
          { what: 'Overrun of the hours', trend: trends.hours, better: 'down', write },
        ]}
      />
    </Panel>
  );
}
