import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { type EntryRow, ledgerApi } from '#shared/contracts/ledger.ts';
import { rebuildsApi } from '#shared/contracts/rebuilds.ts';
import { shopApi } from '#shared/contracts/shop.ts';
import type { Role } from '#shared/vocabulary.ts';
import { LedgerPage } from '../../../src/pages/ledger.tsx';
import { buildEntry, LISTS, NAMES } from '../../support/books-replies.ts';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

afterEach(() => vi.unstubAllGlobals());

/** A ledger that keeps what is written to it. `refuse` is asked before each new entry. */
async function openLedger(options: { entries?: EntryRow[]; role?: Role; refuse?: () => void } = {}) {
  const entries = [...(options.entries ?? [])];
  const keys: (string | null)[] = [];
  const sum = () => entries.filter((entry) => !entry.voidedAt).reduce((total, entry) => total + entry.cents, 0);
  const server = fakeServer([
    signedIn(buildSession(options.role ?? 'owner')),
    on(shopApi.lists, () => LISTS),
    on(rebuildsApi.names, () => NAMES),
    on(ledgerApi.list, () => ({
      rows: entries,
      totals: { count: entries.length, cents: sum(), freeValueCents: 0 },
      next: null,
    })),
    on(ledgerApi.get, ({ params }) => ({
      ...entries.find(({ id }) => id === params.entryId)!,
      source: null,
      shares: [],
    })),
    on(ledgerApi.create, ({ body, key }) => {
      keys.push(key);
      options.refuse?.();
      const entry = buildEntry({ vendor: null, what: null, ...body, id: idOf('n') } as Partial<EntryRow>);
      entries.unshift(entry);
      return entry;
    }),
    on(ledgerApi.update, ({ params, body, version }) => {
      const at = entries.findIndex(({ id }) => id === params.entryId);
      if (entries[at]?.version !== version) throw new Refusal({ status: 412, detail: 'Someone changed this.' });
      entries[at] = { ...entries[at], ...body, version: version + 1 } as EntryRow;
      return entries[at];
    }),
    on(ledgerApi.void, ({ params, body }) => {
      const at = entries.findIndex(({ id }) => id === params.entryId);
      entries[at] = { ...entries[at]!, voidedAt: '2026-06-15T10:00:00Z', voidReason: body.reason, version: 2 };
      return entries[at];
    }),
  ]);
  showPage(<LedgerPage />, { path: '/s/:shopId/ledger', address: `/s/${idOf('s')}/ledger` });
  await screen.findByRole('heading', { name: 'What was spent, on what?' });
  return { ...server, entries, keys, user: userEvent.setup({ delay: null }) };
}

const line = async () => within(await screen.findByRole('form', { name: 'Add an entry' }));

async function typeLine(user: ReturnType<typeof userEvent.setup>, amount: string) {
  const form = await line();
  await user.type(form.getByRole('combobox', { name: 'Rebuild' }), '062');
  await user.tab();
  await user.keyboard('par');
  await user.tab();
  await user.keyboard(`${amount}{Tab}door shell{Enter}`);
  return form;
}

