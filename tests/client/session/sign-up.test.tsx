import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { type Session, sessionApi } from '#shared/contracts/session.ts';
import { SignUpPage } from '../../../src/pages/sign-up.tsx';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

afterEach(() => vi.unstubAllGlobals());

const PASSWORD = 'seven bent fenders in a row';

function serve({ taken = false } = {}) {
  let session: Session | null = null;
  return fakeServer([
    on(sessionApi.get, () => session),
    on(sessionApi.signUp, () => {
      const detail = 'This address has an account: sign in instead.';
      if (taken) throw new Refusal({ status: 409, detail: 'Taken.', errors: [{ pointer: '/email', detail }] });
      session = buildSession();
    }),
  ]);
}

async function fill(password = PASSWORD) {
  await userEvent.type(await screen.findByLabelText('Your name'), 'Dana Whitlock');
  await userEvent.type(screen.getByLabelText("Your shop's name"), 'Whitlock Rebuilds');
  await userEvent.type(screen.getByLabelText('Email'), 'dana@shop.example');
  await userEvent.type(screen.getByLabelText('Password'), password);
  await userEvent.click(screen.getByRole('button', { name: 'Start the shop' }));
}

test('makes the shop in the time zone of the browser and leads it to its first import', async () => {
  const { asked } = serve();
  showPage(<SignUpPage />, { path: '/sign-up' });
  await fill();
  expect(await screen.findByText(`at /s/${idOf('s')}/import`)).toBeInTheDocument();
  const { timeZone } = new Intl.DateTimeFormat().resolvedOptions();
  const body = JSON.parse(asked[0]?.replace('POST /api/sign-up ', '') ?? '');
  expect(body).toEqual({
    name: 'Dana Whitlock',
    shopName: 'Whitlock Rebuilds',
    email: 'dana@shop.example',
    password: PASSWORD,
    timeZone,
  });
});

test('says how much a short password lacks, at the field, and sends nothing', async () => {
  const { asked } = serve();
  showPage(<SignUpPage />, { path: '/sign-up' });
  await fill('only twelve.');
  const field = screen.getByLabelText('Password');
  expect(field).toHaveFocus();
  expect(field).toHaveAccessibleDescription(/a short sentence is easiest to remember.*3 more needed/);
  expect(asked).toEqual([]);
});

test('shows what the server refuses at the field that it names, and keeps what was typed', async () => {
  serve({ taken: true });
  showPage(<SignUpPage />, { path: '/sign-up' });
  await fill();
  const email = screen.getByLabelText('Email');
  await vi.waitFor(() => expect(email).toHaveFocus());
  expect(email).toHaveAccessibleDescription('This address has an account: sign in instead.');
  expect(email).toHaveValue('dana@shop.example');
  expect(screen.getByLabelText('Password')).toHaveValue(PASSWORD);
});

test('shows the password on demand', async () => {
  serve();
  showPage(<SignUpPage />, { path: '/sign-up' });
  await userEvent.type(await screen.findByLabelText('Password'), PASSWORD);
  await userEvent.click(screen.getByRole('button', { name: 'Show password' }));
  expect(screen.getByLabelText('Password')).toHaveAttribute('type', 'text');
  expect(screen.getByRole('button', { name: 'Show password' })).toHaveAttribute('aria-pressed', 'true');
});

test('leads somebody who is signed in to their shop', async () => {
  fakeServer([signedIn(buildSession())]);
  showPage(<SignUpPage />, { path: '/sign-up' });
  expect(await screen.findByText('at /')).toBeInTheDocument();
});
