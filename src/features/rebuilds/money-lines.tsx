import type { ReactNode } from 'react';
import type { RebuildDetail } from '#shared/contracts/rebuilds.ts';
import { Hours, Money, PerHour } from '../../ui/figures.tsx';

/** From purchase to kept, line by line, and the hours beside it. */
export function MoneyLines({ detail }: { detail: RebuildDetail }) {
  const { row, categories, paidSeconds, plannedSeconds } = detail;
  const spent = categories.reduce((total, one) => total + one.paidCents, 0);
  return (
    <dl className="money-lines">
      <Line name="Purchase" value={<Money cents={row.purchaseCents} why="not known" />} />
      <Line name="Entries" value={<Money cents={spent} />} />
      <Line name="All-in cost" value={<Money cents={row.costCents} />} isSum />
      <Line name="Brought" value={<Money cents={row.proceedsCents} />} />
      <Line name="Kept" value={<Money cents={row.keptCents} tone="kept" />} isSum />
      <Line name="Own hours" value={<Hours seconds={row.ownSeconds} />} />
      <Line name="Paid hours" value={<Hours seconds={paidSeconds} />} />
      <Line name="Hours planned" value={<Hours seconds={plannedSeconds} />} />
      <Line name="Kept per own hour" value={<PerHour cents={row.keptPerHourCents} tone="kept" />} isSum />
    </dl>
  );
}

function Line({ name, value, isSum = false }: { name: string; value: ReactNode; isSum?: boolean }) {
  return (
    <div className={isSum ? 'money-line money-sum' : 'money-line'}>
      <dt>{name}</dt>
      <dd>{value}</dd>
    </div>
  );
}
