import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { type Session, sessionApi } from '#shared/contracts/session.ts';
import { SignInPage } from '../../../src/pages/sign-in.tsx';
import { buildSession, fakeServer, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

afterEach(() => vi.unstubAllGlobals());

test('says what it is for and leads a newcomer to a shop of their own', async () => {
  fakeServer([signedIn(null)]);
  showPage(<SignInPage />, { path: '/sign-in' });
  expect(await screen.findByText(/small shops that buy damaged vehicles/)).toBeInTheDocument();
  expect(screen.getByRole('link', { name: 'Start a shop' })).toHaveAttribute('href', '/sign-up');
});

test('a wrong password is said and nothing typed is lost; the right one leads on to where they were going', async () => {
  let session: Session | null = null;
  fakeServer([
    on(sessionApi.get, () => session),
    on(sessionApi.signIn, ({ body }) => {
      if (body.password === 'wrong') throw new Refusal({ status: 401, detail: 'Address and password do not fit.' });
      session = buildSession();
    }),
  ]);
  showPage(<SignInPage />, { path: '/sign-in', address: `/sign-in?to=${encodeURIComponent('/s/x/ledger?year=2025')}` });
  await userEvent.type(await screen.findByLabelText('Email'), 'dana@shop.example');
  await userEvent.type(screen.getByLabelText('Password'), 'wrong');
  await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
  expect(await screen.findByText('Address and password do not fit.')).toBeInTheDocument();
  expect(screen.getByLabelText('Email')).toHaveValue('dana@shop.example');
  await userEvent.type(screen.getByLabelText('Password'), ', now right');
  await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
  expect(await screen.findByText('at /s/x/ledger?year=2025')).toBeInTheDocument();
});

test.each(['//evil.example', '/\\evil.example', 'https://evil.example'])(
  'an address that is not ours (%s) is not followed',
  async (to) => {
    fakeServer([signedIn(buildSession())]);
    showPage(<SignInPage />, { path: '/sign-in', address: `/sign-in?to=${encodeURIComponent(to)}` });
    expect(await screen.findByText('at /')).toBeInTheDocument();
  },
);
