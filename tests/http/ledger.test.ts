import { describe, expect, it } from 'vitest';
import type { EntryRow } from '#shared/contracts/ledger.ts';
import { testApi } from '../support/api.ts';
import { booksOf } from '../support/books.ts';

const UNKNOWN = 'AAAAAAAAAAAAAAAAAAAAAA';

async function shop() {
  const api = await testApi();
  const ada = await api.owner();
  const books = await booksOf(ada);
  const list = async (query = '') => (await ada.get(`/api/entries?${query}`)).body;
  const whats = async (query = '') => (await list(query)).rows.map((row: EntryRow) => row.what);
  return { api, ada, books, list, whats };
}

describe('an entry', () => {
  it('is added, shown with its words, changed and summed', async () => {
    const { ada, books, list } = await shop();
    const { id: rebuildId } = await books.rebuild({ tag: 'B-1', purchaseCents: 1000 });
    const entry = await books.entry({ rebuildId, cents: 4500, vendor: 'Yard', what: 'door', foreseen: 'foreseen' });
    expect(entry).toMatchObject({ rebuildTag: 'B-1', categoryName: 'parts', isExtra: false, version: 1 });
    const changed = await ada.patch(`/api/entries/${entry.id}`, 1, { cents: 5000, foreseen: null });
    expect(changed.body).toMatchObject({ cents: 5000, foreseen: null, what: 'door', version: 2 });
    expect(await list()).toMatchObject({ totals: { count: 1, cents: 5000, freeValueCents: 0 }, next: null });
    expect((await books.row(rebuildId)).costCents).toBe(6000);
  });

  it('moves between rebuilds and to overhead, and the sums move with it', async () => {
    const { ada, books } = await shop();
    const one = await books.rebuild({ purchaseCents: 0 });
    const two = await books.rebuild({ purchaseCents: 0 });
    const entry = await books.entry({ rebuildId: one.id, cents: 700 });
    await ada.patch(`/api/entries/${entry.id}`, 1, { rebuildId: two.id });
    expect([(await books.row(one.id)).costCents, (await books.row(two.id)).costCents]).toEqual([0, 700]);
    await ada.patch(`/api/entries/${entry.id}`, 2, { rebuildId: null });
    expect((await books.row(two.id)).costCents).toBe(0);
  });

  it('may be a credit, or free with its market value, which counts for planning only', async () => {
    const { books } = await shop();
    const { id: rebuildId } = await books.rebuild({ purchaseCents: 0 });
    await books.entry({ rebuildId, cents: -300 });
    await books.entry({ rebuildId, cents: 0, freeValueCents: 5000 });
    expect(await books.row(rebuildId)).toMatchObject({ costCents: -300, planningCents: 4700 });
  });

  it('is voided with a reason, leaves the sums, is hidden unless asked for, and cannot change any more', async () => {
    const { ada, books, list } = await shop();
    const { id: rebuildId } = await books.rebuild({ purchaseCents: 0 });
    const entry = await books.entry({ rebuildId, cents: 900 });
    const blank = await ada
      .request('post', `/api/entries/${entry.id}/void`)
      .set('If-Match', '"1"')
      .send({ reason: ' ' });
    expect(blank.body.errors[0].pointer).toBe('/reason');
    expect(await books.voidEntry(entry)).toMatchObject({ voidReason: 'entered twice', version: 2 });
    expect((await books.row(rebuildId)).costCents).toBe(0);
    expect((await list()).rows).toEqual([]);
    expect(await list('void=show')).toMatchObject({ rows: [{ id: entry.id }], totals: { count: 0, cents: 0 } });
    expect((await ada.patch(`/api/entries/${entry.id}`, 2, { cents: 1 })).status).toBe(422);
  });

  it('is written once for one key, however often it is sent', async () => {
    const { ada, books, list } = await shop();
    const body = { categoryId: books.categoryId(), cents: 100, datedOn: '2026-03-01' };
    const first = await ada.post('/api/entries', body, 'same-key-1');
    const again = await ada.post('/api/entries', body, 'same-key-1');
    expect([again.status, again.body.id]).toEqual([201, first.body.id]);
    expect((await list()).totals.count).toBe(1);
  });
});

