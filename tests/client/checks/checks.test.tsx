import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { type ChecksAnswer, checksApi, type Finding } from '#shared/contracts/checks.ts';
import { itemAddress } from '../../../src/features/checks/item-address.ts';
import { DataCheckPage } from '../../../src/pages/data-check.tsx';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

afterEach(() => vi.unstubAllGlobals());

const MALIBU = { id: idOf('m'), tag: 'P-12', name: '2015 Malibu' };
const PLAIN = { rebuild: MALIBU, entryIds: [], importId: null, on: null, cents: null, text: null, isSettled: false };

const twice: Finding = {
  kind: 'receipt twice',
  grade: 'wrong',
  answers: ['year', 'overruns'],
  count: 1,
  settledCount: 0,
  among: null,
  cents: 12_345,
  items: [
    { ...PLAIN, key: 'a.b', entryIds: [idOf('a'), idOf('b')], on: '2025-02-03', cents: 12_345, text: 'Larkfield hood' },
  ],
};
const noEstimate: Finding = {
  kind: 'no estimate',
  grade: 'left out',
  answers: ['overruns', 'contingency'],
  count: 1,
  settledCount: 0,
  among: 57,
  cents: null,
  items: [{ ...PLAIN, key: MALIBU.id }],
};

function serve(findings: Finding[], { role = 'owner' as 'owner' | 'accountant', rebuildCount = 60 } = {}) {
  let now = findings;
  return fakeServer([
    signedIn(buildSession(role)),
    on(checksApi.show, (): ChecksAnswer => {
      return { asOf: '2026-06-15', rebuildCount, finishedCount: 57, findings: now };
    }),
    on(checksApi.settle, ({ body }) => {
      if (body.key === 'gone')
        throw new Refusal({ status: 422, detail: 'This does not stand on the data check any more.' });
      now = now.map((one) => ({
        ...one,
        count: one.count + (one.kind === body.kind ? (body.isSettled ? -1 : 1) : 0),
        settledCount: one.settledCount + (one.kind === body.kind ? (body.isSettled ? 1 : -1) : 0),
        items: one.items.map((item) => (item.key === body.key ? { ...item, isSettled: body.isSettled } : item)),
      }));
      return { kind: body.kind, key: body.key, isSettled: body.isSettled };
    }),
  ]);
}

const show = () =>
  showPage(<DataCheckPage />, { path: '/s/:shopId/data-check', address: `/s/${idOf('s')}/data-check` });

test('says first what may be wrong, then what is left out, each with its answers and the way to mend it', async () => {
  serve([twice, noEstimate]);
  show();
  expect(await screen.findByText(/may make a figure wrong/)).toHaveTextContent(
    '1 thing may make a figure wrong; 1 gap keeps rebuilds out of an answer.',
  );
  const wrong = screen.getByRole('heading', { name: 'Figures may be wrong' }).closest('section') as HTMLElement;
  expect(within(wrong).getByText(/counts twice/)).toBeVisible();
  expect(within(wrong).getByText(/void the one too many/)).toBeVisible();
  expect(within(wrong).getByRole('link', { name: 'Overruns' })).toHaveAttribute(
    'href',
    expect.stringMatching(/overruns$/),
  );
  const left = screen.getByRole('heading', { name: 'Left out of an answer' }).closest('section') as HTMLElement;
  expect(left).toHaveTextContent('No estimate: 1 of 57 rebuilds');
});

test('leads to the very entries', async () => {
  serve([twice]);
  show();
  await userEvent.click(await screen.findByText('The same bill twice'));
  expect(screen.getByRole('link', { name: 'P-12 · 2015 Malibu' })).toHaveAttribute(
    'href',
    expect.stringContaining(`/ledger?rebuild=${MALIBU.id}&from=2025-02-03&to=2025-02-03`),
  );
});

test('takes off what somebody finds right, and brings it back', async () => {
  serve([twice]);
  show();
  await userEvent.click(await screen.findByText('The same bill twice'));
  await userEvent.click(screen.getByRole('button', { name: 'P-12 · 2015 Malibu is right as it is' }));
  expect(await screen.findByRole('heading', { name: 'Said to be right' })).toBeVisible();
  expect(screen.getByText(/Nothing stands in the way/)).toBeVisible();
  await userEvent.click(screen.getByText('The same bill twice'));
  await userEvent.click(screen.getByRole('button', { name: 'Look at P-12 · 2015 Malibu again' }));
  expect(await screen.findByRole('heading', { name: 'Figures may be wrong' })).toBeVisible();
});

test('says why when it was mended meanwhile', async () => {
  const [item] = twice.items;
  serve([{ ...twice, items: item ? [{ ...item, key: 'gone' }] : [] }]);
  show();
  await userEvent.click(await screen.findByText('The same bill twice'));
  await userEvent.click(screen.getByRole('button', { name: /is right as it is/ }));
  expect(await screen.findByRole('alert')).toHaveTextContent('does not stand on the data check any more');
});

test('an accountant reads and settles nothing', async () => {
  serve([twice], { role: 'accountant' });
  show();
  await userEvent.click(await screen.findByText('The same bill twice'));
  expect(screen.queryByRole('button', { name: /is right/ })).toBeNull();
});

test('an empty shop learns what will stand here', async () => {
  serve([], { rebuildCount: 0 });
  show();
  expect(await screen.findByRole('heading', { name: 'Gaps and slips in the books will stand here' })).toBeVisible();
});

test.each([
  ['a file', 'rows put aside', { ...PLAIN, rebuild: null, importId: idOf('f') }, `import/${idOf('f')}`],
  ['hours', 'long day', { ...PLAIN, on: '2026-02-02' }, `hours?rebuild=${MALIBU.id}&from=2026-02-02&to=2026-02-02`],
  ['overhead', 'receipt twice', { ...PLAIN, rebuild: null, entryIds: [idOf('a')] }, 'ledger?rebuild=none'],
  ['entries without a day', 'entry without a day', PLAIN, `ledger?rebuild=${MALIBU.id}&dated=no`],
  ['a rebuild', 'no class', PLAIN, `rebuilds/${MALIBU.id}`],
] as const)('%s opens where it can be mended', (_, kind, item, address) => {
  expect(itemAddress(kind, { key: 'k', ...item, entryIds: [...item.entryIds] })).toBe(address);
});
