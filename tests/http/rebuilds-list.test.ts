import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';
import { booksOf } from '../support/books.ts';

async function shop() {
  const api = await testApi();
  const ada = await api.owner();
  return { api, ada, books: await booksOf(ada) };
}

describe('the list of rebuilds', () => {
  it('goes on by cursor, each once, whatever it is sorted by', async () => {
    const { ada, books } = await shop();
    for (let i = 0; i < 130; i += 1) {
      await books.rebuild({ boughtOn: i % 3 === 0 ? null : `2026-01-${String((i % 28) + 1).padStart(2, '0')}` });
    }
    for (const sort of ['bought', 'tag', 'kept']) {
      const first = (await ada.get(`/api/rebuilds?sort=${sort}`)).body;
      const second = (await ada.get(`/api/rebuilds?sort=${sort}&cursor=${first.next}`)).body;
      expect([first.rows.length, second.rows.length, second.next]).toEqual([100, 30, null]);
      const ids = [...first.rows, ...second.rows].map((row: { id: string }) => row.id);
      expect(new Set(ids).size).toBe(130);
    }
    const days = (await ada.get('/api/rebuilds')).body.rows.map(
      (row: { boughtOn: string | null }) => row.boughtOn ?? '',
    );
    expect(days).toEqual(days.toSorted((a: string, b: string) => (a < b ? 1 : -1)));
  });

  it('filters by stage, class, damage, seen, year left and words, and sums what matches', async () => {
    const { ada, books } = await shop();
    await books.rebuild({
      tag: 'won',
      classId: books.classId('pickup'),
      isSeen: true,
      purchaseCents: 100,
      soldOn: '2025-05-01',
      saleCents: 300,
    });
    await books.rebuild({
      tag: 'lost',
      damageId: books.damageId('hail'),
      purchaseCents: 100,
      soldOn: '2026-05-01',
      saleCents: 40,
    });
    await books.rebuild({ tag: 'open', make: 'Orrin', purchaseCents: 70, isSeen: false });
    const tags = async (query: string) =>
      (await ada.get(`/api/rebuilds?sort=tag&${query}`)).body.rows.map((row: { tag: string }) => row.tag);
    expect(await tags('stage=sold')).toEqual(['lost', 'won']);
    expect(await tags(`class=${books.classId('pickup')}`)).toEqual(['won']);
    expect(await tags(`damage=${books.damageId('hail')}`)).toEqual(['lost']);
    expect(await tags('seen=yes')).toEqual(['won']);
    expect(await tags('seen=unknown')).toEqual(['lost']);
    expect(await tags('year=2026')).toEqual(['lost']);
    expect(await tags('find=orr')).toEqual(['open']);
    expect(await tags('find=%25')).toEqual([]);
    expect((await ada.get('/api/rebuilds')).body.summary).toEqual({
      total: 3,
      leftCount: 2,
      lossCount: 1,
      noPurchaseCount: 0,
      keptCents: 140,
      openCount: 1,
      openCostCents: 70,
    });
  });

  it('refuses a cursor that it did not write and a sort that is not in its list', async () => {
    const { ada } = await shop();
    expect((await ada.get('/api/rebuilds?cursor=nonsense')).status).toBe(400);
    expect((await ada.get('/api/rebuilds?sort=vin')).status).toBe(400);
  });
});
