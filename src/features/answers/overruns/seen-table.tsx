import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { PerHour, Percent } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RangeText } from '../range-text.tsx';
import { differenceWords, points } from '../sentences/judged.ts';

type Row = OverrunsAnswer['seen'][number];

const words = (row: Row) => (row.seen === null ? 'Not said' : row.seen ? 'Seen before buying' : 'Bought unseen');

/** Does a look before buying go with fewer overruns and surprises, and with more by the hour? */
export function SeenTable({ answer }: { answer: OverrunsAnswer }) {
  const format = useFormatter();
  const rows = answer.seen.filter((row) => row.n > 0);
  const { overrun, surprised, perHour } = answer.seenDifference;
  const inPoints = (rate: number) => points(rate, format);
  const gaps = [
    ['Overrun', differenceWords(overrun, inPoints)],
    ['Had a surprise', differenceWords(surprised, inPoints)],
    ['Kept an own hour', differenceWords(perHour, (cents) => format.signed(cents, 'never'))],
  ] as const;
  if (rows.length === 0) return null;
  return (
    <Panel
      title="Seen against unseen"
      subtitle="Goes with, not proves: cars that were looked at may differ in other ways too. Below, like is compared with like."
    >
      <Table caption="Seen against unseen" rows={rows} columns={COLUMNS} rowKey={words} />
      <h3 className="mt-4 font-[660]">Unseen less seen, with its 95% range</h3>
      <dl className="mt-1 grid gap-1 tabular-nums">
        {gaps.map(([what, text]) => (
          <div key={what} className="flex flex-wrap gap-x-2">
            <dt className="text-soft">{what}</dt>
            <dd>{text}</dd>
          </div>
        ))}
      </dl>
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  { id: 'seen', header: 'Bought', heads: true, cell: words },
  { id: 'n', header: 'Rebuilds', under: 'tablet', number: true, cell: (row) => row.n },
  {
    id: 'pooled',
    header: 'All together',
    number: true,
    cell: (row) => (
      <>
        <Percent rate={row.pooled} signed tone="cost" />
        {row.isThin && <span className="block text-label text-soft">too few yet</span>}
      </>
    ),
  },
  {
    id: 'per-hour',
    header: 'Kept an own hour',
    under: 'phone',
    number: true,
    cell: (row) => <PerHour cents={row.perHour.pooledCents} tone="kept" why="no hours" />,
  },
  {
    id: 'surprised',
    header: 'Had a surprise',
    number: true,
    cell: (row) =>
      row.surprises.n > 0 && (
        <>
          <Percent rate={row.surprises.rate} />
          <span className="block text-label text-soft">
            {row.surprises.x} of {row.surprises.n}
          </span>
          <span className="block text-label text-soft">
            <RangeText low={row.surprises.lower} high={row.surprises.upper} />
          </span>
        </>
      ),
  },
];
