import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';
import { booksOf } from '../support/books.ts';

const UNKNOWN = 'AAAAAAAAAAAAAAAAAAAAAA';

async function shop() {
  const api = await testApi();
  const ada = await api.owner();
  return { api, ada, books: await booksOf(ada) };
}

describe('bad input for a rebuild', () => {
  it.each([
    ['/tag', { tag: '  ' }],
    ['/tag', { tag: 'x'.repeat(41) }],
    ['/year', { tag: 'X', year: 1700 }],
    ['/boughtOn', { tag: 'X', boughtOn: '2026-02-30' }],
    ['/purchaseCents', { tag: 'X', purchaseCents: 10.5 }],
    ['/purchaseCents', { tag: 'X', purchaseCents: -1 }],
    ['/saleCents', { tag: 'X', saleCents: 1e13 }],
    ['/odometer', { tag: 'X', odometer: '12' }],
    ['/exitKind', { tag: 'X', exitKind: 'eaten' }],
    ['/notes', { tag: 'X', notes: 'a\u0000b' }],
    ['/version', { tag: 'X', version: 9 }],
  ])('answers 400 at %s', async (pointer, body) => {
    const { ada } = await shop();
    const reply = await ada.post('/api/rebuilds', body);
    expect(reply.status).toBe(400);
    expect(reply.body.errors[0].pointer).toBe(pointer);
  });

  it('answers 409 to a tag that is taken, in any case', async () => {
    const { ada, books } = await shop();
    await books.rebuild({ tag: 'b-1' });
    const reply = await ada.post('/api/rebuilds', { tag: 'B-1' });
    expect([reply.status, reply.body.errors[0].pointer]).toEqual([409, '/tag']);
  });

  it('answers alike to unknown ids and those of another shop, in the path and in the body', async () => {
    const { api, ada, books } = await shop();
    const ben = await api.owner('Ben Oake');
    const his = await booksOf(ben);
    const theirs = await his.rebuild();
    for (const id of [theirs.id, UNKNOWN]) {
      expect((await ada.get(`/api/rebuilds/${id}`)).status).toBe(404);
      expect((await ada.patch(`/api/rebuilds/${id}`, 1, { notes: 'mine' })).status).toBe(404);
    }
    const mine = await books.rebuild();
    for (const id of [his.classId('pickup'), UNKNOWN]) {
      const reply = await ada.patch(`/api/rebuilds/${mine.id}`, 1, { classId: id });
      expect([reply.status, reply.body.errors[0].pointer]).toEqual([422, '/classId']);
    }
    expect((await his.detail(theirs.id)).rebuild.notes).toBeNull();
  });

  it('answers 428 to an edit without a version and 412 to a stale one', async () => {
    const { ada, books } = await shop();
    const { id } = await books.rebuild();
    expect((await ada.request('patch', `/api/rebuilds/${id}`).send({ notes: 'x' })).status).toBe(428);
    await ada.patch(`/api/rebuilds/${id}`, 1, { notes: 'first' });
    const stale = await ada.patch(`/api/rebuilds/${id}`, 1, { notes: 'second', soldOn: '2026-05-01' });
    expect(stale.status).toBe(412);
    expect((await books.detail(id)).rebuild.notes).toBe('first');
  });
});
