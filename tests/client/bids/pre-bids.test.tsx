import { configure, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { z } from 'zod';
import { type Bid, bidFieldsSchema, bidsApi } from '#shared/contracts/bids.ts';
import { letWait, sendWaiting, waitingSheets } from '../../../src/features/bids/waiting.ts';
import { mine } from '../../../src/lib/kept.ts';
import { PreBidsPage } from '../../../src/pages/pre-bids.tsx';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';
import { buildBid } from './replies.ts';

const HOME = mine(buildSession());
const PATH = { path: '/s/:shopId/pre-bids', address: `/s/${idOf('s')}/pre-bids` };

// A busy machine is no failure.
configure({ asyncUtilTimeout: 10_000 });
beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

const row = (change: Partial<Bid>) => ({
  ...buildBid(change),
  className: 'small SUV',
  damageName: 'front',
  planCents: 210_000,
  bidCents: 395_000,
});

/** A sheet that waits for a signal. */
function errand(key: string, name = 'Lot 14') {
  const bid = buildBid({ name });
  const body = z.object(bidFieldsSchema.shape).parse(bid);
  const { repairBudgetCents, roomCents, bidCents } = bid.figures;
  return { key, body, shown: { repairBudgetCents, roomCents, bidCents }, changes: null, problem: null };
}

test('kept sheets stand with what became of them', async () => {
  fakeServer([
    signedIn(buildSession()),
    on(bidsApi.list, () => ({
      rows: [
        row({ name: 'Lot 14', state: 'not bought', reason: 'went above the bid', hammerCents: 420_000 }),
        row({
          id: idOf('x'),
          name: 'Lot 21',
          state: 'bought',
          hammerCents: 390_000,
          rebuildId: idOf('r'),
          rebuildTag: 'B-63',
        }),
      ],
      total: 2,
      next: null,
    })),
  ]);
  showPage(<PreBidsPage />, PATH);
  expect(await screen.findByText('Of 2 sheets you bought 1 and let 1 go; 0 open.')).toBeInTheDocument();
  const table = screen.getByRole('table', { name: 'Kept sheets' });
  const gone = within(table).getByRole('row', { name: /Lot 14/ });
  expect(gone).toHaveTextContent('$250 above');
  expect(gone).toHaveTextContent('not bought: went above the bid');
  expect(within(table).getByRole('link', { name: 'B-63' })).toHaveAttribute(
    'href',
    `/s/${idOf('s')}/rebuilds/${idOf('r')}`,
  );
});

test('a shop without a sheet learns what will stand here', async () => {
  fakeServer([signedIn(buildSession()), on(bidsApi.list, () => ({ rows: [], total: 0, next: null }))]);
  showPage(<PreBidsPage />, PATH);
  expect(await screen.findByRole('link', { name: 'Begin a sheet' })).toBeInTheDocument();
});

test('waiting sheets are sent in order with their keys, and stop where there is no signal', async () => {
  const keys: (string | null)[] = [];
  letWait(HOME, errand('key-one-1'));
  letWait(HOME, errand('key-two-2', 'Lot 15'));
  vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
  expect(await sendWaiting(HOME)).toBe(0);
  expect(waitingSheets(HOME)).toHaveLength(2);
  fakeServer([
    on(bidsApi.create, ({ key }) => {
      keys.push(key);
      return { bid: buildBid(), agrees: true };
    }),
  ]);
  expect(await sendWaiting(HOME)).toBe(2);
  expect(keys).toEqual(['key-one-1', 'key-two-2']);
  expect(waitingSheets(HOME)).toEqual([]);
});

test('a sheet that the server refuses waits with the reason, and can be sent again', async () => {
  letWait(HOME, errand('key-one-1'));
  let isRefused = true;
  fakeServer([
    signedIn(buildSession()),
    on(bidsApi.list, () => ({ rows: [], total: 0, next: null })),
    on(bidsApi.create, () => {
      if (isRefused) throw new Refusal({ status: 422, detail: 'Its class is gone.' });
      return { bid: buildBid(), agrees: true };
    }),
  ]);
  await sendWaiting(HOME);
  showPage(<PreBidsPage />, PATH);
  expect(await screen.findByText('Not saved: Its class is gone.')).toBeInTheDocument();
  isRefused = false;
  await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
  await waitFor(() => expect(screen.queryByText(/not sent yet/)).not.toBeInTheDocument());
});
