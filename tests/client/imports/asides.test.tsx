import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { hasUnsaved } from '../../../src/lib/unsaved.ts';
import { read } from '../../imports/support.ts';
import { buildImport, ID, open, serve, SMALL } from './support.tsx';

afterEach(() => vi.unstubAllGlobals());

const small = () => buildImport(read(SMALL));
const asides = async () => within(await screen.findByRole('region', { name: 'Rows and cells put aside' }));
const readAgain = (count: string) => userEvent.click(screen.getByRole('button', { name: `Read again with ${count}` }));

describe('rows put aside', () => {
  it('stand there with reason, text and readable money', async () => {
    serve(small());
    open();
    const row = (await asides()).getByRole('row', { name: /^5 Names no vehicle Car/ });
    expect(row).toHaveTextContent('$23.18');
  });

  it('are put right in place: what the file says stays beside it, and it is sent with the next reading', async () => {
    const { asked } = serve(small());
    open();
    const cell = (await asides()).getByLabelText('Date in row 4');
    await userEvent.clear(cell);
    await userEvent.type(cell, '2/29/2020');
    expect(cell).toHaveAccessibleDescription('was: 2/30/2020');
    await readAgain('1 correction');
    await waitFor(() =>
      expect(asked).toEqual([`PATCH /api/imports/${ID} {"cells":[{"sheet":1,"row":4,"col":1,"text":"2/29/2020"}]}`]),
    );
  });

  it('sends corrections together with those made before, and takes one back', async () => {
    const before = [
      { sheet: 1, row: 4, col: 1, text: '2/29/2020' },
      { sheet: 1, row: 5, col: 2, text: '13 F-150' },
    ];
    const { asked } = serve({ ...small(), settings: { cells: before } });
    open();
    const cell = (await asides()).getByLabelText('Date in row 4');
    expect(cell).toHaveValue('2/29/2020');
    await userEvent.type(cell, '{Escape}');
    expect(cell).toHaveValue('2/30/2020');
    await readAgain('1 correction');
    await waitFor(() => expect(asked[0]).toContain('{"cells":[{"sheet":1,"row":5,"col":2,"text":"13 F-150"}]}'));
  });

  it('are left out by a press', async () => {
    const { asked } = serve(small());
    open();
    await userEvent.click((await asides()).getByRole('button', { name: 'Leave out row 5' }));
    await readAgain('1 correction');
    await waitFor(() => expect(asked).toEqual([`PATCH /api/imports/${ID} {"leftOut":[{"sheet":1,"row":5}]}`]));
  });

  it('keep what was typed when somebody else was quicker, and go over it when pressed again', async () => {
    const { asked, become, refuseOnce } = serve(small());
    refuseOnce({ status: 412, detail: 'Somebody was quicker.' });
    open();
    const cell = (await asides()).getByLabelText('Date in row 4');
    await userEvent.clear(cell);
    await userEvent.type(cell, '2/28/2020');
    expect(hasUnsaved()).toBe(true);
    become({ version: 7 });
    await readAgain('1 correction');
    expect(await screen.findByRole('alert')).toHaveTextContent('Somebody else changed this import meanwhile');
    expect((await asides()).getByLabelText('Date in row 4')).toHaveValue('2/28/2020');
    await readAgain('1 correction');
    await waitFor(() => expect(hasUnsaved()).toBe(false));
    expect(asked).toHaveLength(2);
  });
});
