import type { Trend } from '#shared/contracts/answers-parts.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { trendVerdict, type Write } from './sentences/judged.ts';

export type TrendRow = { what: string; trend: Trend; better: 'up' | 'down'; write: Write };

/** Is it getting better? Each figure with its change a year, the range of that, and whether it could be luck. */
export function TrendsTable({ rows }: { rows: readonly TrendRow[] }) {
  const capped = rows.find(({ trend }) => trend.isCapped);
  return (
    <>
      <Table caption="Is it getting better?" rows={rows} columns={COLUMNS} rowKey={(row) => row.what} />
      <p className="mt-3 text-label text-soft">
        The middle of the slopes between every two rebuilds, by the day they left, so that no single one pulls it far.
        {capped && ` Over the latest ${capped.trend.n} only.`}
      </p>
    </>
  );
}

const COLUMNS: readonly Column<TrendRow>[] = [
  { id: 'what', header: 'Is it getting better?', heads: true, cell: (row) => row.what },
  {
    id: 'slope',
    header: 'Change a year',
    number: true,
    cell: ({ trend, write }) => !trend.isThin && trend.slope !== null && write(trend.slope),
  },
  { id: 'range', header: '95% range', under: 'phone', number: true, cell: (row) => <Range row={row} /> },
  {
    id: 'verdict',
    header: 'So',
    cell: ({ trend, better }) => <strong className="font-[640]">{trendVerdict(trend, better)}</strong>,
  },
  { id: 'n', header: 'Rebuilds', under: 'phone', number: true, cell: ({ trend }) => <Count n={trend.n} /> },
];

function Range({ row: { trend, write } }: { row: TrendRow }) {
  const { lower, upper, isThin } = trend;
  if (isThin || lower === null || upper === null) return null;
  return (
    <span className="whitespace-nowrap">
      {write(lower)} to {write(upper)}
    </span>
  );
}

function Count({ n }: { n: number }) {
  const format = useFormatter();
  return <>{format.number(n)}</>;
}