describe('a split bill', () => {
  it('adds up to the cent over its shares, and is voided whole', async () => {
    const { ada, books, list } = await shop();
    const one = await books.rebuild({ purchaseCents: 0 });
    const two = await books.rebuild({ purchaseCents: 0 });
    const bill = await ada.post('/api/entries/split', {
      categoryId: books.categoryId(),
      cents: 1000,
      datedOn: '2026-03-01',
      what: 'donor car',
      shares: [
        { rebuildId: one.id, weight: 1 },
        { rebuildId: two.id, weight: 1 },
        { rebuildId: null, weight: 1 },
      ],
    });
    expect(bill.body.map((share: EntryRow) => share.cents)).toEqual([334, 333, 333]);
    const { body } = await ada.get(`/api/entries/${bill.body[0].id}`);
    expect(body.shares.map((share: { cents: number }) => share.cents)).toEqual([334, 333, 333]);
    const apart = await ada.patch(`/api/entries/${bill.body[1].id}`, 1, { cents: 1 });
    expect([apart.status, apart.body.errors[0].pointer]).toEqual([422, '/cents']);
    await books.voidEntry(bill.body[1]);
    expect((await list()).totals).toEqual({ count: 0, cents: 0, freeValueCents: 0 });
    expect([(await books.row(one.id)).costCents, (await books.row(two.id)).costCents]).toEqual([0, 0]);
  });

  it('refuses one share, a rebuild twice, and a stranger, at the share', async () => {
    const { ada, books } = await shop();
    const { id } = await books.rebuild();
    const split = (shares: object[]) =>
      ada.post('/api/entries/split', { categoryId: books.categoryId(), cents: 100, datedOn: '2026-03-01', shares });
    expect((await split([{ rebuildId: id, weight: 1 }])).body.errors[0].pointer).toBe('/shares');
    expect(
      (
        await split([
          { rebuildId: id, weight: 1 },
          { rebuildId: id, weight: 2 },
        ])
      ).status,
    ).toBe(400);
    const stranger = await split([
      { rebuildId: id, weight: 1 },
      { rebuildId: UNKNOWN, weight: 1 },
    ]);
    expect([stranger.status, stranger.body.errors[0].pointer]).toEqual([422, '/shares/1/rebuildId']);
  });
});

describe('the ledger', () => {
  it('filters by everything it offers', async () => {
    const { books, whats, list } = await shop();
    const { id: rebuildId } = await books.rebuild();
    await books.entry({ rebuildId, cents: 1, what: 'planned', foreseen: 'foreseen', datedOn: '2026-01-01' });
    await books.entry({
      rebuildId,
      cents: 2,
      what: 'found',
      foreseen: 'surprise',
      datedOn: '2026-02-01',
      vendor: '100% Steel',
    });
    await books.entry({ rebuildId, cents: 4, what: 'wanted', isExtra: true, datedOn: '2026-03-01' });
    await books.entry({ rebuildId, cents: 8, what: 'old', datedOn: null });
    await books.entry({ cents: 16, what: 'rent', categoryId: books.categoryId('insurance'), datedOn: '2026-04-01' });
    expect(await whats()).toEqual(['rent', 'wanted', 'found', 'planned', 'old']);
    expect(await whats('rebuild=none')).toEqual(['rent']);
    expect(await whats(`rebuild=${rebuildId}&kind=foreseen`)).toEqual(['planned']);
    expect(await whats('kind=surprise')).toEqual(['found']);
    expect(await whats('kind=chosen%20extra')).toEqual(['wanted']);
    expect(await whats('kind=not%20said')).toEqual(['rent', 'old']);
    expect(await whats(`category=${books.categoryId('insurance')}`)).toEqual(['rent']);
    expect(await whats('from=2026-02-01&to=2026-03-01')).toEqual(['wanted', 'found']);
    expect(await whats('dated=no')).toEqual(['old']);
    expect(await whats('find=100%25')).toEqual(['found']);
    expect(await whats('find=WANT')).toEqual(['wanted']);
    expect((await list('from=2026-02-01&to=2026-03-01')).totals).toMatchObject({ count: 2, cents: 6 });
  });

  it('goes on by cursor over days and into the undated ones, each entry once', async () => {
    const { books, list } = await shop();
    const { id: rebuildId } = await books.rebuild();
    for (let i = 0; i < 230; i += 1) {
      await books.entry({
        rebuildId,
        cents: i,
        datedOn: i < 110 ? null : `2026-01-${String((i % 9) + 1).padStart(2, '0')}`,
      });
    }
    const pages = [await list()];
    while (pages.at(-1).next) pages.push(await list(`cursor=${pages.at(-1).next}`));
    const rows: EntryRow[] = pages.flatMap((page) => page.rows);
    expect(pages.map((page) => page.rows.length)).toEqual([100, 100, 30]);
    expect(new Set(rows.map((row) => row.id)).size).toBe(230);
    const days = rows.map((row) => row.datedOn ?? '');
    expect(days).toEqual(days.toSorted((a: string, b: string) => (a < b ? 1 : -1)));
    expect(pages.map((page) => page.totals?.count ?? null)).toEqual([230, null, null]);
  });
});

