import { describe, expect, it } from 'vitest';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { openSmallShop } from '../support/small-shop.ts';

// Source of the figures: worked out by hand from the table in support/small-shop.ts. Overruns: −50, 0, 50 and 100 %.

describe('adopting a rule', () => {
  it('works the figure out anew and keeps what it rests on', async () => {
    const { ada } = await openSmallShop();
    const reply = await ada.post('/api/rules', { year: 2027, level: '4/5', kind: 'percent', note: 'Winter review' });
    expect(reply.status).toBe(201);
    expect(reply.body).toMatchObject({
      year: 2027,
      revision: 1,
      kind: 'percent',
      level: '4/5',
      percent: 100,
      flatCents: null,
      rebuildCount: 4,
      dataUntil: '2026-05-01',
      adoptedOn: '2026-06-15',
      adoptedByName: 'Ada Wick',
      note: 'Winter review',
      evidence: { n: 4, k: 4, guarantee: 0.8, uplift: 1, flatCents: null, covered: 0, scored: 0 },
    });
  });

  it('takes the two-part rule: percent for known work, dollars for surprises', async () => {
    const { ada } = await openSmallShop();
    const { body } = await ada.post('/api/rules', { year: 2026, level: '1/2', kind: 'two-part' });
    // Creep (9 − 10)/48 is below 0, so 0 %; of −500, 0, 400 and 1,000 the third.
    expect(body).toMatchObject({ kind: 'two-part', percent: 0, flatCents: 40_000, evidence: { k: 3, uplift: null } });
  });

  it('keeps every revision; the last one is in force', async () => {
    const { ada, ask } = await openSmallShop();
    await ada.post('/api/rules', { year: 2026, level: '4/5', kind: 'percent' });
    await ada.post('/api/rules', { year: 2026, level: '1/2', kind: 'percent' });
    const { body } = await ada.get('/api/rules');
    expect(body.rules.map((rule: { revision: number; percent: number }) => [rule.revision, rule.percent])).toEqual([
      [2, 50],
      [1, 100],
    ]);
    const answer = await ask<ContingencyAnswer>('contingency');
    expect(answer.thisYear).toMatchObject({ year: 2026, rule: { revision: 2, percent: 50 } });
    expect(answer.thisYear.rule?.record).toMatchObject({ n: 0, x: 0, rate: null, openCount: 0 });
    expect(answer.nextYear).toEqual({ year: 2027, rule: null });
  });

  it('adopts once, however often the request comes', async () => {
    const { ada } = await openSmallShop();
    const wish = { year: 2026, level: '4/5', kind: 'percent' };
    const first = await ada.post('/api/rules', wish, 'adopt-2026-1');
    const again = await ada.post('/api/rules', wish, 'adopt-2026-1');
    expect(again.body).toEqual(first.body);
    expect((await ada.get('/api/rules')).body.rules).toHaveLength(1);
  });

  it('refuses a level with too few rebuilds, a far year and unknown words', async () => {
    const { ada } = await openSmallShop();
    const few = await ada.post('/api/rules', { year: 2026, level: '9/10', kind: 'percent' });
    expect([few.status, few.body.errors[0].pointer]).toEqual([422, '/level']);
    const far = await ada.post('/api/rules', { year: 2030, level: '4/5', kind: 'percent' });
    expect([far.status, far.body.errors[0].pointer]).toEqual([422, '/year']);
    const odd = await ada.post('/api/rules', { year: 2026, level: '67%', kind: 'percent', percent: 5 });
    expect(odd.status).toBe(400);
    expect((await ada.get('/api/rules')).body.rules).toEqual([]);
  });

  it('lets the bookkeeper adopt, the accountant read, the others neither', async () => {
    const { api, ada } = await openSmallShop();
    const wish = { year: 2026, level: '4/5', kind: 'percent' };
    const statuses: [string, number, number][] = [];
    for (const role of ['bookkeeper', 'accountant', 'mechanic', 'partner'] as const) {
      const member = await api.member(ada, role);
      statuses.push([role, (await member.get('/api/rules')).status, (await member.post('/api/rules', wish)).status]);
    }
    expect(statuses).toEqual([
      ['bookkeeper', 200, 201],
      ['accountant', 200, 403],
      ['mechanic', 403, 403],
      ['partner', 403, 403],
    ]);
  });

  it('stands in the trail, and in no other shop', async () => {
    const { api, ada } = await openSmallShop();
    await ada.post('/api/rules', { year: 2026, level: '4/5', kind: 'percent' });
    const last = await api.services.database.reader('trail').orderBy('number', 'desc').first('action', 'after');
    expect(last.action).toBe('adopt rule');
    expect(JSON.parse(last.after)).toMatchObject({ percent: 100, dataUntil: '2026-05-01' });
    const bo = await api.owner('Bo Lund');
    expect((await bo.get('/api/rules')).body.rules).toEqual([]);
  });

  it('may be set above what the books ask, and keeps both figures', async () => {
    const { ada } = await openSmallShop();
    const more = { year: 2026, level: '1/2', kind: 'two-part', percent: 5, flatCents: 50_000 };
    const { status, body } = await ada.post('/api/rules', more);
    expect(status).toBe(201);
    expect(body).toMatchObject({ percent: 5, flatCents: 50_000, review: null });
    expect(body.evidence).toMatchObject({ askedPercent: 0, askedFlatCents: 40_000, flatCents: 40_000 });
  });

  it('is set below it only with a reason', async () => {
    const { ada } = await openSmallShop();
    const less = { year: 2026, level: '1/2', kind: 'percent', percent: 49 };
    const bare = await ada.post('/api/rules', less);
    expect([bare.status, bare.body.errors[0].pointer]).toEqual([422, '/note']);
    expect((await ada.post('/api/rules', { ...less, note: '   ' })).status).toBe(422);
    const said = await ada.post('/api/rules', { ...less, note: 'We stopped buying flood cars' });
    expect(said.body).toMatchObject({ percent: 49, evidence: { askedPercent: 50 } });
    const part = { year: 2026, level: '1/2', kind: 'two-part', percent: 9, flatCents: 39_999 };
    expect((await ada.post('/api/rules', part)).body.errors[0].pointer).toBe('/note');
  });

  it('refuses figures that are no rule', async () => {
    const { ada } = await openSmallShop();
    const wish = { year: 2026, level: '1/2', kind: 'percent' };
    expect((await ada.post('/api/rules', { ...wish, percent: 50.5 })).status).toBe(400);
    expect((await ada.post('/api/rules', { ...wish, percent: 1001 })).status).toBe(400);
    expect((await ada.post('/api/rules', { ...wish, percent: -1 })).status).toBe(400);
    const flat = await ada.post('/api/rules', { ...wish, flatCents: 100 });
    expect([flat.status, flat.body.errors[0].pointer]).toEqual([422, '/flatCents']);
    const unknown = await ada.post('/api/rules', { ...wish, reviewedRuleId: 'A'.repeat(22) });
    expect([unknown.status, unknown.body.errors[0].pointer]).toEqual([422, '/reviewedRuleId']);
  });

  it('refuses a rule that no plan could carry', async () => {
    const { ada, books } = await openSmallShop();
    for (const i of [0, 1, 2, 3, 4, 5]) {
      const { id } = await books.rebuild({ boughtOn: `2023-01-0${i + 1}`, soldOn: '2023-05-01', saleCents: 1 });
      await books.lock(await books.plan(id, { parts: 100 }));
      await books.entry({ rebuildId: id, cents: 2_000 });
    }
    const wild = await ada.post('/api/rules', { year: 2026, level: '4/5', kind: 'percent' });
    expect([wild.status, wild.body.errors[0].detail]).toEqual([
      422,
      'The books ask for 1900%: no plan can carry that. Look at the estimates first.',
    ]);
  });
});
