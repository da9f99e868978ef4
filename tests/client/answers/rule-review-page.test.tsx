import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { answersApi } from '#shared/contracts/answers.ts';
import type { RuleReview } from '#shared/contracts/answers-rule-review.ts';
import { rulesApi } from '#shared/contracts/rules.ts';
import type { Role } from '#shared/vocabulary.ts';
import { RuleReviewPage } from '../../../src/pages/rule-review.tsx';
import { openPage, problem, type Request, serve } from './open-page.tsx';
import { idOf } from './replies.ts';
import { gradedRule, noReview, reviewReply } from './rule-replies.ts';

afterEach(() => vi.unstubAllGlobals());

type Options = { reply?: RuleReview; role?: Role; adopt?: (request: Request) => unknown };
function open({ reply = reviewReply(), role = 'owner', adopt = () => gradedRule({ year: 2027 }) }: Options = {}) {
  const asked = serve([
    { contract: answersApi.ruleReview, reply: () => reply },
    { contract: rulesApi.adopt, reply: adopt },
  ]);
  return { asked, ...openPage(<RuleReviewPage />, '', role) };
}
const posts = (asked: readonly Request[]) => asked.filter(({ method }) => method === 'POST');

test('says what was held, what was to be expected, and whether that could be luck', async () => {
  open();
  expect((await screen.findByText('9 of 12', { selector: 'mark' })).parentElement).toHaveTextContent(
    'The rule for 2026 held 9 of 12, where about 10 were to be expected: that could be luck.',
  );
  expect(screen.getByText(/it was not set on any of these/)).toHaveTextContent(
    'between 47% and 91% (roughly 95% sure). Short by $1,200 in all; $3,400 of cushion stayed unused. Two bought under it are not finished',
  );
});

test('too few, or none yet, is said', async () => {
  const record = { ...gradedRule().record, n: 2, x: 2 };
  const grade = { expectedCount: 1.6, chanceOfFew: 1, chanceOfMany: 0.7, verdict: null };
  open({ reply: reviewReply({ record, grade }) });
  expect((await screen.findByText('2 of 2', { selector: 'mark' })).parentElement).toHaveTextContent(
    /were to be expected: too few yet to say/,
  );
});

test('nothing bought under it is finished', async () => {
  const record = { ...gradedRule().record, n: 0, x: 0, rate: null, lower: null, upper: null, openCount: 1 };
  open({ reply: reviewReply({ record, trials: [] }) });
  expect(await screen.findByText(/nothing bought under it is finished/)).toBeVisible();
  expect(screen.getByText(/One bought under it is not finished/)).toBeVisible();
});

test('no rule yet: nothing is judged', async () => {
  open({ reply: noReview() });
  expect(await screen.findByText(/No rule has been adopted up to 2026/)).toBeVisible();
  expect(screen.queryByRole('button', { name: /^Keep/ })).not.toBeInTheDocument();
});

test('one press keeps the rule for the next year, with the review recorded', async () => {
  const { asked } = open();
  await userEvent.click(await screen.findByRole('button', { name: 'Keep 18% for 2027' }));
  await vi.waitFor(() => expect(posts(asked)).toHaveLength(1));
  expect(posts(asked)[0]?.body).toEqual({
    year: 2027,
    kind: 'percent',
    level: '4/5',
    percent: 18,
    reviewedRuleId: idOf('rule'),
  });
  expect(posts(asked)[0]?.key).toBeTruthy();
});

test('one press changes to what the books ask for now; a second try is the same write', async () => {
  let isDown = true;
  const { asked } = open({ adopt: () => (isDown ? problem(503, 'The server is busy') : gradedRule({ year: 2027 })) });
  const change = await screen.findByRole('button', { name: 'Change to 24%' });
  await userEvent.click(change);
  expect(await screen.findByText('The server is busy')).toBeVisible();
  isDown = false;
  await userEvent.click(change);
  await vi.waitFor(() => expect(posts(asked)).toHaveLength(2));
  const [first, second] = posts(asked);
  expect(first?.body).toEqual({ year: 2027, kind: 'percent', level: '4/5', reviewedRuleId: idOf('rule') });
  expect(second?.key).toBe(first?.key);
  expect(screen.getByRole('button', { name: 'Change to 12% and $450' })).toBeVisible();
});

test('an accountant decides nothing', async () => {
  open({ role: 'accountant' });
  expect(await screen.findByText(/Keep it for 2027, or change it/)).toBeVisible();
  expect(screen.queryByRole('button', { name: /^(Keep|Change)/ })).not.toBeInTheDocument();
});

test('the history is a line of grades and a table with who, when and on what', async () => {
  const review = {
    ruleId: idOf('older'),
    year: 2024,
    revision: 1,
    decision: 'kept' as const,
    x: 8,
    n: 9,
    openCount: 0,
    shortCents: 1,
    unusedCents: 1,
  };
  const older = gradedRule({ id: idOf('old'), year: 2025, from: '2025-01-01', to: '2025-12-31', review });
  open({ reply: reviewReply({}, [older]) });
  expect(await screen.findByText('All rules together held 18 of 24.', { selector: 'figcaption' })).toBeVisible();
  const table = within(screen.getByRole('table', { name: 'Rules adopted' }));
  const row = table.getByRole('row', { name: /^2025/ });
  expect(row).toHaveTextContent('9 of 12');
  expect(row).toHaveTextContent('about 10 were to be expected: that could be luck');
  expect(row).toHaveTextContent('30 rebuilds up to 20 Dec 2025rules set this way had covered 20 of 24');
  expect(row).toHaveTextContent('kept after 2024 held 8 of 9');
});

test('the grade can be worked out again', async () => {
  open();
  await userEvent.click(await screen.findByText('How this is worked out'));
  expect(screen.getByText(/It was number 25 of 30 in order of overrun/)).toHaveTextContent(
    'of 12 later ones 12 × 25 ÷ (30 + 1) = 9.7 were to be expected. Held were 9.',
  );
});
