import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';
import { booksOf } from '../support/books.ts';

const UNKNOWN = 'AAAAAAAAAAAAAAAAAAAAAA';

async function shop() {
  const api = await testApi();
  const ada = await api.owner();
  return { api, ada, books: await booksOf(ada) };
}

describe('the plan', () => {
  it('is made, changed, locked, then only revised beside it; the first stays what overruns are against', async () => {
    const { ada, books } = await shop();
    const { id } = await books.rebuild();
    const plan = await books.plan(id, { parts: 100 });
    const url = `/api/rebuilds/${id}/estimates/${plan.id}`;
    const early = await ada.post(`/api/rebuilds/${id}/estimates`, {
      lines: [],
      plannedSeconds: null,
      expectedSaleCents: null,
      expectedDays: null,
      note: null,
    });
    expect(early.status).toBe(422);
    const changed = await ada.patch(url, 1, { lines: [{ categoryId: books.categoryId('tax'), cents: 250 }] });
    expect(changed.body.lines).toEqual([{ categoryId: books.categoryId('tax'), cents: 250 }]);
    expect((await books.row(id)).estimateCents).toBeNull();
    expect(await books.lock(changed.body)).toMatchObject({ isBaseline: true });
    expect((await ada.patch(url, 3, { note: 'later' })).status).toBe(422);
    const revision = await books.lock(await books.plan(id, { parts: 900 }));
    expect(revision).toMatchObject({ revision: 1, isBaseline: false });
    expect((await books.row(id)).estimateCents).toBe(250);
  });

  it('refuses a category of nobody, one twice, and a negative amount, each at its line', async () => {
    const { ada, books } = await shop();
    const { id } = await books.rebuild();
    const body = { plannedSeconds: null, expectedSaleCents: null, expectedDays: null, note: null };
    const post = (lines: object[]) => ada.post(`/api/rebuilds/${id}/estimates`, { ...body, lines });
    const parts = books.categoryId('parts');
    const stranger = await post([
      { categoryId: parts, cents: 1 },
      { categoryId: UNKNOWN, cents: 1 },
    ]);
    expect([stranger.status, stranger.body.errors[0].pointer]).toEqual([422, '/lines/1/categoryId']);
    expect(
      (
        await post([
          { categoryId: parts, cents: 1 },
          { categoryId: parts, cents: 2 },
        ])
      ).body.errors[0].pointer,
    ).toBe('/lines');
    expect((await post([{ categoryId: parts, cents: -1 }])).body.errors[0].pointer).toBe('/lines/0/cents');
  });

  it('refuses more planned hours than hours can be logged', async () => {
    const { ada, books } = await shop();
    const { id } = await books.rebuild();
    const body = { lines: [], expectedSaleCents: null, expectedDays: null, note: null };
    const reply = await ada.post(`/api/rebuilds/${id}/estimates`, { ...body, plannedSeconds: 2 ** 53 - 1 });
    expect([reply.status, reply.body.errors[0].pointer]).toEqual([400, '/plannedSeconds']);
  });

  it('belongs to its rebuild: under another it is not there', async () => {
    const { ada, books } = await shop();
    const one = await books.rebuild();
    const other = await books.rebuild();
    const plan = await books.plan(one.id, { parts: 100 });
    expect((await ada.patch(`/api/rebuilds/${other.id}/estimates/${plan.id}`, 1, { note: 'x' })).status).toBe(404);
  });
});
