import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { peopleApi } from '#shared/contracts/people.ts';
import { type Session, sessionApi } from '#shared/contracts/session.ts';
import { JoinPage } from '../../../src/pages/join.tsx';
import { buildSession, fakeServer, idOf, on, Refusal } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

afterEach(() => vi.unstubAllGlobals());

const TOKEN = 't'.repeat(43);
const PASSWORD = 'seven bent fenders in a row';

function serve({ hasAccount = false, session = null as Session | null, used = false } = {}) {
  let now = session;
  return fakeServer([
    on(sessionApi.get, () => now),
    on(peopleApi.look, () => {
      if (used) throw new Refusal({ status: 404, detail: 'This invitation is used up.' });
      return { shopName: 'Whitlock Rebuilds', email: 'mo@shop.example', role: 'mechanic' as const, hasAccount };
    }),
    on(peopleApi.join, ({ body }) => {
      const detail = 'This is not the password of your account.';
      if (body.password === 'wrong') {
        throw new Refusal({ status: 400, detail, errors: [{ pointer: '/password', detail }] });
      }
      now = buildSession('mechanic');
    }),
  ]);
}

const open = () => showPage(<JoinPage />, { path: '/join/:token', address: `/join/${TOKEN}` });

test('says which shop, which role and what it may see, and lets a new person in', async () => {
  const { asked } = serve();
  open();
  expect(await screen.findByRole('heading', { name: 'Join Whitlock Rebuilds as mechanic' })).toBeInTheDocument();
  expect(screen.getByText('A mechanic puts down own hours on open rebuilds and sees no money.')).toBeInTheDocument();
  expect(screen.getByLabelText('Email')).toHaveValue('mo@shop.example');
  await userEvent.type(screen.getByLabelText('Your name'), 'Mo Reyes');
  await userEvent.type(screen.getByLabelText('Password'), PASSWORD);
  await userEvent.click(screen.getByRole('button', { name: 'Join Whitlock Rebuilds' }));
  expect(await screen.findByText(`at /s/${idOf('s')}`)).toBeInTheDocument();
  expect(asked.at(-1)).toBe(`POST /api/join ${JSON.stringify({ token: TOKEN, password: PASSWORD, name: 'Mo Reyes' })}`);
});

test('asks a person with an account only for its password, and says at the field when it is wrong', async () => {
  serve({ hasAccount: true });
  open();
  const password = await screen.findByLabelText('Password');
  expect(screen.queryByLabelText('Your name')).not.toBeInTheDocument();
  await userEvent.type(password, 'wrong');
  await userEvent.click(screen.getByRole('button', { name: /^Join/ }));
  await vi.waitFor(() => expect(password).toHaveAccessibleDescription(/This is not the password of your account/));
  expect(password).toHaveValue('wrong');
});

test('holds a new account to the password rule before asking the server', async () => {
  const { asked } = serve();
  open();
  await userEvent.type(await screen.findByLabelText('Your name'), 'Mo Reyes');
  await userEvent.type(screen.getByLabelText('Password'), 'aaaaaaaaaaaaaaaaaaaa');
  await userEvent.click(screen.getByRole('button', { name: /^Join/ }));
  expect(screen.getByLabelText('Password')).toHaveAccessibleDescription(/Use more than a few different characters/);
  expect(asked.some((line) => line.startsWith('POST /api/join {'))).toBe(false);
});

test('warns somebody who is signed in as another', async () => {
  serve({ session: buildSession('owner') });
  open();
  expect(await screen.findByText(/You are signed in as dana@shop.example/)).toBeInTheDocument();
});

test('says what to do about a link that no longer works', async () => {
  serve({ used: true });
  open();
  expect(await screen.findByRole('heading', { name: 'This invitation no longer works' })).toBeInTheDocument();
  expect(screen.getByText(/ask the owner of the shop for a new link/)).toBeInTheDocument();
  expect(screen.getByRole('link', { name: 'Sign in' })).toHaveAttribute('href', '/sign-in');
});
