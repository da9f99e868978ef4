import { useMemo } from 'react';
import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { FoldedPanel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { capital } from '../../../lib/capital.ts';
import { byMoneyOver } from './strip-rows.ts';

type YearRate = OverrunsAnswer['hours']['years'][number];
type Row = { key: string; name: string; years: readonly YearRate[] };
/** More years than these do not fit beside each other. */
const YEARS_SHOWN = 8;
const YEARS_ON_A_PHONE = 2;

/** Where a category took a step, an all-years figure is stale: each category by the year in which the rebuilds left. */
export function CategoriesByYear({ answer }: { answer: OverrunsAnswer }) {
  const { hours, categories } = answer;
  const rows: Row[] = [
    ...(hours.n > 0 ? [{ key: 'hours', name: 'Hours worked', years: hours.years }] : []),
    ...byMoneyOver(categories).map((one) => ({ key: one.categoryId, name: capital(one.name), years: one.years })),
  ];
  const years = [...new Set(rows.flatMap((row) => row.years.map(({ year }) => year)))].sort((a, b) => a - b);
  const columns = useColumns(years.slice(-YEARS_SHOWN).join());
  if (years.length < 2) return null;
  return (
    <FoldedPanel
      title="Each category, year by year"
      subtitle="Sum over sum of the rebuilds that left in the year. A step that stays makes the figure over all years stale; gray rests on fewer than five: too few yet."
    >
      <Table caption="Overrun of each category by year" rows={rows} columns={columns} rowKey={(row) => row.key} />
    </FoldedPanel>
  );
}

function useColumns(years: string): readonly Column<Row>[] {
  return useMemo(
    () => [
      {
        id: 'name',
        header: 'Category',
        heads: true,
        cell: (row) => <span className="block sm:min-w-32">{row.name}</span>,
      },
      ...years.split(',').map((year, at, all) => ({
        id: year,
        header: year,
        under: at < all.length - YEARS_ON_A_PHONE ? ('phone' as const) : undefined,
        number: true,
        cell: (row: Row) => <Rate rate={row.years.find((one) => `${one.year}` === year)} />,
      })),
    ],
    [years],
  );
}

function Rate({ rate }: { rate: YearRate | undefined }) {
  const format = useFormatter();
  if (!rate || rate.pooled === null) return null;
  const tone = rate.isThin ? 'text-soft' : rate.pooled > 0 ? 'font-[640] text-oxide' : 'font-[640] text-steel';
  return (
    <>
      <span className={tone}>{format.signedPercent(rate.pooled)}</span>{' '}
      <span className="inline-block min-w-5 text-label text-soft">{rate.n}</span>
    </>
  );
}
