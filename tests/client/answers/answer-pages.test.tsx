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
  expect(cellsOf(grid.getByRole('row', { name: /^SUV/ }))).toEqual(['$52 /h$47 to $578 rebuilds', '$52 /h8 rebuilds']);
  expect(cellsOf(grid.getByRole('row', { name: /^All classes/ }))[0]).toBe('too few yet3 rebuilds');
  const cell = grid.getAllByRole('link', { name: /\$52/ })[0];
  expect(cell).toHaveAttribute('href', `/s/one/rebuilds?class=${idOf('SUV')}&damage=${idOf('hail')}`);
});

test('what pays: the other view and the other ranking stand in the address', async () => {
  const fits = {
    cells: comparison([group({ class: 'SUV', damage: 'hail' }, 8, 0.3, 0.1)]),
    classes: comparison([group({ class: 'SUV' }, 8, 0.3, 0.1), group({ class: 'van' }, 4, 0.9, 0.1)]),
  };
  serve([{ contract: answersApi.whatPays, reply: () => whatPaysReply(fits) }]);
  const { place } = openPage(<WhatPaysPage />, '?by=classes');
  await userEvent.click(await screen.findByRole('radio', { name: 'Return on cost' }));
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
  const reply = { ...timeToSellReply(), unsold: { on: '2026-11-30', total: 1, cents: 758_635, rebuilds: [unsold] } };
  serve([{ contract: answersApi.timeToSell, reply: () => reply }]);
  openPage(<TimeToSellPage />);
  const list = within(await screen.findByRole('table', { name: 'Unsold rebuilds' }));
  expect(cellsOf(list.getByRole('row', { name: /B-053/ }))).toEqual(['Listed', '223', '326', '$8,250', '$7,586']);
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
