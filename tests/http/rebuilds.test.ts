import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';
import { booksOf } from '../support/books.ts';

const UNKNOWN = 'AAAAAAAAAAAAAAAAAAAAAA';

async function shop() {
  const api = await testApi();
  const ada = await api.owner();
  return { api, ada, books: await booksOf(ada) };
}

describe('a rebuild', () => {
  it('is added, read with an ETag, changed with it, and shown in the list', async () => {
    const { ada, books } = await shop();
    const rebuild = await books.rebuild({ tag: 'B-062', year: 2014, make: 'Orrin', boughtOn: '2026-02-01' });
    const read = await ada.get(`/api/rebuilds/${rebuild.id}`);
    expect(read.headers['etag']).toBe('"1"');
    expect(read.body.row).toMatchObject({ tag: 'B-062', name: '2014 Orrin', stage: 'bought', keptCents: null });
    const changed = await ada.patch(`/api/rebuilds/${rebuild.id}`, 1, { startedOn: '2026-02-10' });
    expect(changed.body).toMatchObject({ startedOn: '2026-02-10', boughtOn: '2026-02-01', version: 2 });
    const { body } = await ada.get('/api/rebuilds');
    expect(body.rows.map((row: { stage: string }) => row.stage)).toEqual(['in the shop']);
  });

  it('sums its money and hours: all-in cost, kept, per own hour, overrun against the locked plan', async () => {
    const { books } = await shop();
    const { id } = await books.rebuild({
      boughtOn: '2026-01-01',
      purchaseCents: 500_000,
      soldOn: '2026-05-01',
      saleCents: 1_000_000,
    });
    await books.lock(await books.plan(id, { parts: 200_000, tax: 50_000 }, { plannedSeconds: 36_000 }));
    await books.entry({ rebuildId: id, cents: 210_000, foreseen: 'foreseen' });
    await books.entry({ rebuildId: id, cents: 60_000, foreseen: 'surprise' });
    await books.entry({ rebuildId: id, cents: 30_000, foreseen: 'foreseen', isExtra: true });
    await books.hours({ rebuildId: id, seconds: 72_000, workedOn: '2026-02-01' });
    const detail = await books.detail(id);
    expect(detail.row).toMatchObject({
      stage: 'sold',
      daysHeld: 120,
      costCents: 800_000,
      proceedsCents: 1_000_000,
      keptCents: 200_000,
      ownSeconds: 72_000,
      keptPerHourCents: 10_000,
      estimateCents: 250_000,
      planningCents: 270_000,
      surpriseCents: 60_000,
      overrunRate: 0.08,
    });
    expect(detail.categories).toEqual([
      expect.objectContaining({
        name: 'parts',
        estimateCents: 200_000,
        paidCents: 300_000,
        planningCents: 270_000,
        surpriseCents: 60_000,
        extraCents: 30_000,
      }),
      expect.objectContaining({ name: 'tax', estimateCents: 50_000, paidCents: 0, entryCount: 0 }),
    ]);
    expect(detail).toMatchObject({ plannedSeconds: 36_000, paidSeconds: 0 });
  });

  it('says nothing of money where the purchase is not known', async () => {
    const { books } = await shop();
    const { id } = await books.rebuild({ soldOn: '2026-05-01', saleCents: 1_000_000 });
    expect(await books.row(id)).toMatchObject({
      costCents: null,
      keptCents: null,
      proceedsCents: 1_000_000,
      daysHeld: null,
    });
  });

  it('counts days of each stage, and leaves out what is not known', async () => {
    const { books } = await shop();
    const { id } = await books.rebuild({ boughtOn: '2026-01-01', pickedUpOn: '2026-01-05', startedOn: '2026-01-20' });
    const { stageDays } = await books.detail(id);
    expect(stageDays.slice(0, 3).map((stage) => stage.days)).toEqual([4, 15, null]);
  });
});

