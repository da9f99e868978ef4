import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { read, sampleBytes } from '../../imports/support.ts';
import { buildImport, ID, open, serve, SMALL } from './support.tsx';

afterEach(() => vi.unstubAllGlobals());

describe('what was understood of a file', () => {
  it('says what comes in and whether it agrees', async () => {
    serve(buildImport(read(sampleBytes('p02_expense_ledger_us.csv'))));
    open();
    expect(await screen.findByText('80 of 83 rows')).toBeInTheDocument();
    const costs = screen.getByRole('region', { name: 'Costs' });
    expect(within(costs).getByRole('row', { name: /Costs together \$22,000\.46/ })).toBeInTheDocument();
  });

  it('counts every row once, and the counts add up to the whole file', async () => {
    serve(buildImport(read(sampleBytes('p08_notes_and_junk.csv'))));
    open();
    const rows = within(await screen.findByRole('region', { name: 'Rows' })).getAllByRole('row');
    const counts = rows.slice(1).map((row) => Number(within(row).getAllByRole('cell').at(-1)?.textContent));
    const total = counts.pop();
    expect(counts.reduce((sum, count) => sum + count, 0)).toBe(total);
    expect(screen.getByRole('row', { name: /^No data: title \d/ })).toBeInTheDocument();
  });

  it('holds the file’s own totals against what comes in', async () => {
    const text =
      'Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00\n2020-01-03,13 F-150,Towing,20.00\n,,total,31.00';
    serve(buildImport(read(text)));
    open();
    const totals = await screen.findByRole('region', { name: 'The file’s own totals' });
    expect(within(totals).getByRole('row', { name: /^Paid .*\$31\.00 \$30\.00 \$1\.00/ })).toBeInTheDocument();
    expect(screen.getByText(/the one total that the file states differs/)).toBeInTheDocument();
  });

  it('takes another meaning for a column', async () => {
    const { asked } = serve(buildImport(read('Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00')));
    open();
    await userEvent.selectOptions(await screen.findByLabelText('What What for holds'), 'Vendor');
    await userEvent.click(screen.getByRole('button', { name: 'Read again with 1 change' }));
    await waitFor(() => expect(asked[0]).toContain('{"sheet":1,"col":3,"meaning":"vendor","category":null}'));
  });

  it('says which file the columns were taken over from', async () => {
    const reading = read('Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00');
    serve(buildImport({ ...reading, rememberedFrom: { importId: ID, fileName: '2019.csv' } }));
    open();
    expect(await screen.findByText(/Taken over from 2019\.csv, which has the same headings/)).toBeInTheDocument();
  });

  it('says what came in before and what of it changed', async () => {
    const reading = read('Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00');
    const earlier = { importId: ID, fileName: '2019.csv', committedAt: '2026-05-01T10:00:00Z', sameRows: 412 };
    serve(buildImport({ ...reading, earlier: [{ ...earlier, changedRows: 3 }] }));
    open();
    const note = await screen.findByText(/412 rows came in before with/);
    expect(note).toHaveTextContent('2019.csv on 1 May 2026 and are not taken again; 3 changed since');
  });

  it('lists what is worth a look, and leads there', async () => {
    const reading = read('Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00');
    const hint = { sheet: 1, row: 2, col: 4, kind: 'comment' as const, text: 'cash, no receipt' };
    serve(buildImport({ ...reading, hints: [hint] }));
    open();
    await userEvent.click(await screen.findByRole('button', { name: '2, Paid' }));
    const beside = screen.getByRole('group', { name: 'What was understood' });
    expect(within(beside).getByText('Comment: cash, no receipt')).toBeInTheDocument();
  });

  it('says why a file cannot come in', async () => {
    const reading = read('Date,What for,Paid\n2020-01-02,Parts,10.00');
    serve(buildImport(reading, { state: 'refused', refusal: reading.refusal?.message ?? null }));
    open();
    expect(await screen.findByText(/No column names the vehicle/)).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /^Book/ })).not.toBeInTheDocument();
  });

  it('an accountant looks and changes nothing', async () => {
    serve(buildImport(read(SMALL)), { role: 'accountant' });
    open();
    await screen.findByText('3 of 6 rows');
    expect(await screen.findByRole('grid', { name: 'Rows of the file' })).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /^Book|Drop|Leave out|Change/ })).not.toBeInTheDocument();
    expect(screen.queryByLabelText('What Paid holds')).not.toBeInTheDocument();
    expect(screen.queryByRole('textbox')).not.toBeInTheDocument();
  });
});
