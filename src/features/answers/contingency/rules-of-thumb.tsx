import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { Money } from '../../../ui/figures.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RangeText } from '../range-text.tsx';

type Test = ContingencyAnswer['backTest'];
type Score = Test['scores'][number];

const NAMES: Record<Score['rule'], string> = {
  percent: 'One percentage, set this way',
  'two-part': 'Two parts: percentage and sum',
  'flat 10': 'Flat 10%',
  'flat 15': 'Flat 15%',
  'flat 20': 'Flat 20%',
  'flat 25': 'Flat 25%',
};

/** Flat rules of thumb on the same rebuilds, nothing looked up ahead of time. */
export function RulesOfThumb({ test }: { test: Test }) {
  if (test.scores.every((score) => score.n === 0)) return null;
  return (
    <Panel title="Against flat rules of thumb" subtitle="Same rebuilds, same order, nothing looked up ahead of time.">
      <ScoreTable caption="Rules on the same rebuilds" test={test} />
      <Meanings />
    </Panel>
  );
}

/** Every rule of a test with how often it covered, and what it was short by and left unused. */
export function ScoreTable({ caption, test }: { caption: string; test: Test }) {
  return (
    <Table
      caption={caption}
      rows={test.scores}
      columns={COLUMNS}
      rowKey={(row) => row.rule}
      rowProps={(row) => (row.rule === 'percent' || row.rule === 'two-part' ? { 'data-strong': '' } : {})}
    />
  );
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

function Meanings() {
  return (
    <dl className="mt-4 grid gap-1 text-label text-soft">
      <div>
        <dt className="inline font-[640] text-ink">Covered</dt>
        <dd className="inline"> the rebuild cost no more than its estimate and the cushion on it.</dd>
      </div>
      <div>
        <dt className="inline font-[640] text-ink">Short</dt>
        <dd className="inline"> what it cost beyond both, added up over those not covered.</dd>
      </div>
      <div>
        <dt className="inline font-[640] text-ink">Unused</dt>
        <dd className="inline"> cushion that stayed over: money set aside and not needed.</dd>
      </div>
    </dl>
  );
}
