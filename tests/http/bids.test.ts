import { describe, expect, it } from 'vitest';
import { edit, openBidShop as shop } from '../support/bid-shop.ts';

const PURCHASE = { tag: 'S-41', boughtOn: '2026-06-14', hammerCents: 390_000 };

describe('a kept sheet', () => {
  it('holds what was typed, what it came to, and who kept it', async () => {
    const { ada, sheet } = await shop();
    const fields = sheet({ ticks: ['front-cooling'], notes: 'cold start was fine' });
    const reply = await ada.post('/api/bids', fields);
    expect([reply.status, reply.headers['etag']]).toEqual([201, '"1"']);
    expect(reply.body.agrees).toBeNull();
    const { body } = await ada.get(`/api/bids/${reply.body.bid.id}`);
    expect(body).toEqual(reply.body.bid);
    expect(body).toMatchObject({
      ...fields,
      state: 'open',
      reason: null,
      rebuildId: null,
      madeOn: '2026-06-15',
      madeByName: 'Ada Wick',
      figures: { planCents: 210_000, repairBudgetCents: 266_700, roomCents: 466_800, bidCents: 395_000 },
    });
  });

  it('is worked out anew here, and says whether the browser showed the same', async () => {
    const { ada, sheet } = await shop();
    const shown = { repairBudgetCents: 266_700, roomCents: 466_800, bidCents: 395_000 };
    const { body: same } = await ada.post('/api/bids', { ...sheet(), shown });
    expect([same.agrees, same.bid.figures.bidCents]).toEqual([true, 395_000]);
    const { body: other } = await ada.post('/api/bids', { ...sheet(), shown: { ...shown, bidCents: 999_900 } });
    expect([other.agrees, other.bid.figures.bidCents]).toEqual([false, 395_000]);
  });

  it('is kept once, however often it is sent', async () => {
    const { ada, sheet } = await shop();
    const first = await ada.post('/api/bids', sheet(), 'sheet-on-the-lot');
    const again = await ada.post('/api/bids', sheet(), 'sheet-on-the-lot');
    expect(again.body).toEqual(first.body);
    expect((await ada.get('/api/bids')).body.total).toBe(1);
  });

  it('is changed on the version that was read, and its figures with it', async () => {
    const { ada, keep } = await shop();
    const { id } = await keep();
    const changed = await ada.patch(`/api/bids/${id}`, 1, { wantedProfitCents: 0, isSeen: null });
    expect(changed.body.bid).toMatchObject({ version: 2, isSeen: null, figures: { roomCents: 559_800 } });
    expect(changed.body.bid.transportCents).toBe(43_000);
    const stale = await ada.patch(`/api/bids/${id}`, 1, { name: 'stale' });
    expect([stale.status, stale.body.type]).toEqual([412, '/problems/changed-meanwhile']);
    expect((await ada.request('patch', `/api/bids/${id}`).send({ name: 'x' })).status).toBe(428);
  });

  it('refuses amounts that together are too large to be reckoned exactly', async () => {
    const { ada, sheet } = await shop();
    const reply = await ada.post('/api/bids', sheet({ days: 10_000, holdingCentsPerDay: 1_000_000_000_000 }));
    expect([reply.status, reply.body.detail]).toEqual([422, 'These amounts are too large to work out a bid.']);
    expect((await ada.get('/api/bids')).body.total).toBe(0);
  });

  it('refuses what cannot be, at its field', async () => {
    const { ada, sheet, books } = await shop();
    const faults = async (fields: object) => {
      const { status, body } = await ada.post('/api/bids', { ...sheet(), ...fields });
      return [status, ...(body.errors ?? []).map(({ pointer }: { pointer: string }) => pointer)];
    };
    expect(await faults({ expectedSaleCents: -1 })).toEqual([400, '/expectedSaleCents']);
    expect(await faults({ tax: { p: 1, q: 0 } })).toEqual([400, '/tax/q']);
    expect(
      await faults({
        feeSteps: [
          [0, 1],
          [0, 2],
        ],
      }),
    ).toEqual([400, '/feeSteps']);
    expect(await faults({ bidStepCents: 0 })).toEqual([400, '/bidStepCents']);
    expect(await faults({ bidCents: 1 })).toEqual([400, '/bidCents']);
    const stranger = 'A'.repeat(22);
    const lines = [
      { categoryId: books.categoryId('parts'), cents: 1 },
      { categoryId: stranger, cents: 1 },
    ];
    expect(await faults({ classId: stranger, lines })).toEqual([422, '/classId', '/lines/1/categoryId']);
    expect((await ada.get('/api/bids')).body.total).toBe(0);
  });

  it('closes with a reason, opens again, and takes no change while closed', async () => {
    const { ada, keep } = await shop();
    const { id } = await keep();
    const url = `/api/bids/${id}/outcome`;
    const outcome = { state: 'not bought', reason: null, bidMadeCents: 390_000, hammerCents: 431_000 };
    const nameless = await edit(ada, url, 1, outcome);
    expect([nameless.status, nameless.body.errors[0].pointer]).toEqual([400, '/reason']);
    const closed = await edit(ada, url, 1, { ...outcome, reason: 'Went above the walk-away bid.' });
    expect(closed.body).toMatchObject({ state: 'not bought', version: 2, hammerCents: 431_000, bidMadeCents: 390_000 });
    expect((await ada.patch(`/api/bids/${id}`, 2, { name: 'x' })).status).toBe(422);
    expect((await edit(ada, `/api/bids/${id}/buy`, 2, PURCHASE)).status).toBe(422);
    const open = await edit(ada, url, 2, { ...outcome, state: 'open', reason: 'ignored' });
    expect(open.body).toMatchObject({ state: 'open', reason: null, version: 3 });
  });

  it('is listed with the others, the latest first, by state', async () => {
    const { ada, keep } = await shop();
    const first = await keep({ name: 'first' });
    await keep({ name: 'second', classId: null, expectedSaleCents: 0 });
    await edit(ada, `/api/bids/${first.id}/outcome`, 1, {
      state: 'not bought',
      reason: 'rust',
      bidMadeCents: null,
      hammerCents: null,
    });
    const all = (await ada.get('/api/bids')).body;
    expect(all).toMatchObject({ total: 2, next: null });
    expect(all.rows.map(({ name }: { name: string }) => name)).toEqual(['second', 'first']);
    expect(all.rows[0]).toMatchObject({ className: null, bidCents: null });
    expect(all.rows[1]).toMatchObject({ className: 'SUV', damageName: 'front', planCents: 210_000, bidCents: 395_000 });
    const open = (await ada.get('/api/bids?state=open')).body;
    expect([open.total, open.rows[0].name]).toEqual([1, 'second']);
    expect((await ada.get('/api/bids?cursor=nonsense')).status).toBe(400);
  });

  it('is listed a hundred a page', async () => {
    const { api, ada, keep } = await shop();
    await keep();
    const { writer } = api.services.database;
    const kept = await writer('bid_sheets').first();
    const copies = Array.from({ length: 120 }, (_, i) => ({ ...kept, id: String(i).padStart(22, '0') }));
    for (let i = 0; i < 120; i += 40) await writer('bid_sheets').insert(copies.slice(i, i + 40));
    const first = (await ada.get('/api/bids')).body;
    const second = (await ada.get(`/api/bids?cursor=${first.next}`)).body;
    expect([first.rows.length, second.rows.length, second.next, first.total]).toEqual([100, 21, null, 121]);
    const ids = [...first.rows, ...second.rows].map(({ id }: { id: string }) => id);
    expect(new Set(ids).size).toBe(121);
  });
});

