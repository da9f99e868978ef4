import { vi } from 'vitest';
import type { z } from 'zod';
import type { Contract } from '#shared/contract.ts';
import { type Session, sessionApi } from '#shared/contracts/session.ts';
import type { Role } from '#shared/vocabulary.ts';
import { uploadsBy } from './fake-upload.ts';

type Of<C, Name extends string> = C extends Readonly<Record<Name, infer S extends z.ZodType>> ? z.output<S> : undefined;
type Asked<C> = {
  params: Of<C, 'params'>;
  query: Of<C, 'query'>;
  body: Of<C, 'body'>;
  version: number | null;
  key: string | null;
};
type Answer<C extends Contract> = (asked: Asked<C>) => z.input<C['response']>;

interface Route {
  readonly contract: Contract;
  readonly answer: (asked: Asked<Contract>) => unknown;
}

/** How the faked server answers one contract. What the client sends must be what the contract takes. */
export function on<C extends Contract>(contract: C, answer: Answer<C>): Route {
  return { contract, answer: answer as Route['answer'] };
}

/** A refusal, to be thrown by an answer: the problem that the server would send. */
export class Refusal extends Error {
  readonly problem: { status: number; detail: string; errors?: { pointer: string; detail: string }[] };

  constructor(problem: Refusal['problem']) {
    super(problem.detail);
    this.problem = problem;
  }
}

/**
 * Puts a faked server behind `fetch` and behind uploads; `asked` lists every write as "METHOD path body", an upload with
 * the names of its files. Undo with vi.unstubAllGlobals.
 */
export function fakeServer(routes: readonly Route[]) {
  const asked: string[] = [];
  const reply = async (url: string, init: RequestInit = {}): Promise<Response> => {
    const method = init.method ?? 'GET';
    const [path = '', search = ''] = url.split('?');
    if (method !== 'GET') asked.push([method, path, ...sentWith(init.body)].join(' '));
    const route = routes.find(({ contract }) => contract.method === method && paramsOf(contract, path) !== null);
    if (!route) return refuse({ status: 404, detail: `The test serves no ${method} ${path}` });
    try {
      const parsed = route.contract.response.parse(route.answer(read(route.contract, { path, search }, init)));
      return parsed === undefined ? new Response(null, { status: 204 }) : Response.json(parsed);
    } catch (refusal) {
      if (refusal instanceof Refusal) return refuse(refusal.problem);
      throw refusal;
    }
  };
  vi.stubGlobal('fetch', reply);
  vi.stubGlobal('XMLHttpRequest', uploadsBy(reply));
  return { asked };
}

function sentWith(body: RequestInit['body']): string[] {
  if (typeof body === 'string') return [body];
  return body instanceof FormData ? body.getAll('file').map((file) => (file as File).name) : [];
}

function read(
  contract: Contract,
  { path, search }: { path: string; search: string },
  init: RequestInit,
): Asked<Contract> {
  const headers = new Headers(init.headers);
  const body: unknown = typeof init.body === 'string' ? JSON.parse(init.body) : undefined;
  const match = headers.get('if-match');
  return {
    params: contract.params?.parse(paramsOf(contract, path)) as undefined,
    query: contract.query?.parse(Object.fromEntries(new URLSearchParams(search))) as undefined,
    body: contract.body?.parse(body) as undefined,
    version: match === null ? null : Number(JSON.parse(match)),
    key: headers.get('idempotency-key'),
  };
}

function paramsOf({ path }: Contract, asked: string): Record<string, string> | null {
  const pattern = new RegExp(`^${path.replace(/:(\w+)/g, '(?<$1>[^/]+)')}$`);
  const match = pattern.exec(asked);
  return match && { ...match.groups };
}

function refuse(problem: Refusal['problem']): Response {
  return new Response(JSON.stringify({ type: 'about:blank', title: 'Refused', ...problem }), {
    status: problem.status,
    headers: { 'content-type': 'application/problem+json' },
  });
}

/** An id as the outside sees it: the letter, 22 times. */
export const idOf = (letter: string) => letter.repeat(22);

/** Dana Whitlock's session in the shop "Whitlock Rebuilds", with this role. */
export function buildSession(role: Role = 'owner', change: Partial<Session['shop']> = {}): Session {
  const shop = { id: idOf('s'), name: 'Whitlock Rebuilds' };
  return {
    user: { id: idOf('d'), name: 'Dana Whitlock', email: 'dana@shop.example' },
    role,
    shops: [{ ...shop, role }],
    shop: {
      ...shop,
      currency: 'USD',
      locale: 'en-US',
      timeZone: 'America/Chicago',
      today: '2026-06-15',
      isDemo: false,
      yearStartMonth: 1,
      ...change,
    },
  };
}

/** Answers who is signed in; null: nobody. */
export function signedIn(session: Session | null): Route {
  return on(sessionApi.get, () => session);
}
