import { Link } from 'react-router-dom';
import type { WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import { capital } from '../../../lib/capital.ts';
import { Money } from '../../../ui/figures.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { Segmented } from '../../../ui/segmented.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { useAddress } from '../address.ts';
import { useShopPath } from '../rebuild-link.tsx';
import { listed } from '../sentences/parts.ts';

const SETS = [
  { value: 'damages', label: 'By damage' },
  { value: 'classes', label: 'By class' },
] as const;
type SetName = (typeof SETS)[number]['value'];
type Group = WhatPaysAnswer['oldSheet']['damages'][number];
/** `hour`: the rank by own hour or whatever the page compares by. */
type Row = Group & { key: 'damage' | 'class'; hourRank: number | null };

/** What the old sheet would have bought again, beside what the whole books say of the same kinds. */
export function OldSheetPanel({ answer }: { answer: WhatPaysAnswer }) {
  const { search, change } = useAddress();
  const by: SetName = SETS.find(({ value }) => value === search.get('sheet'))?.value ?? 'damages';
  const { bills, old } = answer.oldSheet;
  if (old.n === 0) return null;
  const rows = rowsOf(answer, by);
  return (
    <Panel
      className="mb-6"
      title="What the old sheet would have said"
      subtitle={`Kept a rebuild: sold ones only, ${listed(['purchase', ...bills])} as their cost. Beside it every bill and every way out, and the rank of this page.`}
      actions={
        <Segmented
          label="Old sheet by"
          options={SETS}
          value={by}
          onChange={(value) => change({ sheet: value === 'damages' ? null : value })}
        />
      }
    >
      <Table caption="What the old sheet would have said" rows={rows} columns={COLUMNS} rowKey={(row) => row.name} />
    </Panel>
  );
}

function rowsOf({ oldSheet, fits }: WhatPaysAnswer, by: SetName): Row[] {
  const isDamage = by === 'damages';
  return oldSheet[by]
    .filter(({ whole }) => whole.n > 0)
    .map((group) => {
      const same = fits[by].groups.find((one) => (isDamage ? one.damageName : one.className) === group.name);
      return { ...group, key: isDamage ? ('damage' as const) : ('class' as const), hourRank: same?.rank ?? null };
    })
    .toSorted((a, b) => (a.oldRank ?? Infinity) - (b.oldRank ?? Infinity) || b.whole.n - a.whole.n);
}

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'kind',
    header: 'Kind',
    heads: true,
    cell: (row) => (
      <span className="block sm:min-w-32">
        <KindLink row={row} />
      </span>
    ),
  },
  { id: 'old-rank', header: 'Old rank', number: true, cell: (row) => row.oldRank ?? 'too few yet' },
  { id: 'old', header: 'Old sheet, a rebuild', number: true, cell: (row) => <PerRebuild kept={row.old} /> },
  { id: 'sold', header: 'Sold', under: 'phone', number: true, cell: (row) => row.old.n },
  { id: 'whole', header: 'Kept, a rebuild', number: true, cell: (row) => <PerRebuild kept={row.whole} isTrue /> },
  { id: 'n', header: 'Left in all', under: 'phone', number: true, cell: (row) => row.whole.n },
  { id: 'unsold', header: 'Still unsold', under: 'tablet', number: true, cell: (row) => row.unsoldCount || '' },
  { id: 'whole-rank', header: 'Rank, kept', under: 'tablet', number: true, cell: (row) => row.wholeRank ?? '' },
  { id: 'rank', header: 'Rank here', number: true, cell: (row) => row.hourRank ?? '' },
];

function KindLink({ row }: { row: Row }) {
  const path = useShopPath();
  const name = capital(row.key === 'damage' ? `${row.name} damage` : row.name);
  return row.id === null ? <>{name}</> : <Link to={path(`rebuilds?${row.key}=${row.id}`)}>{name}</Link>;
}

function PerRebuild({ kept: { n, keptCents }, isTrue = false }: { kept: Group['old']; isTrue?: boolean }) {
  return <Money cents={n === 0 ? null : keptCents / n} shown="never" tone={isTrue ? 'kept' : 'plain'} />;
}
