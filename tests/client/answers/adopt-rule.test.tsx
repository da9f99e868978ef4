import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { openContingency, rule } from './open-contingency.tsx';
import { problem, type Request } from './open-page.tsx';

afterEach(() => vi.unstubAllGlobals());

const adoptDialog = async () => {
  await userEvent.click(await screen.findByRole('button', { name: 'Adopt 24% for 2027' }));
  return within(await screen.findByRole('dialog', { name: 'Adopt a rule' }));
};
const posts = (asked: readonly Request[]) => asked.filter(({ method }) => method === 'POST');

test('adopts the percentage for next year, with the rounding said and a key of its own', async () => {
  const { asked } = openContingency();
  const dialog = await adoptDialog();
  expect(dialog.getByText(/23\.17% as taken, raised to a whole percent/)).toBeVisible();
  await userEvent.click(dialog.getByRole('button', { name: 'Adopt 24% for 2027' }));
  await vi.waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
  const [post] = posts(asked);
  expect(post?.body).toEqual({ year: 2027, kind: 'percent', level: '4/5' });
  expect(post?.key).toBeTruthy();
  // The answer is asked for again.
  expect(asked.slice(-2).map(({ url }) => url.pathname)).toContain('/api/answers/contingency');
});

test('this year and two parts can be chosen; what is in force is named before it is replaced', async () => {
  const { asked } = openContingency({ inForce: rule() });
  const dialog = await adoptDialog();
  await userEvent.click(dialog.getByRole('radio', { name: '2026' }));
  await userEvent.click(dialog.getByRole('radio', { name: 'Percentage and sum' }));
  expect(dialog.getByText(/It takes the place of 18% for 2026/)).toBeVisible();
  await userEvent.click(dialog.getByRole('button', { name: 'Adopt 12% and $450 for 2026' }));
  await vi.waitFor(() => expect(posts(asked)[0]?.body).toEqual({ year: 2026, kind: 'two-part', level: '4/5' }));
});

test('a failed try keeps what was chosen and its key; another choice takes another key', async () => {
  let isDown = true;
  const { asked } = openContingency({
    adopt: () => (isDown ? problem(409, 'The books have changed') : rule({ year: 2027 })),
  });
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

test('an accountant reads it all and is offered no adopting', async () => {
  openContingency({ role: 'accountant' });
  expect(await screen.findByRole('button', { name: 'Print the wallet card' })).toBeVisible();
  expect(screen.queryByRole('button', { name: /^Adopt/ })).not.toBeInTheDocument();
});

test('is rounded up as the shop likes, and set lower only with a reason', async () => {
  const { asked } = openContingency();
  const dialog = await adoptDialog();
  const percent = dialog.getByLabelText('Percent on top of the estimate');
  await userEvent.clear(percent);
  await userEvent.type(percent, '20');
  expect(dialog.getByText(/The books ask for 24%.*This is less: say why below/)).toBeVisible();
  expect(dialog.getByRole('button', { name: 'Adopt 20% for 2027' })).toBeDisabled();
  await userEvent.type(dialog.getByLabelText('Why less than the books ask'), 'No more flood cars');
  expect(dialog.getByRole('button', { name: 'Adopt 20% for 2027' })).toBeEnabled();
  await userEvent.clear(percent);
  expect(dialog.getByText('Give a whole percent, such as 25.')).toBeVisible();
  await userEvent.type(percent, '25 %');
  await userEvent.click(dialog.getByRole('button', { name: 'Adopt 25% for 2027' }));
  await vi.waitFor(() => expect(posts(asked)[0]?.body).toMatchObject({ percent: 25, note: 'No more flood cars' }));
});

test('both parts can be raised', async () => {
  const { asked } = openContingency({ search: '?rule=two-part' });
  await userEvent.click(await screen.findByRole('button', { name: 'Adopt 12% and $450 for 2027' }));
  const dialog = within(await screen.findByRole('dialog', { name: 'Adopt a rule' }));
  const sum = dialog.getByLabelText('For surprises, on top of that');
  await userEvent.clear(sum);
  await userEvent.type(sum, '1,500');
  await userEvent.click(dialog.getByRole('button', { name: 'Adopt 12% and $1,500 for 2027' }));
  await vi.waitFor(() => expect(posts(asked)[0]?.body).toMatchObject({ percent: 12, flatCents: 150_000 }));
});

test('says where the server marks a field', async () => {
  const refusal = () =>
    new Response(
      JSON.stringify({
        type: 'about:blank',
        title: 'That cannot be',
        status: 422,
        errors: [{ pointer: '/percent', detail: 'Not this one.' }],
      }),
      { status: 422, headers: { 'content-type': 'application/problem+json' } },
    );
  openContingency({ adopt: refusal });
  const dialog = await adoptDialog();
  await userEvent.click(dialog.getByRole('button', { name: /^Adopt/ }));
  expect(await dialog.findByLabelText('Percent on top of the estimate')).toHaveAccessibleDescription('Not this one.');
});

test('a rule is adopted over all rebuilds: not while a filter is set', async () => {
  openContingency({ search: '?from=2024' });
  expect(await screen.findByText(/A rule is adopted over all rebuilds/)).toBeVisible();
  expect(screen.queryByRole('button', { name: /^Adopt/ })).not.toBeInTheDocument();
});
