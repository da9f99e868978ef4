import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import type { PayView } from '#shared/vocabulary.ts';
import { Hours, Money } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { Segmented } from '../../../ui/segmented.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { useAddress } from '../address.ts';
import { useShopPath } from '../rebuild-link.tsx';
import { capital } from '../../../lib/capital.ts';
import { type Group, nameOf } from '../sentences/what-pays.ts';
import { figureOf, groupSearch, inRank } from './groups.ts';
import { VIEW_WORDS } from './view-words.ts';

const SETS = [
  { value: 'damages', label: 'By damage' },
  { value: 'classes', label: 'By class' },
  { value: 'cells', label: 'By kind' },
] as const;
type SetName = (typeof SETS)[number]['value'];

/** Kinds in the order of the lower end of their range, the plain figure and the sums beside it. */
export function PaysRanking({ answer }: { answer: WhatPaysAnswer }) {
  const { search, change } = useAddress();
  const by: SetName = SETS.find(({ value }) => value === search.get('by'))?.value ?? 'damages';
  const { fits, view } = answer;
  const { groups, average } = fits[by];
  const columns = useColumns(view);
  if (SETS.every(({ value }) => fits[value].groups.length === 0)) return null;
  const noDifference = average?.betweenVariance === 0;
  return (
    <Panel
      className="mb-6"
      title="In order of the lower end"
      subtitle={
        noDifference
          ? 'No difference shown between these: every figure is pulled all the way to the average.'
          : 'What a kind brings at least, as far as its rebuilds show. Fewer than five are not ranked.'
      }
      actions={
        <Segmented
          label="Compare by"
          options={SETS}
          value={by}
          onChange={(value) => change({ by: value === 'damages' ? null : value })}
        />
      }
    >
      <Table
        caption="Kinds of wreck in order of the lower end of their range"
        rows={inRank(groups)}
        columns={columns}
        rowKey={(row) => `${row.classId}${row.damageId}`}
      />
    </Panel>
  );
}

function useColumns(view: PayView): readonly Column<Group>[] {
  const format = useFormatter();
  const path = useShopPath();
  return useMemo(() => {
    const isCost = view === 'on-cost';
    const write = (value: number) => (isCost ? format.percent(value, 1) : format.money(value, 'never'));
    const gray = (row: Group, text: string) => <span className={row.isThin ? 'text-soft' : ''}>{text}</span>;
    return [
      { id: 'rank', header: 'Rank', number: true, cell: (row) => row.rank ?? '' },
      {
        id: 'kind',
        header: 'Kind',
        heads: true,
        cell: (row) => (
          <span className="block sm:min-w-32">
            <Link to={path(`rebuilds?${groupSearch(row)}`)}>{capital(nameOf(row))}</Link>
          </span>
        ),
      },
      { id: 'n', header: 'Rebuilds', under: 'phone', number: true, cell: (row) => row.n },
      {
        id: 'value',
        header: VIEW_WORDS[view].header,
        number: true,
        cell: (row) => (row.isThin ? gray(row, 'too few yet') : <strong>{write(figureOf(row).value)}</strong>),
      },
      {
        id: 'range',
        header: '95% range',
        under: 'phone',
        number: true,
        cell: (row) => {
          const { low, high } = figureOf(row);
          return low === null || high === null ? '' : gray(row, `${write(low)} to ${write(high)}`);
        },
      },
      {
        id: 'plain',
        header: 'Plain, sum over sum',
        under: 'tablet',
        number: true,
        cell: (row) => (row.plain === null ? '' : gray(row, write(row.plain))),
      },
      {
        id: 'kept',
        header: 'Kept in all',
        under: 'phone',
        number: true,
        cell: (row) => <Money cents={row.profitCents} tone="kept" />,
      },
      {
        id: 'over',
        header: isCost ? 'All-in cost' : view === 'all-hours' ? 'All hours' : 'Own hours',
        under: 'tablet',
        number: true,
        cell: (row) =>
          isCost ? (
            <Money cents={row.costCents} />
          ) : (
            <Hours seconds={view === 'all-hours' ? row.allSeconds : row.ownSeconds} />
          ),
      },
    ] satisfies Column<Group>[];
  }, [format, path, view]);
}
