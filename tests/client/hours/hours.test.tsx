import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { type HoursRow, hoursApi, type OwnHours } from '#shared/contracts/hours.ts';
import { ledgerApi } from '#shared/contracts/ledger.ts';
import { rebuildsApi } from '#shared/contracts/rebuilds.ts';
import { shopApi } from '#shared/contracts/shop.ts';
import type { Role } from '#shared/vocabulary.ts';
import { HoursPage } from '../../../src/pages/hours.tsx';
import { buildBoardRow, buildHours, LISTS, NAMES } from '../../support/books-replies.ts';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

afterEach(() => vi.unstubAllGlobals());

function openHours(options: { role?: Role; search?: string; refuse?: () => void } = {}) {
  const rows: HoursRow[] = [buildHours()];
  const own: OwnHours[] = [];
  const keys: (string | null)[] = [];
  const server = fakeServer([
    signedIn(buildSession(options.role ?? 'mechanic')),
    on(shopApi.lists, () => LISTS),
    on(rebuildsApi.names, () => NAMES),
    on(hoursApi.board, () => [buildBoardRow()]),
    on(hoursApi.mine, () => own),
    on(hoursApi.list, () => ({
      rows,
      totals: { count: rows.length, ownSeconds: 0, paidSeconds: rows.reduce((sum, row) => sum + row.seconds, 0) },
      next: null,
    })),
    on(hoursApi.create, ({ body }) => {
      rows.unshift(buildHours({ ...body, id: idOf('n') } as Partial<HoursRow>));
      return rows[0]!;
    }),
    on(hoursApi.logMine, ({ body, key }) => {
      keys.push(key);
      options.refuse?.();
      own.unshift({
        ...body,
        task: body.task ?? null,
        id: idOf('n'),
        rebuildTag: 'B-062',
        rebuildName: '2014 Orrin Vale',
        canChange: true,
        version: 1,
      });
      return own[0]!;
    }),
    on(ledgerApi.noteReceipt, ({ body }) => ({ id: idOf('x'), what: body.what })),
  ]);
  const address = `/s/${idOf('s')}/hours${options.search ?? ''}`;
  showPage(<HoursPage />, { path: '/s/:shopId/hours', address });
  return { ...server, keys, own, user: userEvent.setup({ delay: null }) };
}

const onB062 = `?rebuild=${idOf('r')}`;

describe('a mechanic', () => {
  it('first chooses from the open rebuilds, with the hours left on each and no money', async () => {
    openHours();
    const row = await screen.findByRole('link', { name: /B-062 · 2014 Orrin Vale/ });
    expect(row).toHaveTextContent('21.5 h left');
    expect(row).toHaveTextContent('38.5 of 60');
    expect(document.body).not.toHaveTextContent('$');
  });

  it('logs three hours in three presses', async () => {
    const { user, asked } = openHours({ search: onB062 });
    await user.click(await screen.findByRole('radio', { name: '3' }));
    await user.click(screen.getByRole('radio', { name: 'Body' }));
    await user.click(screen.getByRole('button', { name: 'Log 3 hours' }));
    expect(await screen.findByText('3 h')).toBeInTheDocument();
    const body = { rebuildId: idOf('r'), workedOn: '2026-06-15', seconds: 10_800, task: 'Body' };
    expect(asked).toEqual([`POST /api/my-hours ${JSON.stringify(body)}`]);
  });

  it('loses nothing when it does not get through: what was chosen stays, and goes under the same key', async () => {
    let isDown = true;
    const refuse = () => {
      if (isDown) throw new Refusal({ status: 503, detail: 'The server is busy.' });
    };
    const { user, keys, own } = openHours({ search: onB062, refuse });
    await user.type(await screen.findByLabelText('Or another length'), '1:30');
    await user.click(screen.getByRole('button', { name: 'Log 1.5 hours' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('The server is busy.');
    expect(screen.getByLabelText('Or another length')).toHaveValue('1:30');
    isDown = false;
    await user.click(screen.getByRole('button', { name: 'Log 1.5 hours' }));
    await waitFor(() => expect(own).toHaveLength(1));
    expect(keys[1]).toBe(keys[0]);
  });

  it('is told to choose a length first', async () => {
    const { user, asked } = openHours({ search: onB062 });
    await user.click(await screen.findByRole('button', { name: 'Log hours' }));
    expect(screen.getByRole('alert')).toHaveTextContent('Choose how long.');
    expect(asked).toEqual([]);
  });

  it('notes a surprise with the amount on the receipt', async () => {
    const { user, asked } = openHours({ search: onB062 });
    await user.click(await screen.findByRole('button', { name: 'Note a surprise or a receipt' }));
    const dialog = within(await screen.findByRole('dialog'));
    await user.type(dialog.getByLabelText('What'), 'cracked hinge');
    await user.selectOptions(dialog.getByLabelText('Category'), 'Parts');
    await user.type(dialog.getByLabelText('Amount on the receipt'), '45');
    await user.click(dialog.getByRole('button', { name: 'Note it' }));
    await waitFor(() => expect(asked).toHaveLength(1));
    expect(JSON.parse(asked[0]?.replace('POST /api/receipts ', '') ?? '')).toMatchObject({
      rebuildId: idOf('r'),
      categoryId: idOf('p'),
      cents: 4500,
      what: 'cracked hinge',
      isSurprise: true,
    });
  });
});

describe('at the desk', () => {
  it('a line of hours is taken by the keyboard and the cursor goes back to the hours', async () => {
    const { user, asked } = openHours({ role: 'bookkeeper' });
    const form = within(await screen.findByRole('form', { name: 'Add hours' }));
    await user.type(form.getByRole('combobox', { name: 'Rebuild' }), '062');
    await user.tab();
    await user.selectOptions(form.getByLabelText('Who'), 'Sam Roe');
    await user.type(form.getByLabelText('Hours'), '3:30{Enter}');
    expect(await screen.findByRole('cell', { name: '3.5' })).toBeInTheDocument();
    expect(JSON.parse(asked[0]?.replace('POST /api/hours ', '') ?? '')).toMatchObject({
      rebuildId: idOf('r'),
      workerId: idOf('w'),
      seconds: 12_600,
      workedOn: '2026-06-15',
    });
    expect(form.getByLabelText('Hours')).toHaveFocus();
    expect(form.getByLabelText('Hours')).toHaveValue('');
  });

  it('an accountant reads and cannot add', async () => {
    openHours({ role: 'accountant' });
    expect(await screen.findByRole('cell', { name: '2.5' })).toBeInTheDocument();
    expect(screen.queryByRole('form')).not.toBeInTheDocument();
  });
});
