import { QueryClient } from '@tanstack/react-query';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { forgetPerson, keep, KEPT_SESSION, kept, keptNames, mine } from '../../../src/lib/kept.ts';
import { keepSession, sessionQuery } from '../../../src/lib/session.ts';
import { buildSession, idOf } from '../../support/fake-server.ts';

beforeEach(() => localStorage.clear());
afterEach(() => {
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

const noSignal = () => vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
const read = () => new QueryClient().fetchQuery({ ...sessionQuery(), retry: false });

test('what is kept is gone when its person signs out, and nobody else’s', () => {
  const [dana, other] = [mine(buildSession()), mine({ user: { id: 'other' }, shop: { id: idOf('s') } })];
  localStorage.setItem('panelgap-theme', 'dark');
  keep(`${dana}basis`, 1);
  keep(`${other}basis`, 2);
  keepSession(buildSession());
  forgetPerson(idOf('d'));
  expect(keptNames('')).toEqual([`${other}basis`]);
  expect(localStorage.getItem('panelgap-theme')).toBe('dark');
});

test('damaged or missing things are nothing, and a full browser says so', () => {
  localStorage.setItem('panelgap.x', '{');
  expect([kept('x'), kept('y')]).toEqual([null, null]);
  vi.spyOn(Storage.prototype, 'setItem').mockImplementation(() => {
    throw new DOMException('full', 'QuotaExceededError');
  });
  expect(keep('x', 1)).toBe(false);
});

test('without signal the session that a page kept stands in; without one it is an error', async () => {
  noSignal();
  await expect(read()).rejects.toMatchObject({ status: 0 });
  keepSession(buildSession());
  expect(await read()).toEqual(buildSession());
});

test('what the server says of the session takes the place of what was kept', async () => {
  keepSession(buildSession());
  vi.stubGlobal('fetch', async () => Response.json(buildSession('accountant')));
  await read();
  expect(kept(KEPT_SESSION)).toMatchObject({ role: 'accountant' });
  vi.stubGlobal('fetch', async () => Response.json(null));
  expect(await read()).toBeNull();
  expect(kept(KEPT_SESSION)).toBeNull();
});
