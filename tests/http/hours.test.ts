import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';
import { booksOf } from '../support/books.ts';

const UNKNOWN = 'AAAAAAAAAAAAAAAAAAAAAA';
const HOUR = 3600;

async function shop() {
  const api = await testApi();
  const ada = await api.owner();
  return { api, ada, books: await booksOf(ada) };
}

describe('hours', () => {
  it('are added, listed with their sums, changed and voided', async () => {
    const { ada, books } = await shop();
    const { id: rebuildId } = await books.rebuild({ tag: 'B-9' });
    const one = await books.hours({ rebuildId, seconds: 2 * HOUR, workedOn: '2026-03-01', task: 'Body' });
    await books.hours({ rebuildId, seconds: HOUR, isPaid: true, workedOn: null });
    const list = async (query = '') => (await ada.get(`/api/hours?${query}`)).body;
    expect(await list()).toMatchObject({
      rows: [{ rebuildTag: 'B-9', task: 'Body', workerName: null }, { workedOn: null }],
      totals: { count: 2, ownSeconds: 2 * HOUR, paidSeconds: HOUR },
    });
    expect((await list('paid=yes')).totals.count).toBe(1);
    expect((await list('find=bod')).rows).toHaveLength(1);
    expect((await list('from=2026-03-02')).rows).toHaveLength(0);
    expect((await list('worker=none&dated=no')).rows).toHaveLength(1);
    const changed = await ada.patch(`/api/hours/${one.id}`, 1, { seconds: 3 * HOUR });
    expect(changed.body).toMatchObject({ seconds: 3 * HOUR, version: 2 });
    expect((await books.row(rebuildId)).ownSeconds).toBe(3 * HOUR);
    await ada.request('post', `/api/hours/${one.id}/void`).set('If-Match', '"2"').send({ reason: 'wrong car' });
    expect((await list()).totals).toEqual({ count: 1, ownSeconds: 0, paidSeconds: HOUR });
    expect((await list('void=only')).rows[0].voidReason).toBe('wrong car');
  });

  it('are paid if the worker is, unless it is said', async () => {
    const { ada, books } = await shop();
    const { id: rebuildId } = await books.rebuild();
    const { body: worker } = await ada.post('/api/shop/workers', { name: 'Sam', isPaid: true });
    expect((await books.hours({ rebuildId, seconds: 1, workerId: worker.id })).isPaid).toBe(true);
    expect((await books.hours({ rebuildId, seconds: 1, workerId: worker.id, isPaid: false })).isPaid).toBe(false);
    expect((await books.hours({ rebuildId, seconds: 1 })).isPaid).toBe(false);
  });

  it('refuse what cannot be, at its field', async () => {
    const { api, ada, books } = await shop();
    const { id: rebuildId } = await books.rebuild();
    const theirs = await (await booksOf(await api.owner('Ben Oake'))).rebuild();
    const faults = [
      [{ rebuildId, seconds: -1 }, 400, '/seconds'],
      [{ rebuildId, seconds: 0.5 }, 400, '/seconds'],
      [{ rebuildId, seconds: 1, workedOn: '2026-13-01' }, 400, '/workedOn'],
      [{ rebuildId: UNKNOWN, seconds: 1 }, 422, '/rebuildId'],
      [{ rebuildId: theirs.id, seconds: 1 }, 422, '/rebuildId'],
      [{ rebuildId, seconds: 1, workerId: UNKNOWN }, 422, '/workerId'],
    ] as const;
    for (const [body, status, pointer] of faults) {
      const reply = await ada.post('/api/hours', body);
      expect([reply.status, reply.body.errors[0].pointer]).toEqual([status, pointer]);
    }
  });

  it('go on by cursor, each once', async () => {
    const { ada, books } = await shop();
    const { id: rebuildId } = await books.rebuild();
    for (let i = 0; i < 120; i += 1) {
      await books.hours({ rebuildId, seconds: i, workedOn: i % 4 === 0 ? null : `2026-02-${10 + (i % 5)}` });
    }
    const first = (await ada.get('/api/hours')).body;
    const second = (await ada.get(`/api/hours?cursor=${first.next}`)).body;
    const ids = [...first.rows, ...second.rows].map((row: { id: string }) => row.id);
    expect([ids.length, new Set(ids).size, second.next, second.totals]).toEqual([120, 120, null, null]);
  });
});

