import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';
import { booksOf } from '../support/books.ts';

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
