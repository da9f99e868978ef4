import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { expect, test } from 'vitest';
import { DataTable } from '../../../src/ui/data-table.tsx';
import { Money, Nothing, Percent } from '../../../src/ui/figures.tsx';
import type { Column } from '../../../src/ui/table.tsx';

type Row = { id: string; cents: number | null };

const columns: readonly Column<Row>[] = [
  { id: 'id', header: 'Rebuild', heads: true, cell: (row) => row.id, sortBy: (row) => row.id },
  {
    id: 'kept',
    header: 'Kept',
    number: true,
    cell: (row) => <Money cents={row.cents} tone="kept" />,
    sortBy: (row) => row.cents,
  },
];
const rows: readonly Row[] = [
  { id: 'B-2', cents: 500 },
  { id: 'B-1', cents: null },
  { id: 'B-3', cents: -700 },
];

const order = () => screen.getAllByRole('rowheader').map((cell) => cell.textContent);

test('a press on a heading sorts, a second one turns it round, and nothing stays last either way', async () => {
  render(<DataTable caption="Sold" rows={rows} columns={columns} rowKey={(row) => row.id} />);
  expect(order()).toEqual(['B-2', 'B-1', 'B-3']);
  await userEvent.click(screen.getByRole('button', { name: 'Kept' }));
  const head = screen.getByRole('columnheader', { name: /Kept/ });
  const first = head.getAttribute('aria-sort');
  const once = order();
  await userEvent.click(within(head).getByRole('button'));
  expect(new Set([first, head.getAttribute('aria-sort')])).toEqual(new Set(['ascending', 'descending']));
  expect(once.at(-1)).toBe('B-1');
  expect(order()).toEqual([once[1], once[0], 'B-1']);
});

test('the frame is named and can be reached, so that it scrolls by keyboard', () => {
  render(<DataTable caption="Sold" rows={rows} columns={columns} rowKey={(row) => row.id} />);
  expect(screen.getByRole('region', { name: 'Sold' })).toHaveAttribute('tabindex', '0');
});

test('of very many rows only those in view are drawn, and their number is told', () => {
  const many = Array.from({ length: 5000 }, (_, at) => ({ id: `B-${at}`, cents: at }));
  render(<DataTable caption="Sold" rows={many} columns={columns} rowKey={(row) => row.id} />);
  expect(screen.getByRole('table')).toHaveAttribute('aria-rowcount', '5001');
  expect(screen.queryAllByRole('rowheader').length).toBeLessThan(100);
});

test('a gain and a loss differ by their sign, not by colour alone', () => {
  render(
    <>
      <Money cents={-77_000} tone="kept" />
      <Percent rate={0.22} tone="cost" signed />
    </>,
  );
  expect(screen.getByText('−$770')).toHaveClass('text-oxide');
  expect(screen.getByText('+22%')).toHaveClass('text-oxide');
});

test('nothing is said in words, never as zero', () => {
  render(
    <>
      <Nothing />
      <Money cents={null} why="too few yet" />
    </>,
  );
  expect(screen.getByText('nothing recorded')).toBeInTheDocument();
  expect(screen.getByText('too few yet')).toBeInTheDocument();
});
