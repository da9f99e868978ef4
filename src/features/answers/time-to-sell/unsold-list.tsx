import type { TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import { capital } from '../../../lib/capital.ts';
import { DataTable } from '../../../ui/data-table.tsx';
import { Days, Money } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RebuildLink } from '../rebuild-link.tsx';

type Row = TimeToSellAnswer['unsold']['rebuilds'][number];

/** What is still in hand, how long, and the money in it. */
export function UnsoldList({ unsold }: { unsold: TimeToSellAnswer['unsold'] }) {
  const format = useFormatter();
  if (unsold.total === 0) return null;
  const part =
    unsold.rebuilds.length < unsold.total
      ? ` The ${format.number(unsold.rebuilds.length)} that have waited longest are shown.`
      : '';
  return (
    <Panel
      className="mb-6"
      title={`Still in hand on ${format.day(unsold.on)}`}
      subtitle={`${format.count(unsold.total, 'rebuild')} ${unsold.total === 1 ? 'holds' : 'hold'} ${format.money(unsold.cents)}: purchase and what was paid so far.${part}`}
    >
      <Ages ages={unsold.ages} />
      <DataTable caption="Unsold rebuilds" rows={unsold.rebuilds} columns={COLUMNS} rowKey={(row) => row.id} />
    </Panel>
  );
}

/** How old the money is: since the purchase, the oldest first. */
function Ages({ ages }: { ages: TimeToSellAnswer['unsold']['ages'] }) {
  const rows = ages.map((age, at) => ({ ...age, toDays: ages[at + 1]?.fromDays ?? null })).toReversed();
  const held = rows.filter(({ count }) => count > 0);
  return (
    <div className="mb-5">
      <Table caption="How old the money is" rows={held} columns={AGE_COLUMNS} rowKey={(row) => `${row.fromDays}`} />
    </div>
  );
}

type Age = TimeToSellAnswer['unsold']['ages'][number] & { toDays: number | null };

const AGE_COLUMNS: readonly Column<Age>[] = [
  {
    id: 'age',
    header: 'Days since bought',
    heads: true,
    cell: ({ fromDays, toDays }) => (toDays === null ? `${fromDays} and more` : `${fromDays} to ${toDays - 1}`),
  },
  { id: 'count', header: 'Rebuilds', number: true, cell: (row) => row.count },
  {
    id: 'oldest',
    header: 'Oldest of them',
    under: 'phone',
    cell: (row) => row.oldest && <RebuildLink rebuild={row.oldest} />,
  },
  { id: 'money', header: 'Money in them', number: true, cell: (row) => <Money cents={row.cents} /> },
];

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'rebuild',
    header: 'Rebuild',
    heads: true,
    cell: (row) => (
      <span className="block sm:min-w-40">
        <RebuildLink rebuild={row} />
      </span>
    ),
    sortBy: (row) => row.tag,
  },
  {
    id: 'stage',
    header: 'Stage',
    under: 'phone',
    bare: true,
    cell: (row) => capital(row.stage),
    sortBy: (row) => row.stage,
  },
  {
    id: 'listed',
    header: 'Days listed',
    under: 'phone',
    number: true,
    cell: (row) => <Days days={row.daysListed} why="not listed" />,
    sortBy: (row) => row.daysListed,
  },
  {
    id: 'held',
    header: 'Days since bought',
    under: 'phone',
    number: true,
    cell: (row) => <Days days={row.daysSinceBought} />,
    sortBy: (row) => row.daysSinceBought,
  },
  {
    id: 'asking',
    header: 'Asking',
    under: 'phone',
    number: true,
    cell: (row) => <Money cents={row.askingCents} />,
    sortBy: (row) => row.askingCents,
  },
  {
    id: 'money',
    header: 'Money in it',
    number: true,
    cell: (row) => <Money cents={row.tiedUpCents} />,
    sortBy: (row) => row.tiedUpCents,
  },
];
