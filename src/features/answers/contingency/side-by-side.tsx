import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { Money } from '../../../ui/figures.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RangeText } from '../range-text.tsx';
import { scoreOf } from '../sentences/contingency.ts';
import type { Kind } from './kind.ts';

type Score = ContingencyAnswer['backTest']['scores'][number];

const NAMES: Record<Score['rule'], string> = {
  percent: 'One percentage, set this way',
  'two-part': 'Percentage and sum, set this way',
  'flat 10': 'Flat 10%',
  'flat 15': 'Flat 15%',
  'flat 20': 'Flat 20%',
  'flat 25': 'Flat 25%',
};

/** Both rules and the flat rules of thumb on the same rebuilds, nothing looked up ahead of time. */
export function SideBySide({ answer, kind }: { answer: ContingencyAnswer; kind: Kind }) {
  const { backTest, twoPartBackTest } = answer;
  const hasBoth = twoPartBackTest.scores.some((score) => score.n > 0);
  const test = hasBoth ? twoPartBackTest : backTest;
  if (test.scores.every((score) => score.n === 0)) return null;
  return (
    <Panel title="Against each other, and against rules of thumb" subtitle={subtitleOf(answer, hasBoth)}>
      <Table
        caption="Rules on the same rebuilds"
        rows={test.scores}
        columns={COLUMNS}
        rowKey={(row) => row.rule}
        rowProps={(row) => (row.rule === kind ? { 'data-strong': '' } : {})}
      />
      <Meanings />
    </Panel>
  );
}

/** All on the same rebuilds; where that leaves some out, what the percentage does on all of them. */
function subtitleOf({ backTest, twoPartBackTest }: ContingencyAnswer, hasBoth: boolean): string {
  const same = 'The same rebuilds, each rule with what was known when the car was bought.';
  const [all, both] = [scoreOf(backTest, 'percent'), scoreOf(twoPartBackTest, 'percent')];
  if (!hasBoth) return `${same} Percentage and sum cannot be judged yet: entries must say whether they were foreseen.`;
  if (!all || !both || all.n === both.n) return same;
  return `${same} Only those whose entries all say whether they were foreseen: on all ${all.n} the percentage would have covered ${all.x}.`;
}

const COLUMNS: readonly Column<Score>[] = [
  { id: 'rule', header: 'Rule', heads: true, cell: (row) => NAMES[row.rule] },
  {
    id: 'covered',
    header: 'Covered',
    number: true,
    cell: (row) => (
      <>
        {row.x} of {row.n}
        <span className="block text-label font-normal text-soft">
          <RangeText low={row.lower} high={row.upper} />
        </span>
      </>
    ),
  },
  { id: 'short', header: 'Short, in all', number: true, cell: (row) => <Money cents={row.shortCents} /> },
  {
    id: 'unused',
    header: 'Unused, in all',
    under: 'tablet',
    number: true,
    cell: (row) => <Money cents={row.unusedCents} />,
  },
];

/** One plain line for each word. */
export function Meanings() {
  return (
    <dl className="mt-4 grid gap-1 text-label text-soft">
      <div>
        <dt className="inline font-[640] text-ink">Covered</dt>
        <dd className="inline"> it cost no more than its estimate and the cushion on it.</dd>
      </div>
      <div>
        <dt className="inline font-[640] text-ink">Short</dt>
        <dd className="inline"> what it cost beyond both, added up over those not covered.</dd>
      </div>
      <div>
        <dt className="inline font-[640] text-ink">Unused</dt>
        <dd className="inline"> cushion that stayed over. It is a reserve: set aside, not there to be spent.</dd>
      </div>
    </dl>
  );
}
