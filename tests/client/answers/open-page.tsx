import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import { type ReactNode, Suspense } from 'react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { vi } from 'vitest';
import type { Contract } from '#shared/contract.ts';
import type { Session } from '#shared/contracts/session.ts';
import type { Role } from '#shared/vocabulary.ts';
import { createQueryClient } from '../../../src/lib/query-client.ts';
import { sessionQuery } from '../../../src/lib/session.ts';

export type Request = { method: string; url: URL; body: unknown; key: string | null };
type Answer = { contract: Contract; reply: (request: Request) => unknown };

/** Answers the routes of these contracts, each reply held to its own; everything asked is kept in order. */
export function serve(answers: readonly Answer[]): Request[] {
  const asked: Request[] = [];
  vi.stubGlobal('fetch', async (address: string, init?: RequestInit) => {
    const url = new URL(address, 'http://shop.test');
    const method = init?.method ?? 'GET';
    const body: unknown = init?.body ? JSON.parse(String(init.body)) : undefined;
    const request = { method, url, body, key: new Headers(init?.headers).get('idempotency-key') };
    asked.push(request);
    const found = answers.find(({ contract }) => contract.path === url.pathname && contract.method === method);
    if (!found) return problem(404, 'Not here');
    if (found.contract.query) found.contract.query.parse(Object.fromEntries(url.searchParams));
    if (found.contract.body) found.contract.body.parse(body);
    const reply = found.reply(request);
    return reply instanceof Response ? reply : Response.json(found.contract.response.parse(reply));
  });
  return asked;
}

export function problem(status: number, title: string, detail?: string): Response {
  return new Response(JSON.stringify({ type: 'about:blank', title, status, detail }), {
    status,
    headers: { 'content-type': 'application/problem+json' },
  });
}

function session(role: Role): Session {
  const shop = { id: 'one', name: 'Shop one' };
  return {
    user: { id: 'u', name: 'Dana Whitlock', email: 'dana@example.com' },
    role,
    shop: {
      ...shop,
      currency: 'USD',
      locale: 'en-US',
      timeZone: 'UTC',
      today: '2026-11-30',
      isDemo: false,
      yearStartMonth: 1,
    },
    shops: [{ ...shop, role }],
  };
}

/** Shows a page at `/s/one/page` and what follows; `place()` tells where the address stands. */
export function openPage(page: ReactNode, search = '', role: Role = 'owner') {
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { ...client.getDefaultOptions().queries, retry: false } });
  client.setQueryData(sessionQuery().queryKey, session(role));
  const routes = [
    { path: '/s/:shopId/page', element: page },
    { path: '*', element: <p>another page</p> },
  ];
  const router = createMemoryRouter(routes, { initialEntries: [`/s/one/page${search}`] });
  render(
    <QueryClientProvider client={client}>
      <Suspense>
        <RouterProvider router={router} />
      </Suspense>
    </QueryClientProvider>,
  );
  return { place: () => router.state.location.pathname + router.state.location.search };
}
