import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { Money, Percent } from '../../../ui/figures.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RebuildLink } from '../rebuild-link.tsx';
import type { Kind } from './kind.ts';

type Row = ContingencyAnswer['trail'][number];

/** Every rebuild in the order that the rule is read from, the one taken marked: the sum can be done again by hand. */
export function SortedOverruns({ answer, kind }: { answer: ContingencyAnswer; kind: Kind }) {
  const { trail, trailTotal } = answer;
  const { n, k } = answer[kind === 'percent' ? 'percent' : 'twoPart'];
  const rows = trail.filter((row) => placeOf(row, kind) > 0).toSorted((a, b) => placeOf(a, kind) - placeOf(b, kind));
  if (rows.length === 0) return null;
  return (
    <div>
      <p className="mb-2">
        The {n} in order, number {k} marked.
        {trailTotal > trail.length && ` Only the latest ${trail.length} stand here, with their places among all.`}
      </p>
      <div className="max-h-[28rem] overflow-y-auto">
        <Table
          caption={kind === 'percent' ? 'Overruns in order' : 'What is left over, in order'}
          rows={rows}
          columns={kind === 'percent' ? PERCENT : TWO_PART}
          rowKey={(row) => row.id}
          rowProps={(row) => (placeOf(row, kind) === k ? { 'data-strong': '', 'data-taken': '' } : {})}
        />
      </div>
    </div>
  );
}

function placeOf(row: Row, kind: Kind): number {
  return kind === 'percent' ? row.place : (row.twoPart?.place ?? 0);
}

const REBUILD: Column<Row> = {
  id: 'rebuild',
  header: 'Rebuild',
  heads: true,
  cell: (row) => <RebuildLink rebuild={row} short />,
};
const ESTIMATE: Column<Row> = {
  id: 'estimate',
  header: 'Estimate',
  number: true,
  cell: (row) => <Money cents={row.estimateCents} shown="always" />,
};
const OVER: Column<Row> = {
  id: 'over',
  header: 'Over',
  number: true,
  cell: (row) => <Money cents={row.overrunCents} shown="always" />,
};

const PERCENT: readonly Column<Row>[] = [
  { id: 'place', header: 'No.', number: true, cell: (row) => row.place },
  REBUILD,
  ESTIMATE,
  OVER,
  { id: 'rate', header: 'Overrun', number: true, cell: (row) => <Percent rate={row.overrun} digits={2} signed /> },
];

const TWO_PART: readonly Column<Row>[] = [
  { id: 'place', header: 'No.', number: true, cell: (row) => row.twoPart?.place },
  REBUILD,
  ESTIMATE,
  OVER,
  {
    id: 'surprise',
    header: 'Of it surprises',
    number: true,
    under: 'tablet',
    cell: (row) => <Money cents={row.twoPart?.surpriseCents ?? null} shown="always" />,
  },
  {
    id: 'left',
    header: 'Left over',
    number: true,
    cell: (row) => <Money cents={row.twoPart?.leftCents ?? null} shown="always" />,
  },
];
