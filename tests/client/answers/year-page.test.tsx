import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { answersApi } from '#shared/contracts/answers.ts';
import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import { YearPage } from '../../../src/pages/year.tsx';
import { openPage, problem, serve } from './open-page.tsx';
import { head, rebuild, yearReply } from './replies.ts';

afterEach(() => vi.unstubAllGlobals());

const sold: YearAnswer['rebuilds'][number] = {
  ...rebuild('B-061'),
  className: 'midsize car',
  damageName: 'rear',
  isSeen: true,
  exitKind: 'sold',
  exitOn: '2026-11-14',
  boughtOn: '2026-06-01',
  daysHeld: 166,
  purchaseCents: 400_000,
  workCents: 218_000,
  costCents: 618_000,
  proceedsCents: 990_000,
  keptCents: 372_000,
  ownSeconds: 96 * 3600,
  keptPerHourCents: 3875,
  annualReturn: 1.9,
  lateCents: 28_200,
  gap: { lockedCents: 200_000, actualCents: 218_000, surpriseCents: 6_000, overrun: 0.09 },
};

const year = (reply: (asked: string | null) => YearAnswer | Response) =>
  serve([{ contract: answersApi.year, reply: ({ url }) => reply(url.searchParams.get('year')) }]);

test('answers in one sentence, and proves it with rows that open their rebuild', async () => {
  year(() => yearReply({ rebuilds: [sold], rebuildTotal: 1 }));
  openPage(<YearPage />);
  expect(await screen.findByText('$18,420', { selector: 'mark' })).toBeInTheDocument();
  expect(document.title).toBe('Year · Panelgap');
  const table = screen.getByRole('table', { name: 'Rebuilds that left in 2026' });
  const row = within(table).getByRole('row', { name: /B-061/ });
  expect(within(row).getByRole('link')).toHaveAttribute('href', `/s/one/rebuilds/${sold.id}`);
  expect(row).toHaveTextContent('$3,720');
  expect(row).toHaveTextContent('late bills $282');
  expect(
    within(row).getByRole('img', { name: 'Planned $2,000, spent $2,180: $180 over; $60 of it surprises' }),
  ).toBeVisible();
});

test('the year stands in the address', async () => {
  const asked = year((wanted) => yearReply(wanted ? { year: Number(wanted), isRunning: false } : {}));
  const { place } = openPage(<YearPage />);
  await userEvent.selectOptions(await screen.findByLabelText('Year'), '2025');
  expect(await screen.findByRole('heading', { name: 'Did the work pay in 2025?' })).toBeVisible();
  expect(place()).toBe('/s/one/page?year=2025');
  expect(asked.at(-1)?.url.search).toBe('?year=2025');
  await userEvent.selectOptions(screen.getByLabelText('Year'), '2026');
  expect(place()).toBe('/s/one/page');
});

test('a year that cannot be read is the running one', async () => {
  const asked = year(() => yearReply());
  openPage(<YearPage />, '?year=soon');
  await screen.findByLabelText('Year');
  expect(asked.map(({ url }) => url.search)).toEqual(['']);
});

test('how it is worked out holds the shop’s own figures, so that the sum can be done again', async () => {
  year(() => yearReply());
  openPage(<YearPage />);
  await userEvent.click(await screen.findByText('How this is worked out'));
  expect(screen.getByText(/\$96,800\.00 − \$78,380\.00 − \$0\.00 − \$0\.00 =/)).toHaveTextContent('$18,420.00');
  expect(screen.getByText(/÷ 853 h/)).toHaveTextContent('$18,420.00 ÷ 853 h = $21.59, over 9 rebuilds.');
});

test('what is left out stands with its reason, and leads to each', async () => {
  year(() => yearReply({ leftOut: [{ reason: 'purchase not known', count: 1, rebuilds: [rebuild('B-007')] }] }));
  openPage(<YearPage />);
  await userEvent.click(await screen.findByText('1 left out'));
  expect(screen.getByRole('link', { name: 'B-007 · 2015 midsize sedan' })).toBeVisible();
});

test('an empty shop learns what will stand here and is led to its first import', async () => {
  year(() => yearReply({ ...head(0) }));
  openPage(<YearPage />);
  expect(await screen.findByRole('heading', { name: 'What was kept will stand here' })).toBeVisible();
  expect(screen.getByRole('link', { name: 'Import a spreadsheet' })).toHaveAttribute('href', '/s/one/import');
});

test('who may not import is not offered it', async () => {
  year(() => yearReply({ ...head(0) }));
  openPage(<YearPage />, '', 'accountant');
  await screen.findByRole('heading', { name: 'What was kept will stand here' });
  expect(screen.queryByRole('link', { name: 'Import a spreadsheet' })).not.toBeInTheDocument();
});

test('what went wrong is said, and trying again gets the answer', async () => {
  let isDown = true;
  year(() => (isDown ? problem(400, 'That did not work', 'The year is not one of the shop’s.') : yearReply()));
  openPage(<YearPage />);
  expect(await screen.findByRole('alert')).toHaveTextContent('The year is not one of the shop’s.');
  isDown = false;
  await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
  expect(await screen.findByText('$18,420', { selector: 'mark' })).toBeInTheDocument();
});
