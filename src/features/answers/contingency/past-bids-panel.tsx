import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { Money } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RebuildLink } from '../rebuild-link.tsx';
import { sayPastBids } from '../sentences/past-bids.ts';
import type { Kind } from './kind.ts';

type PastBids = ContingencyAnswer['pastBids']['percent'];
type Bid = PastBids['skipped']['rebuilds'][number];

/** What such rules would have done to the bids on the rebuilds they are judged on, in money. */
export function PastBidsPanel({ answer, kind }: { answer: ContingencyAnswer; kind: Kind }) {
  const format = useFormatter();
  const bids = answer.pastBids[kind === 'percent' ? 'percent' : 'twoPart'];
  const out = bids.leftOut.map(({ count, reason }) => `${format.number(count)} left out: ${reason}.`).join(' ');
  if (bids.n === 0 && out === '') return null;
  const said = sayPastBids(bids, answer.wantedCentsPerHour, format);
  return (
    <Panel
      title="What such rules would have done to past bids"
      subtitle={`Only from what was locked then: a car is skipped where more was paid than its expected sale, less its estimate, cushion${answer.wantedCentsPerHour === null ? '' : ' and planned hours'}, allowed.`}
    >
      <p className="mb-2 text-lead font-[640]">{said.finding}</p>
      {said.more.map((line) => (
        <p key={line} className="mb-1 text-soft">
          {line}
        </p>
      ))}
      {out && <p className="text-soft">{out}</p>}
      {bids.skipped.count > 0 && (
        <details className="mt-3">
          <summary className="inline-block min-h-6 text-steel underline underline-offset-3">
            The {format.count(bids.skipped.count, 'car')} it would have skipped
          </summary>
          <div className="mt-3">
            <Table
              caption="Cars that the rule would have skipped"
              rows={bids.skipped.rebuilds}
              columns={COLUMNS}
              rowKey={(row) => row.id}
            />
          </div>
        </details>
      )}
    </Panel>
  );
}

const COLUMNS: readonly Column<Bid>[] = [
  { id: 'rebuild', header: 'Rebuild', heads: true, cell: (row) => <RebuildLink rebuild={row} /> },
  { id: 'paid', header: 'Paid', number: true, cell: (row) => <Money cents={row.paidCents} /> },
  { id: 'limit', header: 'Allowed', number: true, cell: (row) => <Money cents={row.limitCents} /> },
  {
    id: 'cushion',
    header: 'With a cushion of',
    number: true,
    under: 'tablet',
    cell: (row) => <Money cents={row.reserveCents} />,
  },
  {
    id: 'profit',
    header: 'Kept in the end',
    number: true,
    cell: (row) => <Money cents={row.profitCents} tone="kept" signed />,
  },
];