describe('a mechanic', () => {
  it('sees the board of open rebuilds with hours and not one amount', async () => {
    const { api, ada, books } = await shop();
    const max = await api.member(ada, 'mechanic');
    const { id: rebuildId } = await books.rebuild({
      tag: 'open',
      year: 2014,
      make: 'Orrin',
      purchaseCents: 5,
      startedOn: '2026-03-01',
    });
    await books.plan(rebuildId, { parts: 100 }, { plannedSeconds: 60 * HOUR });
    await books.hours({ rebuildId, seconds: 38.5 * HOUR });
    await books.rebuild({ tag: 'gone', soldOn: '2026-05-01', saleCents: 1 });
    const { body, text } = await max.get('/api/board');
    expect(body).toEqual([
      expect.objectContaining({
        tag: 'open',
        name: '2014 Orrin',
        loggedSeconds: 38.5 * HOUR,
        plannedSeconds: 60 * HOUR,
        stage: 'in the shop',
      }),
    ]);
    expect(text).not.toMatch(/cents/i);
  });

  it('logs own hours as their own worker, made on first use, and sees only theirs', async () => {
    const { api, ada, books } = await shop();
    const max = await api.member(ada, 'mechanic');
    const { id: rebuildId } = await books.rebuild();
    await books.hours({ rebuildId, seconds: HOUR });
    const log = (seconds: number) =>
      max.post('/api/my-hours', { rebuildId, workedOn: '2026-06-15', seconds, task: 'Body' });
    const logged = await log(3 * HOUR);
    await log(HOUR);
    expect(logged.body).toMatchObject({ seconds: 3 * HOUR, task: 'Body', canChange: true });
    expect((await max.get('/api/my-hours')).body).toHaveLength(2);
    const { workers } = (await ada.get('/api/shop/lists')).body;
    expect(workers.filter((worker: { name: string }) => worker.name === 'A mechanic')).toEqual([
      expect.objectContaining({ isPaid: true, userId: expect.any(String) }),
    ]);
    expect((await books.detail(rebuildId)).paidSeconds).toBe(4 * HOUR);
  });

  it('takes over the worker of their name whom nobody is linked to', async () => {
    const { api, ada, books } = await shop();
    const { body: worker } = await ada.post('/api/shop/workers', { name: 'A Mechanic', isPaid: false });
    const max = await api.member(ada, 'mechanic');
    const twin = await api.member(ada, 'mechanic');
    const { id: rebuildId } = await books.rebuild();
    const body = { rebuildId, workedOn: '2026-06-15', seconds: HOUR };
    await max.post('/api/my-hours', body);
    await twin.post('/api/my-hours', body);
    const { rows } = (await ada.get('/api/hours')).body;
    expect(rows.filter((row: { workerId: string }) => row.workerId === worker.id)).toHaveLength(1);
    expect(rows[1]).toMatchObject({ workerId: worker.id, isPaid: false });
  });

  it('changes and voids own hours of today, not older ones, nor those of others', async () => {
    const { api, ada, books } = await shop();
    const max = await api.member(ada, 'mechanic');
    const { id: rebuildId } = await books.rebuild();
    const { body: mine } = await max.post('/api/my-hours', { rebuildId, workedOn: '2026-06-14', seconds: HOUR });
    const changed = await max.patch(`/api/my-hours/${mine.id}`, 1, { seconds: 2 * HOUR });
    expect(changed.body).toMatchObject({ seconds: 2 * HOUR, version: 2 });
    await api.services.database.writer('hours').where({ id: mine.id }).update({ created_at: '2026-06-10T12:00:00Z' });
    expect((await max.patch(`/api/my-hours/${mine.id}`, 2, { seconds: HOUR })).status).toBe(403);
    expect((await max.get('/api/my-hours')).body[0].canChange).toBe(false);
    const others = await books.hours({ rebuildId, seconds: HOUR });
    const voided = await max
      .request('post', `/api/my-hours/${others.id}/void`)
      .set('If-Match', '"1"')
      .send({ reason: 'x' });
    expect(voided.status).toBe(404);
  });

  it('logs only on open rebuilds, no day ahead, and at most a day', async () => {
    const { api, ada, books } = await shop();
    const max = await api.member(ada, 'mechanic');
    const { id: rebuildId } = await books.rebuild();
    const sold = await books.rebuild({ soldOn: '2026-05-01', saleCents: 1 });
    const good = { rebuildId, workedOn: '2026-06-15', seconds: HOUR };
    const faults = [
      [{ ...good, rebuildId: sold.id }, 422, '/rebuildId'],
      [{ ...good, rebuildId: UNKNOWN }, 422, '/rebuildId'],
      [{ ...good, workedOn: '2026-06-16' }, 422, '/workedOn'],
      [{ ...good, seconds: 0 }, 400, '/seconds'],
      [{ ...good, seconds: 25 * HOUR }, 400, '/seconds'],
      [{ ...good, isPaid: false }, 400, '/isPaid'],
    ] as const;
    for (const [body, status, pointer] of faults) {
      const reply = await max.post('/api/my-hours', body);
      expect([reply.status, reply.body.errors[0].pointer]).toEqual([status, pointer]);
    }
    expect((await max.get('/api/my-hours')).body).toEqual([]);
  });
});
