import { useMemo } from 'react';
import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import { capital } from '../../../lib/capital.ts';
import { DataTable } from '../../../ui/data-table.tsx';
import { Hours, Money, Nothing, PerHour } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import type { Column } from '../../../ui/table.tsx';
import { Gap } from '../gap.tsx';
import { RebuildLink } from '../rebuild-link.tsx';

type Row = YearAnswer['rebuilds'][number];

/** Every rebuild that left in the year, with its gap bar; late bills are marked. */
export function YearRebuilds({ answer }: { answer: YearAnswer }) {
  const format = useFormatter();
  const columns = useMemo<Column<Row>[]>(
    () => [
      {
        id: 'rebuild',
        header: 'Left this year',
        heads: true,
        cell: (row) => <Named row={row} />,
        sortBy: (row) => row.tag,
      },
      {
        id: 'damage',
        header: 'Damage',
        under: 'tablet',
        bare: true,
        cell: (row) => (row.damageName ? capital(row.damageName) : <Nothing />),
        sortBy: (row) => row.damageName,
      },
      {
        id: 'left',
        header: 'Left',
        under: 'tablet',
        bare: true,
        number: true,
        cell: (row) => format.dayShort(row.exitOn),
        sortBy: (row) => row.exitOn,
      },
      {
        id: 'cost',
        header: 'All-in cost',
        under: 'tablet',
        number: true,
        cell: (row) => <Money cents={row.costCents} />,
        sortBy: (row) => row.costCents,
      },
      {
        id: 'sold',
        header: 'Sold for',
        under: 'tablet',
        number: true,
        cell: (row) => <Money cents={row.proceedsCents} />,
        sortBy: (row) => row.proceedsCents,
      },
      { id: 'kept', header: 'Kept', number: true, cell: (row) => <Kept row={row} />, sortBy: (row) => row.keptCents },
      {
        id: 'hours',
        header: 'Own hours',
        under: 'phone',
        number: true,
        cell: (row) => <Hours seconds={row.ownSeconds} />,
        sortBy: (row) => row.ownSeconds,
      },
      {
        id: 'per-hour',
        header: 'Kept an hour',
        number: true,
        cell: (row) => <PerHour cents={row.keptPerHourCents} tone="kept" />,
        sortBy: (row) => row.keptPerHourCents,
      },
      {
        id: 'gap',
        header: 'Planned | actual',
        under: 'phone',
        bare: true,
        cell: (row) => <Gap gap={row.gap} />,
        sortBy: (row) => row.gap.overrun,
      },
    ],
    [format],
  );
  const { rebuilds, rebuildTotal } = answer;
  if (rebuilds.length === 0) return null;
  const note =
    rebuildTotal > rebuilds.length ? `The latest ${rebuilds.length} of ${format.number(rebuildTotal)}. ` : '';
  return (
    <section id="rows" className="mb-6 scroll-mt-6">
      <Panel
        title={`The rebuilds of ${answer.year}`}
        subtitle={`${note}Outline: locked estimate; ink: spent as foreseen; rust: over; hatch: surprise.`}
      >
        <DataTable
          caption={`Rebuilds that left in ${answer.year}`}
          rows={rebuilds}
          columns={columns}
          rowKey={(row) => row.id}
          foot={{
            rebuild: 'Before overhead',
            kept: rebuildTotal === rebuilds.length && <Money cents={answer.profitCents} tone="kept" />,
          }}
        />
      </Panel>
    </section>
  );
}

function Named({ row }: { row: Row }) {
  return (
    <span className="block sm:min-w-44">
      <RebuildLink rebuild={row} />
      {row.exitKind !== 'sold' && <span className="text-soft"> · {row.exitKind}</span>}
    </span>
  );
}

function Kept({ row }: { row: Row }) {
  const format = useFormatter();
  return (
    <>
      <Money cents={row.keptCents} tone="kept" why={row.keptCents === null ? 'no purchase price' : ''} />
      {row.lateCents !== 0 && (
        <span className="block text-label text-soft">late bills {format.money(row.lateCents)}</span>
      )}
    </>
  );
}
