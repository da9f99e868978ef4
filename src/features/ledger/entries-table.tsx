import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { EntryRow } from '#shared/contracts/ledger.ts';
import { capital } from '../../lib/capital.ts';
import { DataTable } from '../../ui/data-table.tsx';
import { Money, Nothing } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { RowActs } from '../../ui/row-acts.tsx';
import type { Column } from '../../ui/table.tsx';
import { kindOf } from './entry-form.ts';

type Props = {
  rows: readonly EntryRow[];
  shopId: string;
  /** Without the rebuild's column: the table stands on its page. */
  ofOne?: boolean;
  /** null for people who only read. */
  onChange: ((entry: EntryRow) => void) | null;
  onVoid: (entry: EntryRow) => void;
};

/** Lines of the ledger; void ones are struck through and say why. */
export function EntriesTable({ rows, shopId, ofOne = false, onChange, onVoid }: Props) {
  const format = useFormatter();
  const columns = useMemo<readonly Column<EntryRow>[]>(() => {
    const all: (Column<EntryRow> & { hidden?: boolean })[] = [
      {
        id: 'day',
        header: 'Day',
        width: 'w-28',
        under: 'phone',
        bare: true,
        cell: (row) =>
          row.datedOn ? (
            <span className="whitespace-nowrap">{format.day(row.datedOn)}</span>
          ) : (
            <span className="text-soft">No day</span>
          ),
      },
      {
        id: 'rebuild',
        header: 'Rebuild',
        width: 'w-24',
        under: 'phone',
        bare: true,
        hidden: ofOne,
        cell: (row) => <RebuildTag row={row} shopId={shopId} />,
      },
      {
        id: 'category',
        header: 'Category',
        width: 'w-40',
        under: 'phone',
        bare: true,
        cell: (row) => <span className="block sm:min-w-28">{capital(row.categoryName)}</span>,
      },
      { id: 'what', header: 'What', heads: true, width: 'w-72', cell: (row) => <What row={row} /> },
      {
        id: 'kind',
        header: 'Kind',
        width: 'w-28',
        under: 'tablet',
        bare: true,
        cell: (row) => <Kind row={row} />,
      },
      { id: 'cents', header: 'Amount', width: 'w-32', number: true, cell: (row) => <Amount row={row} /> },
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
              of={`${row.what ?? row.categoryName}, ${row.datedOn ?? 'no day'}`}
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
      caption="Entries"
      rows={rows}
      columns={columns}
      rowKey={(row) => row.id}
      rowProps={(row) => (row.voidedAt ? { 'data-void': '' } : {})}
    />
  );
}

function RebuildTag({ row, shopId }: { row: EntryRow; shopId: string }) {
  if (!row.rebuildId) return <span className="text-soft">Overhead</span>;
  return <Link to={`/s/${shopId}/rebuilds/${row.rebuildId}`}>{row.rebuildTag}</Link>;
}

function What({ row }: { row: EntryRow }) {
  const words = [row.what, row.vendor].filter(Boolean).join(' · ');
  return (
    <span className="block sm:min-w-36">
      {words || <Nothing />}
      {row.splitId && <span className="text-soft"> (a share)</span>}
      {row.voidReason && <span className="ml-2 inline-block no-underline">void: {row.voidReason}</span>}
    </span>
  );
}

function Kind({ row }: { row: EntryRow }) {
  const kind = kindOf(row);
  if (kind === '') return <span className="text-soft">Not said</span>;
  return kind === 'surprise' ? <strong className="font-[640]">Surprise</strong> : capital(kind);
}

function Amount({ row }: { row: EntryRow }) {
  if (row.freeValueCents === null) return <Money cents={row.cents} shown="always" />;
  return (
    <span>
      Free{' '}
      <span className="text-soft">
        (worth <Money cents={row.freeValueCents} shown="always" />)
      </span>
    </span>
  );
}
