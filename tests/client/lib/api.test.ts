import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { z } from 'zod';
import type { Contract } from '#shared/contract.ts';
import { call, queryText } from '../../../src/lib/api.ts';
import { ApiProblem } from '../../../src/lib/api-problem.ts';
import { watchProblems } from '../../../src/lib/problem-watch.ts';
import { mayRetry } from '../../../src/lib/query-client.ts';
import { setShownShop } from '../../../src/lib/shown-shop.ts';

const reply = z.object({ id: z.string() });
const get = {
  method: 'GET',
  path: '/api/things/:thingId',
  summary: 'One thing',
  params: z.object({ thingId: z.string() }),
  query: z.object({ year: z.number().optional(), damage: z.array(z.string()).optional() }),
  response: reply,
} as const satisfies Contract;
const create = {
  method: 'POST',
  path: '/api/things',
  summary: 'Make one',
  body: z.strictObject({ name: z.string() }),
  response: reply,
  once: true,
} as const satisfies Contract;
const edit = {
  method: 'PATCH',
  path: '/api/things',
  summary: 'Change one',
  body: create.body,
  response: reply,
  edits: true,
} as const satisfies Contract;

const fetched = vi.fn<typeof fetch>();

function answer(body: unknown, status = 200) {
  const type = status < 400 ? 'application/json' : 'application/problem+json';
  fetched.mockResolvedValueOnce(new Response(JSON.stringify(body), { status, headers: { 'content-type': type } }));
}

const sent = () => {
  const [url, init] = fetched.mock.calls.at(-1) ?? [];
  return { url, init, headers: new Headers(init?.headers) };
};

beforeEach(() => {
  fetched.mockReset();
  vi.stubGlobal('fetch', fetched);
});
afterEach(() => {
  setShownShop(null);
  vi.unstubAllGlobals();
});

describe('a call', () => {
  test('fills the path, writes the query and names the shop that is shown', async () => {
    setShownShop('shop-1');
    answer({ id: 'a/b' });
    const thing = await call(get, { params: { thingId: 'a/b' }, query: { year: 2026, damage: ['front', 'hail'] } });
    expect(thing).toEqual({ id: 'a/b' });
    expect(sent().url).toBe('/api/things/a%2Fb?year=2026&damage=front&damage=hail');
    expect(sent().headers.get('Panelgap-Shop')).toBe('shop-1');
  });

  test('sends a body as JSON under the key that was made for its form', async () => {
    answer({ id: 'x' });
    await call(create, { body: { name: 'B-1' }, idempotencyKey: 'key-1' });
    expect(sent().init?.body).toBe('{"name":"B-1"}');
    expect(sent().headers.get('Idempotency-Key')).toBe('key-1');
    expect(sent().headers.get('Panelgap-Shop')).toBeNull();
  });

  test('sends an edit against the version that was read', async () => {
    answer({ id: 'x' });
    await call(edit, { body: { name: 'B-1' }, version: 7 });
    expect(sent().headers.get('If-Match')).toBe('"7"');
  });

  test('drops what the contract does not list, and refuses a reply that breaks it', async () => {
    answer({ id: 'x', secret: 1 });
    expect(await call(get, { params: { thingId: 'x' }, query: {} })).toEqual({ id: 'x' });
    answer({ id: 5 });
    await expect(call(get, { params: { thingId: 'x' }, query: {} })).rejects.toThrow('expected string');
  });
});

describe('a refusal', () => {
  const refused = () => call(get, { params: { thingId: 'x' }, query: {} }).catch((error: unknown) => error);

  test('is thrown as one class, with its fields', async () => {
    answer(
      {
        type: 'about:blank',
        title: 'Invalid request',
        status: 400,
        errors: [{ pointer: '/name', detail: 'Too long.' }],
      },
      400,
    );
    const problem = await refused();
    expect(problem).toBeInstanceOf(ApiProblem);
    expect(problem).toMatchObject({
      status: 400,
      title: 'Invalid request',
      errors: [{ pointer: '/name', detail: 'Too long.' }],
    });
  });

  test('that is not problem+json still has words', async () => {
    fetched.mockResolvedValueOnce(new Response('<html>', { status: 502 }));
    expect(await refused()).toMatchObject({ status: 502, title: 'The server is away' });
  });

  test('without any reply says that nothing was saved', async () => {
    fetched.mockRejectedValueOnce(new TypeError('Failed to fetch'));
    expect(await refused()).toMatchObject({ status: 0, type: '/problems/unreachable' });
  });

  test('of an ended session or another shop is told to the frame', async () => {
    const seen: number[] = [];
    const stop = watchProblems((problem) => seen.push(problem.status));
    answer({ title: 'Sign in', status: 401 }, 401);
    await refused();
    answer({ type: '/problems/other-shop', title: 'Another shop', status: 409 }, 409);
    await refused();
    answer({ title: 'Absent', status: 404 }, 404);
    await refused();
    stop();
    expect(seen).toEqual([401, 409]);
  });
});

test('only what may pass by itself is tried again', () => {
  const problem = (status: number) => new ApiProblem({}, status);
  expect([0, 503].map((status) => mayRetry(0, problem(status)))).toEqual([true, true]);
  expect([400, 401, 404, 409].some((status) => mayRetry(0, problem(status)))).toBe(false);
  expect(mayRetry(2, problem(503))).toBe(false);
});

test('a query leaves out what is not set', () => {
  expect(queryText({ a: null, b: undefined, c: '', d: 0, e: false })).toBe('?d=0&e=false');
  expect(queryText({})).toBe('');
});