describe('bad input for an entry', () => {
  const good = { datedOn: '2026-03-01', cents: 100 };
  it.each([
    ['/cents', { ...good, cents: 1.5 }],
    ['/cents', { ...good, cents: '100' }],
    ['/cents', { ...good, cents: 1e13 }],
    ['/cents', { ...good, freeValueCents: 500 }],
    ['/datedOn', { ...good, datedOn: '2025-02-29' }],
    ['/datedOn', { cents: 100 }],
    ['/foreseen', { ...good, foreseen: 'maybe' }],
    ['/freeValueCents', { ...good, cents: 0, freeValueCents: -1 }],
    ['/what', { ...good, what: 'x'.repeat(501) }],
    ['/splitId', { ...good, splitId: UNKNOWN }],
  ])('answers 400 at %s', async (pointer, fields) => {
    const { ada, books } = await shop();
    const reply = await ada.post('/api/entries', { categoryId: books.categoryId(), ...fields });
    expect([reply.status, reply.body.errors[0].pointer]).toEqual([400, pointer]);
  });

  it('answers 422 at the field to a category or rebuild of another shop, as to an unknown one', async () => {
    const { api, ada, books } = await shop();
    const his = await booksOf(await api.owner('Ben Oake'));
    const theirs = await his.rebuild();
    const entry = await books.entry({ cents: 1 });
    for (const change of [
      { categoryId: his.categoryId() },
      { categoryId: UNKNOWN },
      { rebuildId: theirs.id },
      { rebuildId: UNKNOWN },
    ]) {
      const pointer = `/${Object.keys(change)[0]}`;
      const added = await ada.post('/api/entries', { ...good, categoryId: books.categoryId(), ...change });
      const changed = await ada.patch(`/api/entries/${entry.id}`, 1, change);
      for (const reply of [added, changed])
        expect([reply.status, reply.body.errors[0].pointer]).toEqual([422, pointer]);
    }
    const foreign = await his.entry({ cents: 1 });
    expect((await ada.get(`/api/entries/${foreign.id}`)).status).toBe(404);
    expect((await ada.patch(`/api/entries/${foreign.id}`, 1, { cents: 2 })).status).toBe(404);
  });

  it('refuses a change that leaves overhead without a day, or a free thing with a cost', async () => {
    const { ada, books } = await shop();
    const { id: rebuildId } = await books.rebuild();
    const undated = await books.entry({ rebuildId, cents: 1, datedOn: null });
    const free = await books.entry({ rebuildId, cents: 0, freeValueCents: 9 });
    const moved = await ada.patch(`/api/entries/${undated.id}`, 1, { rebuildId: null });
    const priced = await ada.patch(`/api/entries/${free.id}`, 1, { cents: 5 });
    expect([moved.status, moved.body.errors[0].pointer]).toEqual([422, '/datedOn']);
    expect([priced.status, priced.body.errors[0].pointer]).toEqual([422, '/cents']);
  });

  it('answers 428 without a version and 412 to a stale one', async () => {
    const { ada, books } = await shop();
    const entry = await books.entry({ cents: 1 });
    expect((await ada.request('patch', `/api/entries/${entry.id}`).send({ cents: 2 })).status).toBe(428);
    await ada.patch(`/api/entries/${entry.id}`, 1, { cents: 2 });
    expect((await ada.patch(`/api/entries/${entry.id}`, 1, { cents: 3 })).status).toBe(412);
  });
});

describe('a receipt from a mechanic', () => {
  it('goes on an open rebuild, dated today, and no amount comes back', async () => {
    const { api, ada, books, list } = await shop();
    const max = await api.member(ada, 'mechanic');
    const { id: rebuildId } = await books.rebuild({ purchaseCents: 0 });
    const body = { rebuildId, categoryId: books.categoryId(), cents: 12_345, what: 'cracked hinge', isSurprise: true };
    const reply = await max.post('/api/receipts', body);
    expect(reply.body).toEqual({ id: reply.body.id, what: 'cracked hinge' });
    expect(JSON.stringify(reply.body)).not.toContain('12345');
    expect((await list()).rows[0]).toMatchObject({ cents: 12_345, foreseen: 'surprise', datedOn: '2026-06-15' });
    const sold = await books.rebuild({ soldOn: '2026-06-01', saleCents: 1 });
    const late = await max.post('/api/receipts', { ...body, rebuildId: sold.id });
    expect([late.status, late.body.errors[0].pointer]).toEqual([422, '/rebuildId']);
  });
});