describe('the fast line', () => {
  it('takes an entry by the keyboard alone, keeps day, rebuild and category, and goes back to the amount', async () => {
    const { user, asked } = await openLedger();
    const form = await typeLine(user, '1,250.5');
    await screen.findByRole('cell', { name: '$1,250.50' });
    expect(JSON.parse(asked[0]?.replace('POST /api/entries ', '') ?? '')).toMatchObject({
      rebuildId: idOf('r'),
      categoryId: idOf('p'),
      datedOn: '2026-06-15',
      cents: 125_050,
      what: 'door shell',
      foreseen: 'foreseen',
      isExtra: false,
    });
    expect(form.getByRole('combobox', { name: 'Rebuild' })).toHaveValue('B-062 · 2014 Orrin Vale');
    expect(form.getByRole('combobox', { name: 'Category' })).toHaveValue('Parts');
    expect(form.getByLabelText('Day')).toHaveValue('2026-06-15');
    expect(form.getByLabelText('What')).toHaveValue('');
    expect(form.getByLabelText('Amount')).toHaveFocus();
    expect(form.getByLabelText('Amount')).toHaveValue('');
  });

  it('says at the field what it cannot read, sends nothing and keeps what was typed', async () => {
    const { user, asked } = await openLedger();
    const form = await typeLine(user, 'about ten');
    expect(await form.findByText('“about ten” cannot be read as an amount.')).toBeInTheDocument();
    expect(form.getByLabelText('Amount')).toHaveValue('about ten');
    expect(asked).toEqual([]);
  });

  it('keeps a line that did not get through, and sends it again under the same key', async () => {
    let isDown = true;
    const refuse = () => {
      if (isDown) throw new Refusal({ status: 503, detail: 'The server is busy.' });
    };
    const { user, keys } = await openLedger({ refuse });
    await typeLine(user, '77');
    const unsent = within(await screen.findByRole('list', { name: 'Not saved yet' }));
    expect(await unsent.findByRole('alert')).toHaveTextContent('The server is busy.');
    expect(unsent.getByText(/77 · door shell/)).toBeInTheDocument();
    isDown = false;
    await user.click(unsent.getByRole('button', { name: 'Try again' }));
    await screen.findByRole('cell', { name: '$77.00' });
    expect(screen.queryByRole('list', { name: 'Not saved yet' })).not.toBeInTheDocument();
    expect(keys[1]).toBe(keys[0]);
  });

  it('takes a saved line back by Undo: void, with the reason', async () => {
    const { user, entries } = await openLedger();
    await typeLine(user, '5');
    await user.click(await screen.findByRole('button', { name: 'Undo' }));
    await waitFor(() => expect(entries[0]?.voidReason).toBe('Undone right after it was added'));
  });

  it('is not there for someone who only reads', async () => {
    await openLedger({ role: 'accountant', entries: [buildEntry()] });
    await screen.findByRole('cell', { name: '$45.00' });
    expect(screen.queryByRole('form')).not.toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /Void/ })).not.toBeInTheDocument();
  });
});

describe('an entry of the list', () => {
  it('is voided with a reason, which is asked for', async () => {
    const { user, entries } = await openLedger({ entries: [buildEntry()] });
    await user.click(await screen.findByRole('button', { name: 'Void door shell, 2026-06-01' }));
    const dialog = within(await screen.findByRole('dialog'));
    await user.click(dialog.getByRole('button', { name: 'Void it' }));
    expect(dialog.getByText('Say why, so that it can be followed later.')).toBeInTheDocument();
    await user.type(dialog.getByLabelText('Why'), 'typed twice{Enter}');
    await waitFor(() => expect(entries[0]?.voidReason).toBe('typed twice'));
    expect(await screen.findByText('void: typed twice')).toBeInTheDocument();
  });

  it('shows both versions when someone was quicker, and saves over theirs only when told to', async () => {
    const { user, entries } = await openLedger({ entries: [buildEntry()] });
    await user.click(await screen.findByRole('button', { name: 'Change door shell, 2026-06-01' }));
    entries[0] = buildEntry({ vendor: 'Their Yard', version: 2 });
    const dialog = within(await screen.findByRole('dialog'));
    await user.clear(dialog.getByLabelText('Vendor'));
    await user.type(dialog.getByLabelText('Vendor'), 'My Yard');
    await user.click(dialog.getByRole('button', { name: 'Save' }));
    const row = await screen.findByRole('row', { name: /Their Yard.*My Yard/ });
    expect(within(row).getByRole('rowheader')).toHaveTextContent('Vendor');
    expect(entries[0]?.vendor).toBe('Their Yard');
    await user.click(screen.getByRole('button', { name: 'Save mine over it' }));
    await waitFor(() => expect(entries[0]).toMatchObject({ vendor: 'My Yard', version: 3 }));
  });
});

it('an empty ledger says what will stand there and leads to the import', async () => {
  await openLedger();
  expect(await screen.findByText('Every cost and credit will stand here')).toBeInTheDocument();
  expect(screen.getByRole('link', { name: 'Import a spreadsheet' })).toHaveAttribute('href', `/s/${idOf('s')}/import`);
});