describe('leaving the shop', () => {
  it.each([
    ['a sale without its price', { soldOn: '2026-05-01' }, ['/saleCents']],
    ['another exit without its day and amount', { exitKind: 'scrapped' }, ['/exitOn', '/exitCents']],
    ['an exit day without its kind', { exitOn: '2026-05-01' }, ['/exitKind']],
    ['an exit amount without its kind', { exitCents: 0 }, ['/exitKind']],
    [
      'both a sale and an exit',
      { soldOn: '2026-05-01', saleCents: 1, exitKind: 'own use', exitOn: '2026-05-01', exitCents: 0 },
      ['/exitKind'],
    ],
  ])('refuses %s, at its field, when added and when changed', async (_, fields, pointers) => {
    const { ada, books } = await shop();
    const added = await ada.post('/api/rebuilds', { tag: 'X', ...fields });
    const { id } = await books.rebuild();
    const changed = await ada.patch(`/api/rebuilds/${id}`, 1, fields);
    for (const { status, body } of [added, changed]) {
      expect(status).toBe(422);
      expect(body.errors.map((error: { pointer: string }) => error.pointer)).toEqual(pointers);
    }
    expect((await books.detail(id)).rebuild.version).toBe(1);
  });

  it('refuses to take the price away from a sale', async () => {
    const { ada, books } = await shop();
    const { id } = await books.rebuild({ soldOn: '2026-05-01', saleCents: 1 });
    expect((await ada.patch(`/api/rebuilds/${id}`, 1, { saleCents: null })).body.errors[0].pointer).toBe('/saleCents');
  });

  it('takes an exit that brought nothing: 0 is a value', async () => {
    const { books } = await shop();
    const { id } = await books.rebuild({ purchaseCents: 100, exitKind: 'stolen', exitOn: '2026-05-01', exitCents: 0 });
    expect(await books.row(id)).toMatchObject({
      stage: 'stolen',
      proceedsCents: 0,
      keptCents: -100,
      leftOn: '2026-05-01',
    });
  });

  it('keeps a sale price without a day, as a warning and unsold', async () => {
    const { books } = await shop();
    const { id } = await books.rebuild({ saleCents: 900_000 });
    const { row, warnings } = await books.detail(id);
    expect(row).toMatchObject({ stage: 'bought', keptCents: null });
    expect(warnings.map((warning) => warning.pointer)).toEqual(['/soldOn']);
  });
});

describe('what looks odd', () => {
  it('is warned of and kept: dates out of order or ahead of today', async () => {
    const { books } = await shop();
    const { id } = await books.rebuild({
      titleIssuedOn: '2026-05-10',
      listedOn: '2026-05-01',
      settledOn: '2027-01-01',
    });
    const { warnings, rebuild } = await books.detail(id);
    expect(rebuild.listedOn).toBe('2026-05-01');
    expect(warnings.map((warning) => warning.pointer)).toEqual(['/listedOn', '/settledOn']);
    expect(warnings[0]?.detail).toContain('risky');
  });

  it('is warned of in a VIN, with a number that fits, and kept as typed', async () => {
    const { books } = await shop();
    const good = await books.rebuild({ vin: '1HGCM82633A004352' });
    const bad = await books.rebuild({ vin: '1HGCM82633AOO4352' });
    expect((await books.detail(good.id)).vinCheck).toMatchObject({ isValid: true });
    const { vinCheck, rebuild } = await books.detail(bad.id);
    expect(rebuild.vin).toBe('1HGCM82633AOO4352');
    expect(vinCheck).toMatchObject({ isValid: false, suggestions: ['1HGCM82633A004352'] });
  });

  it('brings up cautions for the damage and the work', async () => {
    const { books } = await shop();
    const { id } = await books.rebuild({ damageId: books.damageId('flood') });
    await books.entry({ rebuildId: id, cents: 1, categoryId: books.categoryId('restraints (SRS)') });
    const { cautions } = await books.detail(id);
    const always = cautions.filter((caution) => caution.asked === null);
    expect(always.map((caution) => caution.about)).toEqual(['restraints', 'flood and underbody']);
    for (const caution of cautions)
      expect(caution.text).toContain('Follow the maker’s procedure, local inspection law');
    const plain = await books.detail((await books.rebuild()).id);
    expect(plain.cautions.filter((caution) => caution.asked === null)).toEqual([]);
  });
});

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

  it('belongs to its rebuild: under another it is not there', async () => {
    const { ada, books } = await shop();
    const one = await books.rebuild();
    const other = await books.rebuild();
    const plan = await books.plan(one.id, { parts: 100 });
    expect((await ada.patch(`/api/rebuilds/${other.id}/estimates/${plan.id}`, 1, { note: 'x' })).status).toBe(404);
  });
});

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