describe('who may', () => {
  it('owner and bookkeeper keep and buy, the accountant reads, the others neither', async () => {
    const { api, ada, sheet } = await shop();
    const statuses: (string | number)[][] = [];
    for (const role of ['bookkeeper', 'accountant', 'mechanic', 'partner'] as const) {
      const member = await api.member(ada, role);
      const reads = [
        await member.get('/api/bids'),
        await member.get('/api/bids/basis'),
        await member.get('/api/fee-table'),
      ];
      statuses.push([role, ...reads.map(({ status }) => status), (await member.post('/api/bids', sheet())).status]);
    }
    expect(statuses).toEqual([
      ['bookkeeper', 200, 200, 200, 201],
      ['accountant', 200, 200, 200, 403],
      ['mechanic', 403, 403, 403, 403],
      ['partner', 403, 403, 403, 403],
    ]);
  });

  it('no one of another shop', async () => {
    const { api, ada, keep } = await shop();
    const { id } = await keep();
    const bo = await api.owner('Bo Lund');
    expect((await bo.get('/api/bids')).body).toMatchObject({ rows: [], total: 0 });
    expect((await bo.get(`/api/bids/${id}`)).status).toBe(404);
    expect((await bo.patch(`/api/bids/${id}`, 1, { name: 'mine' })).status).toBe(404);
    expect((await edit(bo, `/api/bids/${id}/buy`, 1, PURCHASE)).status).toBe(404);
    const outcome = { state: 'not bought', reason: 'mine', bidMadeCents: null, hammerCents: null };
    expect((await edit(bo, `/api/bids/${id}/outcome`, 1, outcome)).status).toBe(404);
    expect((await bo.get('/api/bids/basis')).body).toMatchObject({ past: [], pastTotal: 0, surprises: [{ n: 0 }] });
    expect((await ada.get(`/api/bids/${id}`)).body).toMatchObject({ state: 'open', version: 1 });
  });
});
