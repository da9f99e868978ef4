import type { RuleForCar } from '#shared/contracts/answers-rule-for-car.ts';
import { type Column, Table } from '../../../ui/table.tsx';
import { RUNG_WORDS } from '../sentences/rule-for-car.ts';

type Tried = RuleForCar['percent']['tried'][number];
type Row = { rung: Tried['rung']; percent: Tried; twoPart: Tried | undefined; takenFor: string[] };

/** The table of groups tried, from the closest to the widest, so that a reader sees why it was that one. */
export function RungsTried({ found: { percent, twoPart } }: { found: RuleForCar }) {
  const rows = percent.tried.map((one, at): Row => {
    const taken = [percent.rung === one.rung && 'one percentage', twoPart.rung === one.rung && 'percentage and sum'];
    return {
      rung: one.rung,
      percent: one,
      twoPart: twoPart.tried[at],
      takenFor: taken.filter((name): name is string => Boolean(name)),
    };
  });
  return (
    <details className="mt-3">
      <summary className="inline-block min-h-6 text-steel underline underline-offset-3">Why these rebuilds</summary>
      <div className="mt-3">
        <p className="mb-3 text-soft">
          From the closest to the widest: the first with nine rebuilds, and with enough of them for the level, carries
          the rule. Number k of n is taken, so k must not be above n.
        </p>
        <Table caption="Groups of past rebuilds tried" rows={rows} columns={COLUMNS} rowKey={(row) => row.rung} />
      </div>
    </details>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'rung',
    header: 'Alike in',
    heads: true,
    cell: (row) => (
      <>
        {RUNG_WORDS[row.rung].alike}
        {row.takenFor.length > 0 && (
          <span className="block text-label text-soft">taken: {row.takenFor.join(' and ')}</span>
        )}
      </>
    ),
  },
  { id: 'percent', header: 'One percentage', number: true, cell: (row) => triedText(row.percent) },
  { id: 'two', header: 'Percentage and sum', number: true, cell: (row) => row.twoPart && triedText(row.twoPart) },
];

function triedText({ n, k, carries }: Tried): string {
  const why = carries ? '' : n < 9 ? ', under nine' : ', too few for the level';
  return `number ${k} of ${n}${why}`;
}
