import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { RebuildRow } from '#shared/contracts/rebuilds.ts';
import { GapBar } from '../../charts/gap-bar.tsx';
import { capital } from '../../lib/capital.ts';
import { DataTable } from '../../ui/data-table.tsx';
import { Days, Hours, Money, Nothing, PerHour } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import type { Column } from '../../ui/table.tsx';

/** One line per rebuild: what it cost, brought and kept, its hours, and plan against actual. */
export function RebuildsTable({ rows, shopId }: { rows: readonly RebuildRow[]; shopId: string }) {
  const format = useFormatter();
  const columns = useMemo<readonly Column<RebuildRow>[]>(
    () => [
      {
        id: 'rebuild',
        header: 'Rebuild',
        heads: true,
        width: 'w-64',
        cell: (row) => (
          <>
            <Link to={`/s/${shopId}/rebuilds/${row.id}`} className="text-ink sm:whitespace-nowrap">
              {row.tag}
              {row.name && ` · ${row.name}`}
            </Link>
            <span className="block text-label text-soft">
              {capital([row.className, row.damageName].filter(Boolean).join(', '))}
            </span>
          </>
        ),
      },
      {
        id: 'stage',
        header: 'Stage',
        width: 'w-28',
        under: 'phone',
        bare: true,
        cell: (row) => <StageWords row={row} />,
      },
      {
        id: 'days',
        header: 'Days',
        width: 'w-16',
        under: 'tablet',
        number: true,
        cell: (row) => <Days days={row.daysHeld} />,
      },
      {
        id: 'cost',
        header: 'All-in cost',
        under: 'tablet',
        width: 'w-24',
        number: true,
        cell: (row) => <Money cents={row.costCents} />,
      },
      {
        id: 'proceeds',
        header: 'Brought',
        under: 'tablet',
        width: 'w-24',
        number: true,
        cell: (row) => (row.proceedsCents === null ? <Nothing /> : <Money cents={row.proceedsCents} />),
      },
      {
        id: 'kept',
        header: 'Kept',
        width: 'w-24',
        number: true,
        cell: (row) => <Money cents={row.keptCents} tone="kept" />,
      },
      {
        id: 'hours',
        header: 'Own hours',
        under: 'tablet',
        width: 'w-20',
        number: true,
        cell: (row) => <Hours seconds={row.ownSeconds} />,
      },
      {
        id: 'per-hour',
        header: 'Per own hour',
        width: 'w-24',
        number: true,
        cell: (row) => <PerHour cents={row.keptPerHourCents} tone="kept" />,
      },
      {
        id: 'gap',
        header: 'Planned | actual',
        under: 'phone',
        bare: true,
        width: 'w-40',
        cell: (row) => (
          <GapBar
            lockedCents={row.estimateCents}
            foreseenCents={row.planningCents - row.surpriseCents}
            surpriseCents={row.surpriseCents}
            overrunRate={row.overrunRate}
            format={format}
            width={76}
          />
        ),
      },
    ],
    [format, shopId],
  );
  return <DataTable caption="Rebuilds" rows={rows} columns={columns} rowKey={(row) => row.id} />;
}

function StageWords({ row }: { row: RebuildRow }) {
  const format = useFormatter();
  const day = row.leftOn ?? row.boughtOn;
  return (
    <>
      {capital(row.stage)}
      {day && <span className="block text-label whitespace-nowrap text-soft">{format.day(day)}</span>}
    </>
  );
}
