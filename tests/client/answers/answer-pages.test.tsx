import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { answersApi } from '#shared/contracts/answers.ts';
import { OverrunsPage } from '../../../src/pages/overruns.tsx';
import { TimeToSellPage } from '../../../src/pages/time-to-sell.tsx';
import { WhatPaysPage } from '../../../src/pages/what-pays.tsx';
import { openPage, serve } from './open-page.tsx';
import { category, head, idOf, overrunsReply, rebuild, timeToSellReply } from './replies.ts';
import { comparison, group, whatPaysReply } from './what-pays-reply.ts';

afterEach(() => vi.unstubAllGlobals());

const cellsOf = (row: HTMLElement) =>
  within(row)
    .getAllByRole('cell')
    .map((cell) => cell.textContent);

test('what pays: the grid holds value, range and count; too few is gray words; a cell opens its rebuilds', async () => {
  const hail = { class: 'SUV', damage: 'hail' };
  const reply = whatPaysReply({
    cells: comparison([group(hail, 8, 5_200)]),
    classes: comparison([group({ class: 'SUV' }, 8, 5_200)]),
    damages: comparison([group({ damage: 'hail' }, 3, 5_200)]),
  });
  const options = { ...head().filters, classes: [{ id: idOf('SUV'), name: 'SUV', count: 8 }] };
  serve([{ contract: answersApi.whatPays, reply: () => ({ ...reply, filters: options }) }]);
  openPage(<WhatPaysPage />);
  const grid = within(await screen.findByRole('region', { name: /The darker the blue/ }));
  expect(cellsOf(grid.getByRole('row', { name: /^SUV/ }))).toEqual([
    '$52 /h$47 to $578 rebuilds',
    '$52 /h$47 to $578 rebuilds',
  ]);
  expect(cellsOf(grid.getByRole('row', { name: /^All classes/ }))[0]).toBe('too few yet3 rebuilds');
  const cell = grid.getAllByRole('link', { name: /\$52/ })[0];
  expect(cell).toHaveAttribute('href', `/s/one/rebuilds?class=${idOf('SUV')}&damage=${idOf('hail')}`);
});

test('what pays: the other view and the other ranking stand in the address', async () => {
  const fits = {
    cells: comparison([group({ class: 'SUV', damage: 'hail' }, 8, 0.3, 0.1)]),
    classes: comparison([group({ class: 'SUV' }, 8, 0.3, 0.1), group({ class: 'van' }, 4, 0.9, 0.1)]),
  };
  const view = (url: URL) =>
    url.searchParams.get('view') === 'on-cost' ? ('on-cost' as const) : ('per-hour' as const);
  serve([{ contract: answersApi.whatPays, reply: ({ url }) => whatPaysReply(fits, 20, view(url)) }]);
  const { place } = openPage(<WhatPaysPage />, '?by=classes');
  await userEvent.click(await screen.findByRole('radio', { name: 'On cost' }));
  expect(await screen.findByText(/^Kept for each dollar of cost/)).toBeVisible();
  expect(place()).toBe('/s/one/page?by=classes&view=on-cost');
  const ranking = within(screen.getByRole('table', { name: /^Kinds of wreck in order/ }));
  const [, first, second] = ranking.getAllByRole('row');
  expect(first).toHaveTextContent('1SUV8');
  // A van did better on four: not ranked, and after those that are.
  expect(second).toHaveTextContent(/^Van4too few yet/);
});

test('overruns: each category with its plan, what nobody planned apart, and links to its entries', async () => {
  const parts = { ...category('parts', 9, 0.2), unbudgetedCount: 2, unbudgetedCents: 30_000 };
  serve([{ contract: answersApi.overruns, reply: () => overrunsReply(9, 0.2, [parts, category('tow', 3, 2)]) }]);
  openPage(<OverrunsPage />);
  const table = within(await screen.findByRole('table', { name: 'Overrun by category' }));
  const row = table.getByRole('row', { name: /^Parts/ });
  expect(cellsOf(row)).toEqual(['9', '$9,000', '$10,800', '+$1,800', '+20%', '+20%', '$300 on 2']);
  expect(within(row).getByRole('link')).toHaveAttribute('href', `/s/one/ledger?category=${idOf('parts')}`);
  expect(table.getByRole('row', { name: /^Tow/ })).toHaveTextContent('too few yet');
});

test('overruns: a step of one category shows by year, and what rests on too few is gray', async () => {
  const rate = (year: number, n: number, pooled: number) => ({ year, n, pooled, isThin: n < 5 });
  const paint = {
    ...category('paint', 15, 0.2),
    years: [rate(2023, 4, 0.9), rate(2024, 9, 0.34), rate(2025, 6, -0.02)],
  };
  serve([{ contract: answersApi.overruns, reply: () => overrunsReply(15, 0.2, [paint]) }]);
  openPage(<OverrunsPage />);
  const table = within(await screen.findByRole('table', { name: 'Overrun of each category by year' }));
  expect(cellsOf(table.getByRole('row', { name: /^Paint/ }))).toEqual(['+90% 4', '+34% 9', '−2% 6']);
  expect(table.getByText('+90%')).toHaveClass('text-soft');
});

