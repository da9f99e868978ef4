import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { BidRow } from '#shared/contracts/bids.ts';
import { capital } from '../../lib/capital.ts';
import { DataTable } from '../../ui/data-table.tsx';
import { Money, Nothing } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import type { Column } from '../../ui/table.tsx';

/** Kept sheets: the bid each came to, what the hammer fell at, and what became of it. */
export function BidsTable({ rows, shopId }: { rows: readonly BidRow[]; shopId: string }) {
  const columns = useMemo(() => columnsOf(shopId), [shopId]);
  return <DataTable caption="Kept sheets" rows={rows} columns={columns} rowKey={(row) => row.id} />;
}

const columnsOf = (shopId: string): Column<BidRow>[] => [
  {
    id: 'name',
    header: 'Car',
    heads: true,
    sortBy: (row) => row.name,
    cell: (row) => (
      <>
        <Link to={`/s/${shopId}/pre-bid/${row.id}`}>{row.name}</Link>
        <span className="block text-label text-soft">{kindOf(row)}</span>
      </>
    ),
  },
  { id: 'made', header: 'Kept on', sortBy: (row) => row.madeOn, cell: (row) => <Kept row={row} />, under: 'phone' },
  {
    id: 'sale',
    header: 'Sale expected',
    number: true,
    under: 'phone',
    cell: (row) => <Money cents={row.expectedSaleCents} />,
  },
  {
    id: 'bid',
    header: 'Walk away above',
    number: true,
    sortBy: (row) => row.bidCents,
    cell: (row) => (row.bidCents === null ? 'do not bid' : <Money cents={row.bidCents} />),
  },
  {
    id: 'hammer',
    header: 'Hammer',
    number: true,
    under: 'phone',
    sortBy: (row) => row.hammerCents,
    cell: (row) => (row.hammerCents === null ? <Nothing /> : <Hammer row={row} hammerCents={row.hammerCents} />),
  },
  {
    id: 'became',
    header: 'What became of it',
    under: 'tablet',
    bare: true,
    cell: (row) => <Became row={row} shopId={shopId} />,
  },
];

function kindOf({ className, damageName, isSeen }: BidRow): string {
  const seen = isSeen === null ? null : isSeen ? 'seen' : 'not seen';
  return capital([className, damageName, seen].filter(Boolean).join(', '));
}

function Kept({ row }: { row: BidRow }) {
  const format = useFormatter();
  return <span className="whitespace-nowrap">{format.day(row.madeOn)}</span>;
}

/** What the hammer fell at, and how far that lies from the bid to walk away above. */
function Hammer({ row, hammerCents }: { row: BidRow; hammerCents: number }) {
  const format = useFormatter();
  const over = row.bidCents === null ? null : hammerCents - row.bidCents;
  return (
    <>
      <Money cents={hammerCents} />
      {over !== null && over !== 0 && (
        <span className={`block text-label ${over > 0 ? 'text-oxide' : 'text-steel'}`}>
          {format.money(Math.abs(over))} {over > 0 ? 'above' : 'below'}
        </span>
      )}
    </>
  );
}

function Became({ row, shopId }: { row: BidRow; shopId: string }) {
  if (row.state === 'open') return <span className="text-soft">open</span>;
  if (row.state === 'not bought') return <span>not bought: {row.reason}</span>;
  return (
    <span>
      bought: <Link to={`/s/${shopId}/rebuilds/${row.rebuildId}`}>{row.rebuildTag}</Link>
    </span>
  );
}
