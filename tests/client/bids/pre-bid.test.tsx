import { configure, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { bidsApi } from '#shared/contracts/bids.ts';
import type { Role } from '#shared/vocabulary.ts';
import { keptNames } from '../../../src/lib/kept.ts';
import { PreBidPage } from '../../../src/pages/pre-bid.tsx';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';
import { buildBasis, buildBid, buildPast } from './replies.ts';

const PATH = '/s/:shopId/pre-bid/:bidId?';
const HOME = `/s/${idOf('s')}/pre-bid`;

// A busy machine is no failure.
configure({ asyncUtilTimeout: 10_000 });
beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

type Routes = Parameters<typeof fakeServer>[0];

function open(routes: Routes = [], { address = HOME, role = 'owner' }: { address?: string; role?: Role } = {}) {
  const server = fakeServer([
    signedIn(buildSession(role)),
    ...routes,
    on(bidsApi.basis, () => buildBasis()),
    on(bidsApi.get, () => buildBid()),
  ]);
  return { ...server, page: showPage(<PreBidPage />, { path: PATH, address }) };
}

const answer = () => document.querySelector('.answer')?.textContent;
const field = (label: string) => screen.findByLabelText(label);
const type = async (label: string, text: string) => {
  const found = await field(label);
  await userEvent.clear(found);
  await userEvent.click(found);
  await userEvent.paste(text);
};

/** The worked example, typed. */
async function typeExample() {
  await type('What you call it', 'Lot 14');
  await type('Sale expected', '11,600');
  await type('Parts', '2100');
  await type('Own hours', '60');
  await type('Paid help costs', '700');
  await type('Days, bought to sold', '83');
}

test('the worked example of the trade comes to 3,950, and nothing is asked while it is typed', async () => {
  const { asked } = open();
  await typeExample();
  expect(answer()).toBe('Walk away above $3,950.');
  expect(
    screen.getAllByText(/27% and \$930 .* set to hold 4 in 5\. Based on 31 finished rebuilds of every kind/),
  ).not.toHaveLength(0);
  const moves = screen.getByRole('table', { name: 'How the bid moves' });
  const less = within(moves).getByRole('row', { name: /the sale is \$500 less/ });
  expect(less).toHaveTextContent('$3,500');
  expect(less).toHaveTextContent('−$450');
  expect(asked).toEqual([]);
});

test('the plan starts from past rebuilds, with the shop’s own bias beside each field', async () => {
  open();
  await userEvent.click(await screen.findByRole('button', { name: 'Start from 12 rebuilds' }));
  expect(await field('Parts')).toHaveValue('1800');
  expect(await field('Own hours')).toHaveValue('40');
  expect(await field('Hours of paid help')).toHaveValue('20');
  expect(screen.queryByLabelText('Tow')).not.toBeInTheDocument();
  expect(screen.getByText('You usually end 17% over, on 41: $2,106')).toBeInTheDocument();
});

test('what cannot be read is marked where it was typed, and the bid waits for it', async () => {
  open();
  await type('Sale expected', '11,600');
  await type('Parts', '21oo');
  expect(await field('Parts')).toBeInvalid();
  expect(screen.getByText('“21oo” cannot be read as an amount.')).toBeInTheDocument();
  expect(answer()).toMatch(/^A field cannot be read yet/);
});

test('no bid is said as such', async () => {
  open();
  await type('Sale expected', '900');
  await type('Parts', '2100');
  expect(answer()).toBe('Do not bid: even as a gift it would not bring what you want.');
  expect(screen.getAllByText(/It is \$[\d,]+ short before any bid\./)).not.toHaveLength(0);
});

test('what is typed stays in the browser until it is kept', async () => {
  const first = open();
  await type('What you call it', 'Lot 9');
  first.page.unmount();
  vi.unstubAllGlobals();
  open();
  expect(await field('What you call it')).toHaveValue('Lot 9');
});

test('a sheet is kept with the figures that were shown', async () => {
  const { asked } = open([on(bidsApi.create, () => ({ bid: buildBid(), agrees: true }))]);
  await typeExample();
  await userEvent.click(screen.getByRole('button', { name: 'Keep it' }));
  expect(await screen.findByRole('button', { name: 'Bought it' })).toBeEnabled();
  expect(asked).toHaveLength(1);
  expect(asked[0]).toContain('"shown":{"repairBudgetCents":359700');
  expect(keptNames(`${idOf('d')}.${idOf('s')}.draft`)).toEqual([]);
});

test('without signal a kept sheet waits in this browser', async () => {
  open();
  await typeExample();
  vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
  await userEvent.click(screen.getByRole('button', { name: 'Keep it' }));
  expect(await screen.findByText(`at /s/${idOf('s')}/pre-bids`)).toBeInTheDocument();
  expect(keptNames(`${idOf('d')}.${idOf('s')}.waiting`)).toHaveLength(1);
});

test('once opened, a kept sheet opens without signal, and says so', async () => {
  const address = `${HOME}/${idOf('b')}`;
  const first = open([], { address });
  expect(await field('What you call it')).toHaveValue('Lot 14');
  first.page.unmount();
  vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
  showPage(<PreBidPage />, { path: PATH, address });
  expect(await field('What you call it')).toHaveValue('Lot 14');
  expect(await screen.findByText('No signal.')).toBeInTheDocument();
  expect(answer()).toBe('Walk away above $3,950.');
});

test('where somebody else was quicker, both versions are shown', async () => {
  const theirs = buildBid({ expectedSaleCents: 1_200_000, version: 5 });
  let reads = 0;
  const { asked } = open(
    [
      on(bidsApi.basis, () => buildBasis()),
      on(bidsApi.get, () => (reads++ === 0 ? buildBid() : theirs)),
      on(bidsApi.change, ({ version }) => {
        if (version !== 5) throw new Refusal({ status: 412, detail: 'It was changed.' });
        return { bid: buildBid({ expectedSaleCents: 1_100_000, version: 6 }), agrees: true };
      }),
    ],
    { address: `${HOME}/${idOf('b')}` },
  );
  await type('Sale expected', '11000');
  await userEvent.click(await screen.findByRole('button', { name: 'Keep changes' }));
  const dialog = await screen.findByRole('dialog');
  await userEvent.click(within(dialog).getByRole('button', { name: 'Save mine over it' }));
  await waitFor(() => expect(asked).toHaveLength(2));
  await waitFor(() => expect(screen.queryByRole('button', { name: 'Keep changes' })).not.toBeInTheDocument());
});

test('the fee table is changed on the sheet, and kept for the shop', async () => {
  const { asked } = open([on(bidsApi.changeFeeTable, ({ body }) => ({ ...body, version: 4 }))]);
  await typeExample();
  await userEvent.click(screen.getByRole('button', { name: 'Fees and bid step' }));
  const dialog = await screen.findByRole('dialog');
  const fee = within(dialog).getByLabelText('Fee, step 1');
  await userEvent.clear(fee);
  await userEvent.type(fee, 'x');
  expect(fee).toBeInvalid();
  await userEvent.clear(fee);
  await userEvent.type(fee, '159');
  await userEvent.click(within(dialog).getByRole('button', { name: 'Use, and keep for the shop' }));
  await waitFor(() => expect(asked).toHaveLength(1));
  expect(asked[0]).toContain('"feeSteps":[[200000,15900],[400000,72900]]');
  expect(answer()).toBe('Walk away above $3,950.');
});

test('bought: the hammer and the day make it a rebuild', async () => {
  const { asked } = open(
    [
      on(bidsApi.buy, () => ({
        bid: buildBid({ state: 'bought', rebuildId: idOf('r'), rebuildTag: 'B-63' }),
        rebuildId: idOf('r'),
      })),
    ],
    { address: `${HOME}/${idOf('b')}` },
  );
  await userEvent.click(await screen.findByRole('button', { name: 'Bought it' }));
  await userEvent.click(await screen.findByRole('button', { name: 'Make it a rebuild' }));
  expect(screen.getByText('Type what the hammer fell at.')).toBeInTheDocument();
  await type('Tag', 'B-63');
  await type('The hammer fell at', '3,900');
  await userEvent.click(screen.getByRole('button', { name: 'Make it a rebuild' }));
  expect(await screen.findByText(`at /s/${idOf('s')}/rebuilds/${idOf('r')}`)).toBeInTheDocument();
  expect(asked[0]).toContain('{"tag":"B-63","boughtOn":"2026-06-15","hammerCents":390000}');
});

test('the walk round lists the shop’s own surprises above the trade’s checks', async () => {
  open();
  await userEvent.selectOptions(await field('Damage'), 'Front');
  const own = await screen.findByRole('checkbox', {
    name: /^Parts\s*6 of 20 had one here \(15% to 52%\); it came to \$520/,
  });
  const common = screen.getByRole('checkbox', { name: /^Radiator, condenser or fan/ });
  expect(own.compareDocumentPosition(common) & Node.DOCUMENT_POSITION_FOLLOWING).toBeTruthy();
  await userEvent.click(common);
  expect(common).toBeChecked();
});

test('where the past is cut, what looks back at it says so', async () => {
  const past = [buildPast()];
  open([on(bidsApi.basis, () => buildBasis({ past, pastTotal: 330 }))]);
  await typeExample();
  const cut = await screen.findAllByText(/Looked at: the last 1 that left, of 330\./);
  expect(cut).toHaveLength(2);
});

test('a look at a car warns of what hides behind its damage', async () => {
  open();
  await userEvent.selectOptions(await field('Damage'), 'Front');
  const cautions = await screen.findByRole('list', { name: 'Cautions' });
  expect(cautions).toHaveTextContent('Air conditioning: refrigerant');
});

test('an accountant may try figures, and keeps nothing', async () => {
  open([], { role: 'accountant' });
  await typeExample();
  expect(answer()).toBe('Walk away above $3,950.');
  expect(screen.queryByRole('button', { name: 'Keep it' })).not.toBeInTheDocument();
});
