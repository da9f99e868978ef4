import { render, screen } from '@testing-library/react';
import { afterEach, expect, test, vi } from 'vitest';
import { type Column, Table } from '../../../src/ui/table.tsx';

type Row = { tag: string; kept: string; cost: string; left: string };

const columns: readonly Column<Row>[] = [
  { id: 'tag', header: 'Rebuild', heads: true, cell: (row) => row.tag },
  { id: 'left', header: 'Left', under: 'phone', bare: true, cell: (row) => row.left },
  { id: 'cost', header: 'All-in cost', under: 'tablet', cell: (row) => row.cost },
  { id: 'kept', header: 'Kept', cell: (row) => row.kept },
];
const rows: readonly Row[] = [
  { tag: 'B-1', kept: '$3', cost: '$9', left: '4 Oct' },
  { tag: 'B-2', kept: '$5', cost: '', left: '' },
];

/** A window this wide, as far as the table asks. */
function openWindow(rem: number) {
  vi.stubGlobal('matchMedia', (query: string) => ({
    matches: rem < Number(/(\d+)rem/.exec(query)?.[1]),
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }));
  render(
    <Table caption="Sold" rows={rows} columns={columns} rowKey={(row) => row.tag} foot={{ cost: '$90', kept: '$8' }} />,
  );
}

afterEach(() => vi.unstubAllGlobals());

const heads = () => screen.getAllByRole('columnheader').map((head) => head.textContent);
const lines = () =>
  screen
    .getAllByRole('row')
    .slice(1)
    .map((row) => row.textContent);

test('a wide window shows every column as one', () => {
  openWindow(80);
  expect(heads()).toEqual(['Rebuild', 'Left', 'All-in cost', 'Kept']);
  expect(lines()).toEqual(['B-14 Oct$9$3', 'B-2$5', '$90$8']);
});

test('a tablet moves what it has no room for beneath its row, with its name', () => {
  openWindow(50);
  expect(heads()).toEqual(['Rebuild', 'Left', 'Kept']);
  expect(lines()).toEqual(['B-14 Oct$3', 'All-in cost $9', 'B-2$5', '$8', 'All-in cost $90']);
});

test('a phone keeps the figure that matters as a column; sums move along and what is empty is left out', () => {
  openWindow(24);
  expect(heads()).toEqual(['Rebuild', 'Kept']);
  expect(lines()).toEqual(['B-1$3', '4 OctAll-in cost $9', 'B-2$5', '$8', 'All-in cost $90']);
});
