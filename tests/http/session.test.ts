import { describe, expect, it } from 'vitest';
import { PASSWORD, testApi } from '../support/api.ts';

describe('sign-up, sign-in and sign-out', () => {
  it('makes an account with a shop and shows it', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { status, body } = await ada.get('/api/session');
    expect(status).toBe(200);
    expect(body).toMatchObject({
      role: 'owner',
      user: { name: 'Ada Wick' },
      shop: { today: '2026-06-15', isDemo: false },
    });
  });

  it('refuses a short password and marks the field', async () => {
    const api = await testApi();
    const { status, body, headers } = await api.anyone.post('/api/sign-up', {
      name: 'A',
      email: 'a@shop.example',
      password: 'too short',
      shopName: 'S',
    });
    expect(status).toBe(400);
    expect(headers['content-type']).toContain('application/problem+json');
    expect(body.errors).toEqual([expect.objectContaining({ pointer: '/password' })]);
  });

  it('refuses an address that has an account', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const again = { name: 'B', email: ada.email.toUpperCase(), password: PASSWORD, shopName: 'S' };
    const { status, body } = await api.anyone.post('/api/sign-up', again);
    expect(status).toBe(409);
    expect(body.errors[0].pointer).toBe('/email');
  });

  it('answers alike to an unknown address and a wrong password', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const wrong = await api.anyone.post('/api/session', { email: ada.email, password: 'not the password' });
    const unknown = await api.anyone.post('/api/session', { email: 'nobody@shop.example', password: PASSWORD });
    expect([wrong.status, unknown.status]).toEqual([401, 401]);
    expect({ ...wrong.body, requestId: 0 }).toEqual({ ...unknown.body, requestId: 0 });
  });

  it('slows down guessing, and says for how long', async () => {
    const api = await testApi({ SIGN_IN_FAILURES: '2' });
    const guess = () => api.anyone.post('/api/session', { email: 'ada@shop.example', password: 'a guess' });
    await guess();
    await guess();
    const third = await guess();
    expect(third.status).toBe(429);
    expect(Number(third.headers['retry-after'])).toBeGreaterThan(0);
  });

  it('slows down guesses that are sent at the same moment, too', async () => {
    const api = await testApi({ SIGN_IN_FAILURES: '3' });
    const { email } = await api.owner();
    const guess = (_: unknown, i: number) => api.anyone.post('/api/session', { email, password: `wrong ${i}` });
    const replies = await Promise.all(Array.from({ length: 20 }, guess));
    expect(replies.filter(({ status }) => status !== 429).length).toBeLessThanOrEqual(5);
  });

  it('ends the session at sign-out, on the server too', async () => {
    const api = await testApi();
    const ada = await api.owner();
    expect((await ada.delete('/api/session')).status).toBe(204);
    expect((await ada.get('/api/session')).body).toBeNull();
    expect((await ada.get('/api/shop')).status).toBe(401);
  });

  it('keeps only the hash of a session id', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const rows = await api.services.database.reader('sessions').select('id');
    expect(ada.cookie).not.toContain(rows[0].id);
    expect(rows[0].id).toMatch(/^[0-9a-f]{64}$/);
  });
});

describe('shops of a session', () => {
  it('never shows another shop, nor lets a session move into one', async () => {
    const api = await testApi();
    const ada = await api.owner('Ada Wick');
    const ben = await api.owner('Ben Oake');
    expect((await ada.put('/api/session/shop', { shopId: ben.shopId })).status).toBe(404);
    expect((await ada.get('/api/shop')).body.name).toBe("Ada Wick's yard");
  });

  it('says so when the page shows another shop than the session', async () => {
    const api = await testApi();
    const ada = await api.owner('Ada Wick');
    const ben = await api.owner('Ben Oake');
    const { status, body } = await ada.get('/api/shop').set('Panelgap-Shop', ben.shopId);
    expect(status).toBe(409);
    expect(body.type).toBe('/problems/other-shop');
  });
});

describe('how long a session lasts', () => {
  const DAY = 86_400_000;

  it.each([
    ['seven idle days', { expires_at: Date.now() - 1000 }],
    ['thirty days in any case', { created_at: Date.now() - 31 * DAY }],
  ])('%s', async (_, times) => {
    const api = await testApi();
    const ada = await api.owner();
    await api.services.database.writer('sessions').update(times);
    expect((await ada.get('/api/shop')).status).toBe(401);
  });

  it('grows while it is used, without a reader waiting for whoever writes', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { database } = api.services;
    const soon = Date.now() + 2 * DAY;
    await database.writer('sessions').update({ expires_at: soon });
    let finish = () => {};
    const writing = database.lock(() => new Promise<void>((resolve) => (finish = resolve)));
    expect((await ada.get('/api/shop')).status).toBe(200);
    finish();
    await writing;
    await database.lock(async () => undefined);
    expect((await database.reader('sessions').first()).expires_at).toBeGreaterThan(soon);
  });
});

describe('requests from elsewhere', () => {
  it('refuses a write that another site made the browser send', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { status } = await ada.delete('/api/session').set('Sec-Fetch-Site', 'cross-site');
    expect(status).toBe(403);
    const other = await ada.delete('/api/session').set('Origin', 'https://elsewhere.example');
    expect(other.status).toBe(403);
  });

  it('answers an unknown API address with a problem, not with a page', async () => {
    const api = await testApi();
    const { status, body } = await api.anyone.get('/api/nothing');
    expect(status).toBe(404);
    expect(body).toMatchObject({ type: 'about:blank', status: 404 });
  });

  it('refuses malformed JSON as the caller’s mistake', async () => {
    const api = await testApi();
    const { status } = await api.anyone
      .request('post', '/api/session')
      .set('Content-Type', 'application/json')
      .send('{"email":');
    expect(status).toBe(400);
  });
});
