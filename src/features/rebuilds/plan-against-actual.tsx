import type { CategoryOutcome } from '#shared/contracts/rebuild-outcome.ts';
import type { RebuildDetail } from '#shared/contracts/rebuilds.ts';
import { GapBar } from '../../charts/gap-bar.tsx';
import { capital } from '../../lib/capital.ts';
import { Money, Nothing } from '../../ui/figures.tsx';
import { useIsPhone } from '../../ui/fold.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { type Column, Table } from '../../ui/table.tsx';

/** Room for the bars of all categories, drawn to one scale. */
const BAR = 260;
const PHONE_BAR = 120;

/** Locked plan against actual, category by category, drawn to one scale; then all together. */
export function PlanAgainstActual({ detail }: { detail: RebuildDetail }) {
  const format = useFormatter();
  const bar = useIsPhone() ? PHONE_BAR : BAR;
  const { categories, row } = detail;
  if (categories.length === 0) {
    return <p className="text-soft">Once there is a plan or a first entry, each category stands here with its gap.</p>;
  }
  const most = Math.max(...categories.map((one) => Math.max(one.estimateCents ?? 0, one.planningCents, 1)));
  const sum = (field: 'surpriseCents' | 'extraCents') => categories.reduce((total, one) => total + one[field], 0);
  const columns: Column<CategoryOutcome>[] = [
    { id: 'name', header: 'Category', heads: true, cell: (one) => capital(one.name) },
    {
      id: 'plan',
      header: 'Planned',
      under: 'phone',
      number: true,
      cell: (one) => <Money cents={one.estimateCents} />,
    },
    {
      id: 'actual',
      header: 'Actual',
      under: 'phone',
      number: true,
      cell: (one) => <Money cents={one.planningCents} />,
    },
    {
      id: 'bar',
      header: 'Planned | actual',
      cell: (one) => (
        <GapBar
          lockedCents={one.estimateCents}
          foreseenCents={one.planningCents - one.surpriseCents}
          surpriseCents={one.surpriseCents}
          overrunRate={rateOf(one.estimateCents, one.planningCents)}
          format={format}
          maxCents={most}
          width={bar}
          hideLabel={one.estimateCents === null}
        />
      ),
    },
    {
      id: 'surprise',
      header: 'Surprises',
      under: 'phone',
      number: true,
      cell: (one) => (one.surpriseCents === 0 ? <Nothing /> : <Money cents={one.surpriseCents} />),
    },
    {
      id: 'extra',
      header: 'Chosen extras',
      under: 'tablet',
      number: true,
      cell: (one) => (one.extraCents === 0 ? <Nothing /> : <Money cents={one.extraCents} />),
    },
  ];
  return (
    <Table
      caption="Plan against actual by category"
      rows={categories}
      columns={columns}
      rowKey={(one) => one.categoryId}
      foot={{
        name: 'All together',
        plan: <Money cents={row.estimateCents} />,
        actual: <Money cents={row.planningCents} />,
        bar: (
          <GapBar
            lockedCents={row.estimateCents}
            foreseenCents={row.planningCents - row.surpriseCents}
            surpriseCents={row.surpriseCents}
            overrunRate={row.overrunRate}
            format={format}
            width={bar}
          />
        ),
        surprise: <Money cents={sum('surpriseCents')} />,
        extra: <Money cents={sum('extraCents')} />,
      }}
    />
  );
}

/** Over (+) or under (−) as a fraction; null where nothing was planned. */
function rateOf(planned: number | null, actual: number): number | null {
  return planned ? (actual - planned) / planned : null;
}
