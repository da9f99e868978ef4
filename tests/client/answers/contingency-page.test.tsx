import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { openContingency, rule } from './open-contingency.tsx';
import { contingencyReply, pastBids } from './contingency-replies.ts';
import { idOf, rebuild } from './replies.ts';

afterEach(() => vi.unstubAllGlobals());

test('what is in force and how it has done', async () => {
  openContingency({ inForce: rule() });
  expect(
    await screen.findByText(
      'In force for 2026: 18%, adopted 3 Jan 2026. It covered 6 of 9 bought since and finished, short by $1,200 in all; 2 are not finished.',
    ),
  ).toBeVisible();
  expect(screen.getByRole('link', { name: 'Did the last rule hold?' })).toHaveAttribute(
    'href',
    '/s/one/contingency/review',
  );
});

test('the kind of rule stands in the address and the page speaks of it', async () => {
  const { place } = openContingency();
  await userEvent.click(await screen.findByRole('radio', { name: 'Percentage and sum' }));
  expect(place()).toBe('/s/one/page?rule=two-part');
  expect(screen.getByText(/for known work costing more and/)).toBeVisible();
  await userEvent.click(screen.getByText('How this is worked out'));
  expect(screen.getByText(/Without any one rebuild the percentage lies between 11% and 13%/)).toBeVisible();
});

test('a car asks for its own rule, with what that is based on and why', async () => {
  const { asked } = openContingency();
  await userEvent.selectOptions(await screen.findByLabelText('Class'), 'SUV (41)');
  await userEvent.selectOptions(screen.getByLabelText('Seen before buying'), 'unseen');
  expect(
    await screen.findByText(/Based on 12 rebuilds of this class and damage, seen or unseen alike; set to hold 4 in 5/),
  ).toBeVisible();
  expect(Object.fromEntries(asked.at(-1)?.url.searchParams ?? [])).toEqual({
    level: '4/5',
    class: idOf('suv'),
    seen: 'no',
  });
  await userEvent.click(screen.getByText('Why these rebuilds'));
  const rungs = within(screen.getByRole('table', { name: 'Groups of past rebuilds tried' }));
  expect(rungs.getByRole('row', { name: /^Class, damage and seen/ })).toHaveTextContent(
    'taken: one percentagenumber 11 of 12number 8 of 8, under nine',
  );
  expect(rungs.getByRole('row', { name: /^Damage and seen/ })).toHaveTextContent('taken: percentage and sum');
});

test('past bids: counts and money, the good cars with the bad ones', async () => {
  const skipped = {
    count: 5,
    lostCount: 4,
    lostCents: -220_000,
    gainedCount: 1,
    gainedCents: 90_000,
    timedCount: 5,
    ownSeconds: 360_000,
    timedCents: -130_000,
    rebuilds: [
      {
        ...rebuild('B-047'),
        paidCents: 542_500,
        limitCents: 343_200,
        reserveCents: 360_000,
        profitCents: -50_800,
        ownSeconds: 36_000,
      },
    ],
  };
  openContingency({ answer: { pastBids: { percent: pastBids({ skipped }), twoPart: pastBids() } } });
  expect(
    await screen.findByText('You would have skipped 5 of 33: 4 that lost $2,200 and 1 that made $900.'),
  ).toBeVisible();
  expect(screen.getByText('Together they lost $1,300.')).toBeVisible();
  expect(screen.getByText('They took 100 own hours: −$13/h, where $25/h is wanted.')).toBeVisible();
  await userEvent.click(screen.getByText(/5 cars it would have skipped/));
  const table = within(screen.getByRole('table', { name: 'Cars that the rule would have skipped' }));
  expect(table.getByRole('link', { name: /B-047/ })).toHaveAttribute('href', `/s/one/rebuilds/${idOf('B-047')}`);
});

test('the rows in order mark the one taken, so that the sum can be done again', async () => {
  const row = (tag: string, place: number, overrunCents: number) => ({
    ...rebuild(tag),
    exitOn: '2026-01-01',
    year: 2026,
    estimateCents: 100_000,
    overrunCents,
    overrun: overrunCents / 100_000,
    place,
    knownCount: 0,
    uplift: null,
    asked: null,
    twoPart: null,
  });
  const percent = { ...contingencyReply().percent, n: 3, k: 2 };
  openContingency({ answer: { percent, trail: [row('B-2', 3, 30_000), row('B-1', 1, 5_000), row('B-3', 2, 10_000)] } });
  await userEvent.click(await screen.findByText('How this is worked out'));
  expect(screen.getByText('The 3 in order, number 2 marked.')).toBeVisible();
  const rows = within(screen.getByRole('table', { name: 'Overruns in order' }))
    .getAllByRole('row')
    .slice(1);
  expect(rows.map((one) => one.textContent)).toEqual([
    '1B-1$1,000.00$50.00+5.00%',
    '2B-3$1,000.00$100.00+10.00%',
    '3B-2$1,000.00$300.00+30.00%',
  ]);
  expect(rows.map((one) => one.hasAttribute('data-taken'))).toEqual([false, true, false]);
});

test('the level stands in the address', async () => {
  const { asked, place } = openContingency();
  await userEvent.click(await screen.findByRole('radio', { name: '9 in 10' }));
  expect(place()).toBe('/s/one/page?level=9-10');
  expect(asked.at(-1)?.url.searchParams.get('level')).toBe('9/10');
});

test('the sum can be done again: rank, the rebuild it takes, and the rounding', async () => {
  openContingency();
  await userEvent.click(await screen.findByText('How this is worked out'));
  const line = screen.getByText(/raised, is k = 34/);
  expect(line).toHaveTextContent(
    'Number 34 is B-033 · 2015 midsize sedan: $1,390.20 over $6,000.00 = 23.17%, raised to 24%.',
  );
  expect(within(line).getByRole('link')).toHaveAttribute('href', `/s/one/rebuilds/${idOf('B-033')}`);
});

test('the sheet for the wall reads the cushion off plans', async () => {
  openContingency();
  await screen.findByRole('button', { name: 'Print the sheet' });
  const card = screen.getByRole('heading', { name: 'Contingency rule for 2027', hidden: true }).parentElement;
  expect(card).toHaveTextContent('Add 24% to every locked repair estimate.');
  expect(card).toHaveTextContent('$1,000$240$1,240');
  expect(card).toHaveTextContent('A proposal, not adopted.');
});
