import { describe, expect, it } from 'vitest';
import { sampleBytes } from '../imports/support.ts';
import { testApi } from '../support/api.ts';
import { broughtIn, everything, expenseList } from './imports-support.ts';

describe('undo', () => {
  it.each(['p01_rebuild_summary_us.csv', 'p02_expense_ledger_us.csv', 'p07_receipts_messy.csv'])(
    'of %s restores the books exactly',
    async (name) => {
      const api = await testApi();
      const ada = await api.owner();
      await broughtIn(ada, expenseList('1/22/2019,13 F-150,Parts,door,10.00', '1/23/2019,shop,Supplies,rags,5.00'));
      const before = await everything(api);
      const { id } = await broughtIn(ada, sampleBytes(name));
      expect(await everything(api)).not.toEqual(before);
      expect((await ada.post(`/api/imports/${id}/undo`)).body.state).toBe('undone');
      expect(await everything(api)).toEqual(before);
      expect((await ada.post(`/api/imports/${id}/undo`)).body.state).toBe('undone');
    },
  );

  it('is refused once something that came in was changed', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { id } = await broughtIn(ada, expenseList('1/22/2020,13 F-150,Parts,door,10.00'));
    const [entry] = (await ada.get('/api/entries')).body.rows;
    await ada.patch(`/api/entries/${entry.id}`, 1, { what: 'door, left' });
    const undo = await ada.post(`/api/imports/${id}/undo`);
    expect([undo.status, undo.body.type]).toEqual([409, '/problems/undo-refused']);
    expect((await ada.get('/api/entries')).body.rows).toHaveLength(1);
  });

  it('is refused once books were added to a rebuild that it made', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { id } = await broughtIn(ada, expenseList('1/22/2020,13 F-150,Parts,door,10.00'));
    const [entry] = (await ada.get('/api/entries')).body.rows;
    await ada.post('/api/entries', {
      rebuildId: entry.rebuildId,
      categoryId: entry.categoryId,
      cents: 500,
      datedOn: '2020-02-02',
    });
    expect((await ada.post(`/api/imports/${id}/undo`)).status).toBe(409);
  });

  it('empties again what it filled in on a rebuild of the shop', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { body: rebuild } = await ada.post('/api/rebuilds', { tag: 'Big red', year: 2013, model: 'F-150' });
    const { id } = await broughtIn(
      ada,
      expenseList('1/22/2020,13 F-150,Purchase,bid,"1,000.00"', '5/22/2020,13 F-150,Sale,SOLD,"3,000.00"'),
    );
    expect((await ada.get('/api/rebuilds')).body.rows[0]).toMatchObject({ proceedsCents: 300_000, stage: 'sold' });
    await ada.post(`/api/imports/${id}/undo`);
    expect((await ada.get('/api/rebuilds')).body.rows[0]).toMatchObject({
      id: rebuild.id,
      purchaseCents: null,
      proceedsCents: null,
      boughtOn: null,
    });
  });
});