test('time to sell: the unsold stand in a list with age and money, and count in the figures', async () => {
  const unsold = {
    ...rebuild('B-053'),
    stage: 'listed' as const,
    boughtOn: '2026-01-08',
    listedOn: '2026-04-21',
    daysSinceBought: 326,
    daysListed: 223,
    askingCents: 825_000,
    tiedUpCents: 758_635,
  };
  const ages = [0, 31, 91, 181, 366].map((fromDays) => {
    const isIts = fromDays === 181;
    return { fromDays, count: isIts ? 1 : 0, cents: isIts ? 758_635 : 0, oldest: isIts ? rebuild('B-053') : null };
  });
  const inHand = { on: '2026-11-30', total: 1, cents: 758_635, ages, rebuilds: [unsold] };
  const reply = { ...timeToSellReply(), unsold: inHand };
  serve([{ contract: answersApi.timeToSell, reply: () => reply }]);
  openPage(<TimeToSellPage />);
  const list = within(await screen.findByRole('table', { name: 'Unsold rebuilds' }));
  expect(cellsOf(list.getByRole('row', { name: /B-053/ }))).toEqual(['Listed', '223', '326', '$8,250', '$7,586']);
  const old = within(screen.getByRole('table', { name: 'How old the money is' }));
  expect(old.getAllByRole('row')).toHaveLength(2);
  expect(old.getByRole('row', { name: /^181 to 365/ })).toHaveTextContent('B-053');
  const all = within(screen.getByRole('table', { name: 'Days to sell by class' })).getByRole('row', { name: /^All/ });
  expect(cellsOf(all)).toEqual(['12', '10', '2', '28', '20 to 41', '46%20% to 70%', '21%5% to 40%', 'not that far']);
});

test('time to sell: the product can be done again from its first days', async () => {
  serve([{ contract: answersApi.timeToSell, reply: () => timeToSellReply() }]);
  openPage(<TimeToSellPage />);
  await userEvent.click(await screen.findByText('How this is worked out'));
  const days = screen.getByRole('table', { name: 'The first selling days' });
  expect(cellsOf(within(days).getAllByRole('row')[1] ?? days)).toEqual(['28', '12', '6', '0.5000']);
});

test('every stage stands with its days, and what stood in another order is counted', async () => {
  const stage = { n: 8, oddCount: 0, median: 7, q10: 4, q90: 11, isThin: false };
  const stages = [
    { ...stage, stage: 'haul' as const },
    { ...stage, stage: 'listing' as const, oddCount: 3, n: 4, isThin: true },
  ];
  serve([{ contract: answersApi.timeToSell, reply: () => ({ ...timeToSellReply(), stages }) }]);
  openPage(<TimeToSellPage />);
  const table = within(await screen.findByRole('table', { name: 'Days in each stage' }));
  expect(cellsOf(table.getByRole('row', { name: /^Fetching it/ }))).toEqual(['7 days', '4 and 11']);
  expect(table.getByRole('row', { name: /^Getting it listed/ })).toHaveTextContent(
    /3 in another order left out.*too few yet/,
  );
});

test('the old sheet stands beside the answer; its switch is in the address and says what it leaves out', async () => {
  const reply = { ...overrunsReply(9, 0.2), soldOnly: { n: 7, pooled: 0.25 } };
  const asked = serve([{ contract: answersApi.overruns, reply: () => reply }]);
  const { place } = openPage(<OverrunsPage />, '?seen=no');
  expect(await screen.findByText(/^An old sheet, with sold ones only, would have said \+25%/)).toBeVisible();
  await userEvent.click(screen.getByRole('link', { name: 'Count this page so' }));
  expect(place()).toBe('/s/one/page?seen=no&exits=sold');
  expect(await screen.findByRole('status')).toHaveTextContent('sold ones only');
  expect(asked.at(-1)?.url.search).toBe('?seen=no&exits=sold');
  await userEvent.click(screen.getByRole('link', { name: 'Count every rebuild' }));
  expect(place()).toBe('/s/one/page?seen=no');
});

test('how it is worked out ends with rows used and left out, what one rebuild changes, and the definition', async () => {
  const reply = {
    ...overrunsReply(9, 0.2),
    leftOut: [{ reason: 'no estimate' as const, count: 3, rebuilds: [rebuild('B-001')] }],
    withoutOne: { rebuild: rebuild('B-047'), value: 0.3536 },
  };
  serve([{ contract: answersApi.overruns, reply: () => reply }]);
  openPage(<OverrunsPage />);
  await userEvent.click(await screen.findByText('How this is worked out'));
  expect(screen.getByText(/^Rows used: 9 rebuilds\. Left out: 3 no estimate/)).toBeVisible();
  expect(screen.getByText(/without/)).toHaveTextContent(
    'One rebuild changes this: without B-047 the overrun of all together would be +35.36%.',
  );
  expect(screen.getByRole('link', { name: 'The definition in full' })).toHaveAttribute(
    'href',
    '/s/one/definitions#overrun',
  );
});
