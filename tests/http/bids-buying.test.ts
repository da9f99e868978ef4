import { describe, expect, it } from 'vitest';
import type { Member } from '../support/api.ts';
import { buildSheet } from '../support/bid-sheet.ts';
import { edit, openBidShop as shop } from '../support/bid-shop.ts';

const PURCHASE = { tag: 'S-41', boughtOn: '2026-06-14', hammerCents: 390_000 };

describe('buying from a sheet', () => {
  it('makes the rebuild with its facts, its estimate locked from the sheet', async () => {
    const { ada, books, keep } = await shop();
    const { id } = await keep({ seller: 'Ottermere lot', tax: { p: 1, q: 20 }, isSeen: true });
    const reply = await edit(ada, `/api/bids/${id}/buy`, 1, PURCHASE);
    expect(reply.status).toBe(201);
    expect(reply.body.bid).toMatchObject({
      state: 'bought',
      version: 2,
      hammerCents: 390_000,
      rebuildId: reply.body.rebuildId,
      rebuildTag: 'S-41',
    });
    const { rebuild, estimates, row } = await books.detail(reply.body.rebuildId);
    expect(rebuild).toMatchObject({
      tag: 'S-41',
      make: 'Orrin',
      odometer: 88_000,
      isSeen: true,
      classId: books.classId('SUV'),
      damageId: books.damageId('front'),
      titleBrandBought: 'salvage',
      boughtFrom: 'Ottermere lot',
      boughtOn: '2026-06-14',
      purchaseCents: 390_000,
    });
    expect(estimates).toHaveLength(1);
    expect(estimates[0]).toMatchObject({
      isBaseline: true,
      revision: 0,
      madeOn: '2026-06-15',
      plannedSeconds: 80 * 3600,
      expectedSaleCents: 1_160_000,
      expectedDays: 83,
    });
    // What the sheet asked for in fields of its own stands where it will be booked: fee and tax are those of 3,900.
    const planned = new Map(estimates[0]?.lines.map(({ categoryId, cents }) => [categoryId, cents]));
    const of = (name: string) => planned.get(books.categoryId(name));
    expect([of('parts'), of('auction fees'), of('tax'), of('transport')]).toEqual([210_000, 65_900, 19_500, 43_000]);
    expect([of('title & registration'), of('selling costs'), of('insurance'), of('paid labor')]).toEqual([
      18_000, 11_000, 41_500, 70_000,
    ]);
    expect(row.estimateCents).toBe(210_000 + 65_900 + 19_500 + 43_000 + 18_000 + 11_000 + 41_500 + 70_000);
    const trail = await ada.get('/api/rebuilds');
    expect(trail.body.summary.total).toBe(7);
  });

  it('makes nothing new when pressed again', async () => {
    const { ada, keep } = await shop();
    const { id } = await keep();
    const url = `/api/bids/${id}/buy`;
    const first = await edit(ada, url, 1, PURCHASE, 'first-press');
    const same = await edit(ada, url, 1, PURCHASE, 'first-press');
    const other = await edit(ada, url, 1, { ...PURCHASE, tag: 'S-42' }, 'second-press');
    expect([same.body.rebuildId, other.body.rebuildId]).toEqual([first.body.rebuildId, first.body.rebuildId]);
    expect((await ada.get('/api/rebuilds')).body.summary.total).toBe(7);
    const outcome = { state: 'open', reason: null, bidMadeCents: null, hammerCents: null };
    expect((await edit(ada, `/api/bids/${id}/outcome`, 2, outcome)).status).toBe(422);
  });

  it('makes nothing at all when something stands in the way', async () => {
    const { ada, keep } = await shop();
    const { id } = await keep();
    const url = `/api/bids/${id}/buy`;
    const taken = await edit(ada, url, 1, { ...PURCHASE, tag: 'S-1' }, 'tag-is-taken');
    expect([taken.status, taken.body.errors[0].pointer]).toEqual([409, '/tag']);
    const stale = await edit(ada, url, 7, PURCHASE, 'stale-version');
    expect(stale.status).toBe(412);
    const { summary } = (await ada.get('/api/rebuilds')).body;
    expect(summary.total).toBe(6);
    expect((await ada.get(`/api/bids/${id}`)).body).toMatchObject({ state: 'open', version: 1 });
  });

  it('makes nothing of a plan that no estimate can hold', async () => {
    const { ada, books, keep } = await shop();
    const most = 1_000_000_000_000;
    const lines = [{ categoryId: books.categoryId('transport'), cents: most }];
    const dear = await keep({ lines, transportCents: most });
    const long = await keep({ ownSeconds: 360_000_000, paidSeconds: 1 });
    for (const { id } of [dear, long]) {
      const reply = await edit(ada, `/api/bids/${id}/buy`, 1, PURCHASE, `buy-${id}`);
      expect([reply.status, reply.body.detail]).toEqual([422, 'The sheet plans for more than an estimate can hold.']);
    }
    expect((await ada.get('/api/rebuilds')).body.summary.total).toBe(6);
  });
});

describe('the fee table', () => {
  const table = (fields: object = {}) => {
    const { feeSteps, feeFlatCents, bidStepCents, tax, transportCents, titleCents, sellingCents } = buildSheet();
    const { holdingCentsPerDay, wantedProfitCents } = buildSheet();
    const fees = { feeSteps, feeFlatCents, bidStepCents, tax };
    return { ...fees, transportCents, titleCents, sellingCents, holdingCentsPerDay, wantedProfitCents, ...fields };
  };
  const put = (member: Member, version: number, body: object) =>
    member.request('put', '/api/fee-table').set('If-Match', `"${version}"`).send(body);

  it('begins empty with a bid step of 50, and is changed on the version that was read', async () => {
    const { ada } = await shop();
    const first = await ada.get('/api/fee-table');
    expect(first.body).toMatchObject({ feeSteps: [], bidStepCents: 5_000, tax: { p: 0, q: 1 }, version: 0 });
    expect((await put(ada, 0, table())).body).toEqual({ ...table(), version: 1 });
    expect((await put(ada, 1, table({ tax: { p: 13, q: 200 } }))).body.version).toBe(2);
    expect((await put(ada, 1, table())).status).toBe(412);
    expect((await put(ada, 0, table())).status).toBe(412);
    expect((await ada.get('/api/fee-table')).body).toEqual({ ...table({ tax: { p: 13, q: 200 } }), version: 2 });
    expect((await ada.get('/api/bids/basis')).body.feeTable.tax).toEqual({ p: 13, q: 200 });
  });

  it('is the owner’s to change; kept sheets stay as they are', async () => {
    const { api, ada, keep } = await shop();
    const { id } = await keep();
    const bookkeeper = await api.member(ada, 'bookkeeper');
    expect((await put(bookkeeper, 0, table())).status).toBe(403);
    await put(ada, 0, table({ feeFlatCents: 100_000 }));
    expect((await ada.get(`/api/bids/${id}`)).body).toMatchObject({ feeFlatCents: 18_900, version: 1 });
  });
});
