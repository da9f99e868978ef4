import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { HoursRow } from '#shared/contracts/hours.ts';
import { DataTable } from '../../ui/data-table.tsx';
import { Hours, Nothing } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { RowActs } from '../../ui/row-acts.tsx';
import type { Column } from '../../ui/table.tsx';

type Props = {
  rows: readonly HoursRow[];
  shopId: string;
  ofOne?: boolean;
  /** null for people who only read. */
  onChange: ((hours: HoursRow) => void) | null;
  onVoid: (hours: HoursRow) => void;
};

/** Hours by day; void ones are struck through and say why. */
export function HoursTable({ rows, shopId, ofOne = false, onChange, onVoid }: Props) {
  const format = useFormatter();
  const columns = useMemo<readonly Column<HoursRow>[]>(() => {
    const all: (Column<HoursRow> & { hidden?: boolean })[] = [
      {
        id: 'day',
        header: 'Day',
        width: 'w-28',
        under: ofOne ? undefined : 'phone',
        bare: true,
        cell: (row) =>
          row.workedOn ? (
            <span className="whitespace-nowrap">{format.day(row.workedOn)}</span>
          ) : (
            <span className="text-soft">No day</span>
          ),
      },
      {
        id: 'rebuild',
        header: 'Rebuild',
        width: 'w-56',
        hidden: ofOne,
        cell: (row) => (
          <>
            <Link to={`/s/${shopId}/rebuilds/${row.rebuildId}`}>{row.rebuildTag}</Link>{' '}
            <span className="text-soft">{row.rebuildName}</span>
          </>
        ),
      },
      {
        id: 'who',
        header: 'Who',
        width: 'w-36',
        under: 'phone',
        bare: true,
        cell: (row) =>
          row.workerName ? (
            <span className="whitespace-nowrap">{row.workerName}</span>
          ) : (
            <span className="text-soft">Not said</span>
          ),
      },
      {
        id: 'task',
        header: 'Doing what',
        width: 'w-56',
        under: 'phone',
        bare: true,
        cell: (row) => (
          <>
            {row.task ?? <Nothing />}
            {row.voidReason && <span className="ml-2 inline-block">void: {row.voidReason}</span>}
          </>
        ),
      },
      {
        id: 'paid',
        header: 'Paid',
        width: 'w-20',
        under: 'phone',
        bare: true,
        cell: (row) => (row.isPaid ? 'Paid' : 'Own'),
      },
      {
        id: 'hours',
        header: 'Hours',
        width: 'w-20',
        number: true,
        cell: (row) => <Hours seconds={row.seconds} exact />,
      },
      {
        id: 'act',
        header: <span className="sr-only">Change</span>,
        width: 'w-32',
        under: 'phone',
        bare: true,
        hidden: onChange === null,
        cell: (row) =>
          row.voidedAt === null &&
          onChange && (
            <RowActs
              of={`${row.rebuildTag}, ${row.workedOn ?? 'no day'}`}
              onChange={() => onChange(row)}
              onVoid={() => onVoid(row)}
            />
          ),
      },
    ];
    return all.filter((column) => !column.hidden);
  }, [format, ofOne, shopId, onChange, onVoid]);
  return (
    <DataTable
      caption="Hours"
      rows={rows}
      columns={columns}
      rowKey={(row) => row.id}
      rowProps={(row) => (row.voidedAt ? { 'data-void': '' } : {})}
    />
  );
}
