import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import type { Session } from '#shared/contracts/session.ts';
import type { Role } from '#shared/vocabulary.ts';
import { App } from '../../../src/app/app.tsx';
import { ApiProblem } from '../../../src/lib/api-problem.ts';
import { reportProblem } from '../../../src/lib/problem-watch.ts';

function buildSession(role: Role, shopId = 'one'): Session {
  return {
    user: { id: 'u', name: 'Dana Whitlock', email: 'dana@example.com' },
    role,
    shop: {
      id: shopId,
      name: `Shop ${shopId}`,
      currency: 'USD',
      locale: 'en-US',
      timeZone: 'UTC',
      today: '2026-12-15',
      isDemo: true,
      yearStartMonth: 1,
    },
    shops: [
      { id: 'one', name: 'Shop one', role },
      { id: 'two', name: 'Shop two', role },
    ],
  };
}

/** A server of one session: null means that nobody is signed in. */
function serve(session: Session | null) {
  const server = { session, requests: [] as string[] };
  vi.stubGlobal('fetch', async (url: string, init?: RequestInit) => {
    const method = init?.method ?? 'GET';
    server.requests.push(`${method} ${url}`);
    if (method === 'POST' && url === '/api/session') server.session = session ?? buildSession('owner');
    if (url === '/api/session/shop') server.session = buildSession('owner', JSON.parse(String(init?.body)).shopId);
    if (method !== 'GET') return new Response(null, { status: 204 });
    if (url === '/api/session') return Response.json(server.session);
    const problem = { type: 'about:blank', title: 'Not here', status: 404 };
    return new Response(JSON.stringify(problem), {
      status: problem.status,
      headers: { 'content-type': 'application/problem+json' },
    });
  });
  return server;
}

beforeEach(() => {
  vi.spyOn(window, 'scrollTo').mockImplementation(() => undefined);
});
afterEach(() => {
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

const open = (address: string) => {
  window.history.replaceState(null, '', address);
  return render(<App />);
};
/** An address that no page answers: the frame is what is looked at. */
const NOWHERE = 'nowhere';

const places = async () => {
  const rail = await screen.findByRole('navigation', { name: 'Places' }, { timeout: 8000 });
  return within(rail)
    .getAllByRole('link')
    .map((link) => link.textContent);
};

test('who is not signed in is led to sign-in, and back to the same address after', async () => {
  const server = serve(null);
  open(`/s/one/${NOWHERE}?year=2025`);
  await userEvent.type(await screen.findByLabelText('Email', {}, { timeout: 8000 }), 'dana@example.com');
  await userEvent.type(screen.getByLabelText('Password'), 'a long enough sentence');
  await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
  await screen.findByRole('navigation', { name: 'Places' }, { timeout: 8000 });
  expect(window.location.pathname + window.location.search).toBe(`/s/one/${NOWHERE}?year=2025`);
  expect(server.requests).toContain('POST /api/session');
});

test('a mechanic sees the rebuilds and the hours, and nothing else', async () => {
  serve(buildSession('mechanic'));
  open(`/s/one/${NOWHERE}`);
  expect(await places()).toEqual(['Rebuilds', 'Hours']);
});

test('an owner sees every place; the demo says on which day its calendar stands', async () => {
  serve(buildSession('owner'));
  open(`/s/one/${NOWHERE}`);
  expect(await places()).toHaveLength(14);
  expect(
    screen.getByText(/every figure is invented, from a seed chosen .* calendar stands at 15 December 2026\./),
  ).toBeInTheDocument();
});

test('an address of another of my shops opens in that shop', async () => {
  const server = serve(buildSession('owner', 'one'));
  open(`/s/two/${NOWHERE}`);
  await screen.findByRole('navigation', { name: 'Places' }, { timeout: 8000 });
  expect(server.requests).toContain('PUT /api/session/shop');
  expect(screen.getByText('Shop two')).toBeInTheDocument();
});

test('an address of a shop that is not mine says no more than that nothing stands there', async () => {
  serve(buildSession('owner'));
  open('/s/three/year');
  expect(
    await screen.findByRole('heading', { name: 'Nothing stands at this address' }, { timeout: 8000 }),
  ).toBeVisible();
});

test('a session that ends is renewed over the page', async () => {
  const server = serve(buildSession('owner'));
  open(`/s/one/${NOWHERE}`);
  await places();
  reportProblem(new ApiProblem({ title: 'Sign in' }, 401));
  const dialog = await screen.findByRole('dialog', { name: 'Your session ended' });
  expect(within(dialog).getByLabelText('Email')).toHaveValue('dana@example.com');
  await userEvent.type(within(dialog).getByLabelText('Password'), 'a long enough sentence');
  await userEvent.click(within(dialog).getByRole('button', { name: 'Sign in' }));
  await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
  expect(window.location.pathname).toBe(`/s/one/${NOWHERE}`);
  expect(server.requests).toContain('PUT /api/session/shop');
});

test('another tab moved to another shop: the page offers to come back and stays', async () => {
  const server = serve(buildSession('owner'));
  open(`/s/one/${NOWHERE}`);
  await places();
  reportProblem(new ApiProblem({ type: '/problems/other-shop', title: 'Another shop' }, 409));
  await userEvent.click(await screen.findByRole('button', { name: 'Go back to Shop one' }));
  await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
  expect(server.requests).toContain('PUT /api/session/shop');
  expect(window.location.pathname).toBe(`/s/one/${NOWHERE}`);
});

test('Ctrl-K finds a place by a piece of its name, ? lists the keys', async () => {
  serve(buildSession('owner'));
  open(`/s/one/${NOWHERE}`);
  await places();
  await userEvent.keyboard('{Control>}k{/Control}');
  const field = await screen.findByRole('combobox', { name: /Find a rebuild/ });
  await userEvent.type(field, 'led');
  expect(await screen.findByRole('option', { name: /Ledger/ })).toBeInTheDocument();
  await userEvent.keyboard('{Escape}');
  await waitFor(() => expect(screen.queryByRole('combobox', { name: /Find a rebuild/ })).not.toBeInTheDocument());
  await userEvent.keyboard('?');
  expect(await screen.findByRole('dialog', { name: 'Keys' })).toBeInTheDocument();
});
