import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { read } from '../../imports/support.ts';
import { buildImport, ID, open, serve } from './support.tsx';

afterEach(() => vi.unstubAllGlobals());

const unclear = 'Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00\n2020-01-03,13 F-150,Gizmo,20.00';

describe('choices that a file leaves open', () => {
  it('lets nothing be booked before a question that must be asked is answered, and says so beside the button', async () => {
    const { asked } = serve(buildImport(read('Date,Car,Hours\n5/4/2022,11 Sienna,3\n5/8/2022,11 Sienna,2')));
    open();
    const book = await screen.findByRole('button', { name: /^Book/ });
    expect(book).toBeDisabled();
    expect(book).toHaveAccessibleDescription(/1 question has to be answered before anything can be booked/);
    await userEvent.click(screen.getByRole('link', { name: 'Go to the question' }));
    const question = screen.getByLabelText(/does the month or the day stand first/);
    expect(question).toHaveFocus();
    await userEvent.selectOptions(question, 'The month');
    await userEvent.click(screen.getByRole('button', { name: 'Read again with 1 change' }));
    await waitFor(() => expect(asked).toEqual([`PATCH /api/imports/${ID} {"answers":{"date-order:1":"MDY"}}`]));
  });

  it('gives every choice its default and its reason, and waits for none of them', async () => {
    serve(buildImport(read(unclear)));
    open();
    const choice = await screen.findByLabelText(/What does “Gizmo” mean/);
    expect(choice).toHaveAccessibleDescription(/none of your categories.*Unless you say otherwise: other/);
    expect(screen.getByRole('button', { name: 'Book 2 rows' })).toBeEnabled();
  });

  it('leads from a question to the cell that it is about', async () => {
    serve(buildImport(read(unclear)));
    open();
    await screen.findByLabelText(/What does “Gizmo” mean/);
    await userEvent.click(screen.getByRole('button', { name: 'Show it in the file' }));
    const beside = screen.getByRole('group', { name: 'What was understood' });
    expect(within(beside).getByRole('heading', { name: 'Row 3' })).toBeInTheDocument();
    expect(screen.getByRole('gridcell', { name: 'Gizmo' })).toHaveAttribute('data-hot');
    expect(screen.getByRole('grid')).toHaveFocus();
  });

  it('takes a spelling for another vehicle', async () => {
    const rows = ['05 Silverado,Parts,10', '05 Silverado,Parts,11', '05 Silverdo,Parts,12'];
    const { asked } = serve(buildImport(read(`Car,What for,Paid\n${rows.join('\n')}`)));
    open();
    const rebuilds = await screen.findByRole('region', { name: 'Rebuilds in this file' });
    const doubt = within(rebuilds).getByLabelText('Which vehicle is “05 Silverdo”?');
    await userEvent.selectOptions(doubt, 'a vehicle of its own');
    await userEvent.click(screen.getByRole('button', { name: 'Read again with 1 change' }));
    await waitFor(() => expect(asked[0]).toContain('"vehicle:05 Silverdo":"own"'));
  });
});
