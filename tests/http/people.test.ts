import { describe, expect, it } from 'vitest';
import { type Member, PASSWORD, testApi } from '../support/api.ts';

const invite = async (owner: Member, email = 'bea@shop.example', role = 'bookkeeper') =>
  (await owner.post('/api/people/invitations', { email, role })).body as { id: string; token: string };

describe('joining a shop by a link', () => {
  it('lets a new person in with the role of the invitation, once', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { token } = await invite(ada);
    const look = await api.anyone.post('/api/join/look', { token });
    expect(look.body).toMatchObject({ role: 'bookkeeper', hasAccount: false, email: 'bea@shop.example' });
    const joined = await api.anyone.post('/api/join', { token, name: 'Bea', password: PASSWORD });
    expect(joined.status).toBe(204);
    const again = await api.anyone.post('/api/join', { token, name: 'Eve', password: PASSWORD });
    expect(again.status).toBe(404);
    const { members, invitations } = (await ada.get('/api/people')).body;
    expect(members.map((member: { role: string }) => member.role).sort()).toEqual(['bookkeeper', 'owner']);
    expect(invitations).toEqual([]);
  });

  it('lets someone with an account in by their password, and into both shops', async () => {
    const api = await testApi();
    const ada = await api.owner('Ada Wick');
    const ben = await api.owner('Ben Oake');
    const { token } = await invite(ada, ben.email, 'accountant');
    const wrong = await api.anyone.post('/api/join', { token, password: 'not the password' });
    expect(wrong.body.errors[0].pointer).toBe('/password');
    expect((await api.anyone.post('/api/join', { token, password: PASSWORD })).status).toBe(204);
    const { shops } = (await ben.get('/api/session')).body;
    expect(shops.map((shop: { role: string }) => shop.role).sort()).toEqual(['accountant', 'owner']);
    expect((await ben.put('/api/session/shop', { shopId: ada.shopId })).status).toBe(204);
    expect((await ben.get('/api/shop')).body.name).toBe("Ada Wick's yard");
  });

  it('makes a withdrawn link useless, and asks a new person for a long password', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { id, token } = await invite(ada);
    const short = await api.anyone.post('/api/join', { token, name: 'Bea', password: 'short' });
    expect(short.body.errors[0].pointer).toBe('/password');
    await ada.delete(`/api/people/invitations/${id}`);
    expect((await api.anyone.post('/api/join/look', { token })).status).toBe(404);
  });

  it('lets nobody in whose link is withdrawn while they join', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { id, token } = await invite(ada);
    const { passwords } = api.services;
    const hash = passwords.hash;
    passwords.hash = async (password) => {
      await ada.delete(`/api/people/invitations/${id}`);
      return hash(password);
    };
    expect((await api.anyone.post('/api/join', { token, name: 'Bea', password: PASSWORD })).status).toBe(404);
    expect((await ada.get('/api/people')).body.members).toHaveLength(1);
  });

  it('makes one account when two shops’ links for one new person are used at the same moment', async () => {
    const api = await testApi();
    const links = [await invite(await api.owner('Ada Wick')), await invite(await api.owner('Ben Oake'))];
    const replies = await Promise.all(
      links.map(({ token }) => api.anyone.post('/api/join', { token, name: 'Bea', password: PASSWORD })),
    );
    expect(new Set(replies.map(({ status }) => status))).toEqual(new Set([204, 409]));
    const left = links[replies.findIndex(({ status }) => status === 409)];
    const again = await api.anyone.post('/api/join', { token: left?.token, password: PASSWORD });
    expect(again.status).toBe(204);
  });

  it('stores only the hash of the link', async () => {
    const api = await testApi();
    const { token } = await invite(await api.owner());
    const { reader } = api.services.database;
    for (const table of ['invitations', 'trail', 'idempotency_keys']) {
      expect(JSON.stringify(await reader(table))).not.toContain(token);
    }
  });
});

describe('members', () => {
  it('ends the sessions of someone whose role changes or who is removed', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const bea = await api.member(ada, 'bookkeeper');
    const { members } = (await ada.get('/api/people')).body;
    const her = members.find((member: { role: string }) => member.role === 'bookkeeper');
    await ada.patch(`/api/people/${her.userId}`, her.version, { role: 'mechanic' });
    expect((await bea.get('/api/shop')).status).toBe(401);
  });

  it('keeps the last owner', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const [me] = (await ada.get('/api/people')).body.members;
    const demoted = await ada.patch(`/api/people/${me.userId}`, me.version, { role: 'mechanic' });
    const removed = await ada.request('delete', `/api/people/${me.userId}`).set('If-Match', `"${me.version}"`);
    expect([demoted.status, removed.status]).toEqual([409, 409]);
  });

  it('refuses to invite someone who is in, and anyone but an owner who tries', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const bea = await api.member(ada, 'bookkeeper');
    const again = await ada.post('/api/people/invitations', { email: bea.email, role: 'owner' });
    expect(again.body.errors[0].pointer).toBe('/email');
    expect((await bea.post('/api/people/invitations', { email: 'x@y.example', role: 'owner' })).status).toBe(403);
  });

  it('tells somebody who was taken out of their only shop why they cannot sign in', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const bea = await api.member(ada, 'bookkeeper');
    const { id } = (await bea.get('/api/session')).body.user as { id: string };
    await ada.request('delete', `/api/people/${id}`).set('If-Match', '"1"');
    const reply = await api.anyone.post('/api/session', { email: bea.email, password: PASSWORD });
    expect(reply.status).toBe(403);
    expect(reply.body).toMatchObject({ detail: 'You belong to no shop any more. Ask for an invitation to one.' });
    expect(reply.headers['set-cookie']).toBeUndefined();
  });
});
