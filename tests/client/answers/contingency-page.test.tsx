import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { answersApi } from '#shared/contracts/answers.ts';
import { type Rule, rulesApi } from '#shared/contracts/rules.ts';
import type { Role } from '#shared/vocabulary.ts';
import { ContingencyPage } from '../../../src/pages/contingency.tsx';
import { openPage, problem, type Request, serve } from './open-page.tsx';
import { contingencyReply, idOf } from './replies.ts';

afterEach(() => vi.unstubAllGlobals());

const rule = (changes: Partial<Rule> = {}): Rule => ({
  id: idOf('rule'),
  year: 2026,
  revision: 1,
  kind: 'percent',
  level: '4/5',
  percent: 18,
  flatCents: null,
  rebuildCount: 30,
  dataUntil: '2025-12-20',
  evidence: {
    n: 30,
    k: 25,
    guarantee: 25 / 31,
    uplift: 0.174,
    flatCents: null,
    askedPercent: 18,
    askedFlatCents: null,
    covered: 20,
    scored: 24,
    booksVersion: 7,
  },
  note: null,
  review: null,
  adoptedOn: '2026-01-03',
  adoptedAt: '2026-01-03T10:00:00.000Z',
  adoptedByName: 'Dana Whitlock',
  ...changes,
});

type Options = { inForce?: Rule; adopt?: (request: Request) => unknown; role?: Role; search?: string };

function open({ inForce, adopt = () => rule({ year: 2027, percent: 24 }), role = 'owner', search = '' }: Options = {}) {
  const record = {
    n: 9,
    x: 6,
    rate: 0.67,
    lower: 0.35,
    upper: 0.88,
    shortCents: 120_000,
    unusedCents: 1,
    openCount: 2,
  };
  const thisYear = { year: 2026, rule: inForce ? { ...inForce, record } : null };
  const asked = serve([
    { contract: answersApi.contingency, reply: () => contingencyReply({ thisYear }) },
    { contract: rulesApi.list, reply: () => ({ rules: inForce ? [inForce] : [] }) },
    { contract: rulesApi.adopt, reply: adopt },
  ]);
  return { asked, ...openPage(<ContingencyPage />, search, role) };
}

const adoptDialog = async () => {
  await userEvent.click(await screen.findByRole('button', { name: 'Adopt 24% for 2027' }));
  return within(await screen.findByRole('dialog', { name: 'Adopt a rule' }));
};
const posts = (asked: readonly Request[]) => asked.filter(({ method }) => method === 'POST');

test('adopts the percentage for next year, with the rounding said and a key of its own', async () => {
  const { asked } = open();
  const dialog = await adoptDialog();
  expect(dialog.getByText(/23\.17% as taken, raised to a whole percent/)).toBeVisible();
  await userEvent.click(dialog.getByRole('button', { name: 'Adopt 24% for 2027' }));
  await vi.waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
  const [post] = posts(asked);
  expect(post?.body).toEqual({ year: 2027, kind: 'percent', level: '4/5' });
  expect(post?.key).toBeTruthy();
  // The answer and the history are asked for again.
  expect(
    asked
      .slice(-2)
      .map(({ url }) => url.pathname)
      .sort(),
  ).toEqual(['/api/answers/contingency', '/api/rules']);
});

test('this year and two parts can be chosen; what is in force is named before it is replaced', async () => {
  const { asked } = open({ inForce: rule() });
  const dialog = await adoptDialog();
  await userEvent.click(dialog.getByRole('radio', { name: '2026' }));
  await userEvent.click(dialog.getByRole('radio', { name: 'Percentage and sum' }));
  expect(dialog.getByText(/It takes the place of 18% for 2026/)).toBeVisible();
  await userEvent.click(dialog.getByRole('button', { name: 'Adopt 12% and $450 for 2026' }));
  await vi.waitFor(() => expect(posts(asked)[0]?.body).toEqual({ year: 2026, kind: 'two-part', level: '4/5' }));
});

test('a failed try keeps what was chosen and its key; another choice takes another key', async () => {
  let isDown = true;
  const { asked } = open({ adopt: () => (isDown ? problem(409, 'The books have changed') : rule({ year: 2027 })) });
  const dialog = await adoptDialog();
  const adopt = () => userEvent.click(dialog.getByRole('button', { name: /^Adopt/ }));
  await adopt();
  expect(await dialog.findByText('The books have changed')).toBeVisible();
  await adopt();
  isDown = false;
  await userEvent.click(dialog.getByRole('radio', { name: '2026' }));
  await adopt();
  const keys = posts(asked).map(({ key }) => key);
  expect(keys).toHaveLength(3);
  expect(keys[0]).toBe(keys[1]);
  expect(keys[2]).not.toBe(keys[0]);
});

test('what is in force, how it has done, and the history', async () => {
  open({ inForce: rule() });
  expect(
    await screen.findByText(
      'In force for 2026: 18%, adopted 3 Jan 2026. It covered 6 of 9 bought since and finished, short by $1,200 in all; 2 are not finished.',
    ),
  ).toBeVisible();
  const history = within(await screen.findByRole('table', { name: 'Rules adopted' }));
  expect(history.getByRole('row', { name: /2026/ })).toHaveTextContent(
    '30 rebuilds up to 20 Dec 2025rules set this way had covered 20 of 24',
  );
});

test('an accountant reads it all and is offered no adopting', async () => {
  open({ role: 'accountant' });
  expect(await screen.findByRole('button', { name: 'Print the rule card' })).toBeVisible();
  expect(screen.queryByRole('button', { name: /^Adopt/ })).not.toBeInTheDocument();
});

test('a rule is adopted over all rebuilds: not while a filter is set', async () => {
  open({ search: '?from=2024' });
  expect(await screen.findByText(/A rule is adopted over all rebuilds/)).toBeVisible();
  expect(screen.queryByRole('button', { name: /^Adopt/ })).not.toBeInTheDocument();
});

test('the level stands in the address', async () => {
  const { asked, place } = open();
  await userEvent.click(await screen.findByRole('radio', { name: '9 in 10' }));
  expect(place()).toBe('/s/one/page?level=9-10');
  expect(asked.at(-1)?.url.searchParams.get('level')).toBe('9/10');
});

test('the sum can be done again: rank, the rebuild it takes, and the rounding', async () => {
  open();
  await userEvent.click(await screen.findByText('How this is worked out'));
  const line = screen.getByText(/raised, is k = 34/);
  expect(line).toHaveTextContent(
    'Number 34 is B-033 · 2015 midsize sedan: $1,390.20 over $6,000.00 = 23.17%, raised to 24%.',
  );
  expect(within(line).getByRole('link')).toHaveAttribute('href', `/s/one/rebuilds/${idOf('B-033')}`);
});

test('the card for the wall reads the cushion off plans', async () => {
  open();
  await screen.findByRole('button', { name: 'Print the rule card' });
  const card = screen.getByRole('heading', { name: 'Contingency rule for 2027', hidden: true }).parentElement;
  expect(card).toHaveTextContent('Add 24% to every locked repair estimate.');
  expect(card).toHaveTextContent('$1,000$240$1,240');
  expect(card).toHaveTextContent('A proposal, not adopted.');
});
