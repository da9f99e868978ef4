import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { ImportRow } from '#shared/contracts/imports.ts';
import { idOf } from '../../support/fake-server.ts';
import { read } from '../../imports/support.ts';
import { buildImport, firstRowsOf, open, serve, SMALL } from './support.tsx';

afterEach(() => vi.unstubAllGlobals());

const small = () => buildImport(read(SMALL));
const grid = () => screen.findByRole('grid', { name: 'Rows of the file' });
const beside = () => within(screen.getByRole('group', { name: 'What was understood' }));

/** Rows of a long file, each an entry of ten dollars in its third column. */
function longFile(count: number): ImportRow[] {
  const [line] = firstRowsOf(small().reading).find((row) => row.lines.length > 0)?.lines ?? [];
  return Array.from({ length: count }, (_, at) => ({
    sheet: 1,
    row: at + 1,
    cells: ['2020-01-02', '13 F-150', `cost ${at + 1}`],
    outcome: 'taken' as const,
    reason: null,
    lines: line ? [{ ...line, row: at + 1, col: 3 }] : [],
  }));
}

describe('the file beside what was understood', () => {
  it('begins at the first row that holds data, with its cell, its rebuild and its category', async () => {
    serve(small());
    open();
    await grid();
    expect(await beside().findByRole('heading', { name: 'Row 2' })).toBeInTheDocument();
    const lines = within(beside().getByRole('list', { name: 'What was read' }));
    expect(lines.getByText('$3,405.00')).toBeInTheDocument();
    expect(lines.getByText(/13 F-150 · 8 Feb 2020/)).toBeInTheDocument();
  });

  it('marks the cell that a line was read from, and says in words how each row ended', async () => {
    serve(small());
    open();
    const rows = within(await grid());
    await userEvent.click(await beside().findByRole('button', { name: 'Paid' }));
    expect(rows.getByRole('gridcell', { name: '$3,405.00' })).toHaveAttribute('data-hot');
    expect(rows.getByRole('rowheader', { name: /^4 ?: Put aside No day that exists/ })).toBeInTheDocument();
  });

  it('moves by arrows from row to row and from cell to cell, above the first row to the columns', async () => {
    serve(small());
    open();
    (await grid()).focus();
    await userEvent.keyboard('{ArrowDown}');
    expect(beside().getByRole('heading', { name: 'Row 3' })).toBeInTheDocument();
    await userEvent.keyboard('{ArrowRight}{ArrowRight}');
    await userEvent.keyboard('{Home}{ArrowUp}');
    expect(beside().getByRole('heading', { name: 'Car' })).toBeInTheDocument();
    expect(beside().getByLabelText('What Car holds')).toHaveValue('vehicle');
    await userEvent.keyboard('{ArrowDown}');
    expect(beside().getByRole('heading', { name: 'Row 1' })).toBeInTheDocument();
  });

  it('leads by Enter into the cell at fault, and back by Enter', async () => {
    serve(small());
    open('?row=4');
    await grid();
    await beside().findByRole('heading', { name: 'Row 4' });
    await userEvent.keyboard('{Enter}');
    const cell = beside().getByLabelText('Date');
    expect(cell).toHaveFocus();
    await userEvent.clear(cell);
    await userEvent.type(cell, '2/29/2020{Enter}');
    expect(screen.getByRole('grid')).toHaveFocus();
    expect(screen.getByRole('gridcell', { name: '2/29/2020' })).toHaveAttribute('data-corrected');
    expect(beside().getByText('was: 2/30/2020')).toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Read again with 1 correction' })).toBeInTheDocument();
  });

  it('shows only the rows that ended so', async () => {
    serve(small());
    open();
    await grid();
    await userEvent.click(screen.getByRole('radio', { name: 'Put aside' }));
    await waitFor(() => expect(within(screen.getByRole('grid')).getAllByRole('rowheader')).toHaveLength(3));
    expect(beside().getByRole('heading', { name: 'Row 4' })).toBeInTheDocument();
  });

  it('goes from a row put aside to its cell in the file', async () => {
    serve(small());
    open();
    const asides = within(await screen.findByRole('region', { name: 'Rows and cells put aside' }));
    await userEvent.click(asides.getByRole('button', { name: '5' }));
    expect(beside().getByRole('heading', { name: 'Row 5' })).toBeInTheDocument();
    expect(beside().getByText(/Put aside: names no vehicle/)).toBeInTheDocument();
  });

  it('draws only what is in view of a long file, fetches on as it is gone through, and begins near a row that is asked for', async () => {
    const { starts } = serve(small(), { rows: longFile(5000) });
    open('?sheet=1&row=4000&col=3');
    expect(await screen.findByRole('gridcell', { name: 'cost 4000' })).toHaveAttribute('data-hot');
    expect(JSON.parse(starts[0] ?? '')).toEqual({ sheet: 1, row: 3970 });
    expect(screen.getAllByRole('rowheader').length).toBeLessThan(80);
    await userEvent.keyboard('{End}');
    await waitFor(() => expect(starts.length).toBeGreaterThan(1));
    await userEvent.click(screen.getByRole('button', { name: 'Rows before row 3970' }));
    await waitFor(() => expect(JSON.parse(starts.at(-1) ?? '')).toEqual({ sheet: 1, row: 3870 }));
  });

  it('leads from a booked line to its entry', async () => {
    const entryId = idOf('e');
    const rows = firstRowsOf(small().reading).map((row) => ({
      ...row,
      lines: row.lines.map((line) => ({ ...line, entryId })),
    }));
    serve({ ...small(), state: 'committed' }, { rows });
    open('?row=3');
    await grid();
    expect(await beside().findByRole('link', { name: 'its entry' })).toHaveAttribute(
      'href',
      expect.stringContaining(`entry=${entryId}`),
    );
  });
});
