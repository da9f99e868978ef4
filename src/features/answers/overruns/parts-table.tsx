import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { capital } from '../../../lib/capital.ts';
import { Money, Percent } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { byMoneyOver } from './strip-rows.ts';

type Row = { key: string; name: string; parts: OverrunsAnswer['total']['parts']; extraCents: number };

/** Three kinds of more: known work costing more, surprises, and extras that were chosen; the last is no overrun. */
export function PartsTable({ answer }: { answer: OverrunsAnswer }) {
  const format = useFormatter();
  const { total, categories, extras } = answer;
  if (total.parts.n === 0) return null;
  const rows: Row[] = [
    { key: 'total', name: 'All together', parts: total.parts, extraCents: extras.cents },
    ...byMoneyOver(categories)
      .filter(({ parts, extraCents }) => parts.surpriseCents !== 0 || extraCents !== 0)
      .map(({ categoryId, name, parts, extraCents }) => ({ key: categoryId, name: capital(name), parts, extraCents })),
  ];
  const chosen =
    extras.cents === 0
      ? 'No chosen extra is booked.'
      : `Chosen extras, on ${format.count(extras.rebuildCount, 'rebuild')}, stand apart: they cost money, but nobody misjudged them.`;
  return (
    <Panel
      className="mb-6"
      title="What the overrun is made of"
      subtitle={`The ${format.count(total.parts.n, 'rebuild')} where every entry says whether it was foreseen. ${chosen}`}
    >
      <Table
        caption="What the overrun is made of"
        rows={rows}
        columns={COLUMNS}
        rowKey={(row) => row.key}
        rowProps={(row) => (row.key === 'total' ? { 'data-strong': '' } : {})}
      />
    </Panel>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  { id: 'name', header: 'Category', heads: true, cell: (row) => row.name },
  {
    id: 'over',
    header: 'Over',
    number: true,
    cell: ({ parts }) => <Money cents={parts.overCents} signed tone="cost" />,
  },
  {
    id: 'known',
    header: 'Known work costing more',
    under: 'phone',
    number: true,
    cell: ({ parts }) => <Money cents={parts.knownCents} signed />,
  },
  {
    id: 'surprise',
    header: 'Surprises',
    under: 'phone',
    number: true,
    cell: ({ parts }) => parts.surpriseCents !== 0 && <Money cents={parts.surpriseCents} signed />,
  },
  {
    id: 'share',
    header: 'Surprise share',
    number: true,
    cell: ({ parts }) => <Percent rate={parts.surpriseShare} />,
  },
  {
    id: 'extras',
    header: 'Chosen extras',
    under: 'phone',
    number: true,
    cell: (row) => row.extraCents !== 0 && <Money cents={row.extraCents} />,
  },
];
