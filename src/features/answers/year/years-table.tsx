import { lazy, Suspense } from 'react';
import { Link } from 'react-router-dom';
import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import { formatDayRange } from '#shared/format-day.ts';
import type { Formatter } from '#shared/formatter.ts';
import { capital } from '../../../lib/capital.ts';
import { Money } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { words } from '../sentences/parts.ts';
import { type TrendRow, TrendsTable } from '../trends-table.tsx';

type Row = YearAnswer['years'][number];

const YearBars = lazy(async () => ({ default: (await import('../../../charts/year-bars.tsx')).YearBars }));

/** Every shop year beside the others, drawn and as rows; a year opens by its number. */
export function YearsTable({ answer }: { answer: YearAnswer }) {
  const format = useFormatter();
  const lived = answer.years.filter((row) => row.exitCount > 0 || row.keptCents !== 0);
  const rows = answer.years.toSorted((a, b) => b.year - a.year);
  return (
    <Panel
      className="mb-6"
      title="All years"
      subtitle="A handful of rebuilds a year can show any slope by chance, and car prices move too: look at several years before calling it better or worse."
    >
      {lived.length > 1 && (
        <div className="mb-5">
          <Suspense fallback={<div className="h-72" />}>
            <YearBars caption={yearsCaption(lived, format)} bars={barsOf(lived, answer)} format={format} />
          </Suspense>
        </div>
      )}
      <Table
        caption="All years"
        rows={rows}
        columns={COLUMNS}
        rowKey={(row) => `${row.year}`}
        rowProps={(row) => (row.year === answer.year ? { 'data-strong': '' } : {})}
      />
      <div className="mt-6">
        <TrendsTable rows={trendRows(answer, format)} />
      </div>
    </Panel>
  );
}

/** Over all years, whichever is shown. */
function trendRows({ trends }: YearAnswer, format: Formatter): TrendRow[] {
  const write = (cents: number) => format.signed(cents, 'never');
  return [
    { what: 'Kept an own hour', trend: trends.perHour, better: 'up', write },
    { what: 'Kept a rebuild', trend: trends.perRebuild, better: 'up', write },
  ];
}

/** Years in their order; what left in each, and which one is not over. */
function barsOf(rows: readonly Row[], { year, asOf }: YearAnswer) {
  return rows
    .toSorted((a, b) => a.year - b.year)
    .map((row) => ({
      year: `${row.year}`,
      cents: row.keptCents,
      note: `${row.exitCount} ${row.from <= asOf && asOf <= row.to ? 'so far' : 'left'}`,
      isShown: row.year === year,
    }));
}

/** `Five of six years kept money: $48,147 was kept all together; the best was 2023, with $19,406.` */
export function yearsCaption(rows: readonly Pick<Row, 'year' | 'keptCents'>[], format: Formatter): string {
  const kept = rows.filter((row) => row.keptCents > 0).length;
  const sum = rows.reduce((total, row) => total + row.keptCents, 0);
  const best = rows.reduce((a, b) => (b.keptCents > a.keptCents ? b : a));
  const all = `${format.money(Math.abs(sum))} was ${sum < 0 ? 'lost' : 'kept'} all together`;
  const most = kept === 0 ? '' : `; the best was ${best.year}, with ${format.money(best.keptCents)}`;
  return `${kept === 0 ? 'None' : capital(words(format, kept))} of ${words(format, rows.length)} years kept money: ${all}${most}.`;
}

const COLUMNS: readonly Column<Row>[] = [
  {
    id: 'year',
    header: 'Year',
    heads: true,
    cell: (row) => (
      <Link to={`?year=${row.year}`} title={formatDayRange(row.from, row.to)}>
        {row.year}
      </Link>
    ),
  },
  { id: 'left', header: 'Left', under: 'phone', number: true, cell: (row) => row.exitCount },
  { id: 'sold', header: 'Sold', under: 'phone', number: true, cell: (row) => row.soldCount },
  {
    id: 'profit',
    header: 'Before overhead',
    number: true,
    cell: (row) => <Money cents={row.profitCents} tone="kept" />,
  },
  {
    id: 'overhead',
    header: 'Overhead',
    under: 'phone',
    number: true,
    cell: (row) => <Money cents={row.overheadCents} />,
  },
  { id: 'kept', header: 'Kept', number: true, cell: (row) => <Money cents={row.keptCents} tone="kept" /> },
  {
    id: 'late',
    header: 'Late bills',
    under: 'phone',
    number: true,
    cell: (row) => (row.lateCount === 0 ? '' : <Money cents={row.lateCents} />),
  },
  {
    id: 'tied',
    header: 'Tied up at its end',
    under: 'phone',
    number: true,
    cell: (row) => <Money cents={row.tiedUp.cents} />,
  },
];
