import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';

describe('the shop', () => {
  it('starts with lists of its own and takes a new word', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const added = await ada.post('/api/shop/lists/damages', { name: 'vandal' });
    expect(added.status).toBe(201);
    const { body } = await ada.get('/api/shop/lists');
    expect(body.damages.map((item: { name: string }) => item.name)).toContain('vandal');
    expect(body.categories.filter((item: { isPaidLabor: boolean }) => item.isPaidLabor)).toHaveLength(1);
  });

  it('refuses a name that is taken, in any case', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { status, body } = await ada.post('/api/shop/lists/classes', { name: 'PICKUP' });
    expect(status).toBe(409);
    expect(body.errors[0].pointer).toBe('/name');
  });

  it('replays the first answer to the same key, and refuses another body under it', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const first = await ada.post('/api/shop/lists/classes', { name: 'coach' }, 'key-12345');
    const repeat = await ada.post('/api/shop/lists/classes', { name: 'coach' }, 'key-12345');
    const other = await ada.post('/api/shop/lists/classes', { name: 'tank' }, 'key-12345');
    expect([first.status, repeat.status, other.status]).toEqual([201, 201, 422]);
    expect(repeat.body).toEqual(first.body);
  });

  it('asks for the version of an edit, and refuses a stale one', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { body: shop, headers } = await ada.get('/api/shop');
    expect(headers['etag']).toBe('"1"');
    const blind = await ada.request('patch', '/api/shop').send({ name: 'New name' });
    expect(blind.status).toBe(428);
    expect((await ada.patch('/api/shop', shop.version, { name: 'New name' })).body.name).toBe('New name');
    const stale = await ada.patch('/api/shop', shop.version, { name: 'Third name' });
    expect(stale.status).toBe(412);
    expect((await ada.get('/api/shop')).body.name).toBe('New name');
  });

  it('refuses a currency without two decimals, and unknown fields', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const yen = await ada.patch('/api/shop', 1, { currency: 'JPY' });
    expect(yen.body.errors[0].pointer).toBe('/currency');
    const odd = await ada.patch('/api/shop', 1, { isDemo: true });
    expect(odd.status).toBe(400);
    expect(odd.body.errors[0].pointer).toBe('/isDemo');
  });

  it('moves a word to its new place and the others around it, retired ones too', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const classes = async () =>
      (await ada.get('/api/shop/lists')).body.classes as {
        id: string;
        name: string;
        position: number;
        version: number;
      }[];
    const [first, second, third, fourth] = await classes();
    await ada.patch(`/api/shop/lists/classes/${second?.id}`, 1, { isRetired: true });
    const moved = await ada.patch(`/api/shop/lists/classes/${first?.id}`, 1, { position: 2 });
    expect(moved.body.position).toBe(2);
    const after = await classes();
    expect(after.slice(0, 4).map((item) => item.id)).toEqual([second?.id, third?.id, first?.id, fourth?.id]);
    expect(after.map((item) => item.position)).toEqual(after.map((_, index) => index));
    expect(after[1]?.version, 'making room for another is no change of a word').toBe(1);
    const beyond = await ada.patch(`/api/shop/lists/classes/${first?.id}`, moved.body.version, { position: 1000 });
    expect(beyond.body.position).toBe(after.length - 1);
  });

  it('keeps a bookkeeper from changing it', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const bea = await api.member(ada, 'bookkeeper');
    expect((await bea.get('/api/shop')).status).toBe(200);
    expect((await bea.patch('/api/shop', 1, { name: 'Mine' })).status).toBe(403);
  });

  it('leaves a chained, unchangeable trail', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await ada.post('/api/shop/lists/classes', { name: 'coach' });
    const db = api.services.database.writer;
    const trail = await db<{ action: string; previous_hash: string; hash: string }>('trail').orderBy('number');
    expect(trail.map((record) => record.action)).toEqual(['open shop', 'add to classes']);
    expect(trail[1]?.previous_hash).toBe(trail[0]?.hash);
    await expect(db('trail').update({ action: 'nothing' })).rejects.toThrow('append-only');
    await expect(db('trail').delete()).rejects.toThrow('append-only');
  });
});
