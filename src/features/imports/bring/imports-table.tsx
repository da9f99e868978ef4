import { Link } from 'react-router-dom';
import type { ImportSummary } from '#shared/contracts/imports.ts';
import { Nothing } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { STATE_WORDS } from '../words.ts';

type Props = { caption: string; rows: readonly ImportSummary[]; to: (importId: string) => string };

/** Files brought in: how each stands, how many rows came in. `to` gives the address of one. */
export function ImportsTable({ caption, rows, to }: Props) {
  const format = useFormatter();
  const count = (value: number | null) => (value === null ? <Nothing /> : format.number(value));
  const columns: Column<ImportSummary>[] = [
    {
      id: 'file',
      header: 'File',
      heads: true,
      width: 'min-w-36 break-words',
      cell: (row) => <Link to={to(row.id)}>{row.fileName}</Link>,
    },
    {
      id: 'state',
      header: 'How it stands',
      under: 'phone',
      bare: true,
      cell: (row) => <span className="whitespace-normal">{row.refusal ?? STATE_WORDS[row.state]}</span>,
    },
    { id: 'taken', header: 'Rows in', number: true, cell: (row) => count(row.rowsTaken) },
    { id: 'aside', header: 'Put aside', number: true, under: 'phone', cell: (row) => count(row.rowsPutAside) },
    { id: 'by', header: 'By', under: 'phone', cell: (row) => row.createdBy },
    { id: 'on', header: 'On', under: 'phone', cell: (row) => format.day(row.createdAt.slice(0, 10)) },
  ];
  return <Table caption={caption} rows={rows} columns={columns} rowKey={(row) => row.id} />;
}
