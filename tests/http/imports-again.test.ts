import { describe, expect, it } from 'vitest';
import type { Import } from '#shared/contracts/imports.ts';
import { type Member, testApi } from '../support/api.ts';
import { booked, broughtIn, everything, expenseList, settled, uploaded } from './imports-support.ts';

const JANUARY = [
  '1/22/2020,13 F-150,Purchase,bid,"1,000.00"',
  '1/23/2020,13 F-150,Parts,door,10.00',
  '1/23/2020,13 F-150,Supplies,rags,5.00',
  '1/23/2020,13 F-150,Supplies,rags,5.00',
  '1/24/2020,10 Civic,Parts,hood,20.00',
];
const FEBRUARY = ['2/23/2020,13 F-150,Parts,lamp,25.00', '2/24/2020,10 Civic,Parts,fender,30.00'];

async function answered(member: Member, read: Import, answers: Record<string, string>): Promise<Import> {
  const reply = await member.patch(`/api/imports/${read.id}`, read.version, { answers });
  if (reply.status !== 200) throw new Error(`change answered ${reply.status}: ${reply.text}`);
  return settled(member, read.id);
}
const totals = async (member: Member) => (await member.get('/api/entries')).body.totals;
const asked = (read: Import) => (read.reading?.choices ?? []).filter((choice) => choice.mustAsk);

describe('a longer list', () => {
  it('brings only its new rows, and says with what the others came in', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const first = await broughtIn(ada, expenseList(...JANUARY), 'ledger.csv');
    const read = await uploaded(ada, expenseList(...JANUARY, ...FEBRUARY), 'ledger.csv');
    expect(read.reading).toMatchObject({
      earlier: [{ importId: first.id, fileName: 'ledger.csv', sameRows: 5, changedRows: 0 }],
      control: { rowsRead: 8, taken: 2, putAside: 0, notData: 6, costCents: 5500 },
      notData: { 'already in': 5, heading: 1 },
    });
    expect(asked(read)).toEqual([]);
    await booked(ada, read);
    expect(await totals(ada)).toMatchObject({ count: 6, cents: 9500 });
    expect((await ada.get('/api/rebuilds')).body.rows).toHaveLength(2);
  });

  it('counts honest repeats: one more of the same is one new', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, expenseList(...JANUARY));
    const again = await broughtIn(ada, expenseList(...JANUARY, JANUARY[2] ?? ''));
    expect(again.reading?.control).toMatchObject({ taken: 1, costCents: 500 });
  });

  it('undone, gives the books after the first exactly; the first cannot go while the second stands', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const before = await everything(api);
    const first = await broughtIn(ada, expenseList(...JANUARY));
    const afterFirst = await everything(api);
    const second = await broughtIn(ada, expenseList(...JANUARY, ...FEBRUARY), 'longer.csv');
    const refused = await ada.post(`/api/imports/${first.id}/undo`);
    expect([refused.status, refused.body.detail]).toEqual([409, expect.stringContaining('“longer.csv”')]);
    expect((await ada.post(`/api/imports/${second.id}/undo`)).body.state).toBe('undone');
    expect(await everything(api)).toEqual(afterFirst);
    expect((await ada.post(`/api/imports/${first.id}/undo`)).body.state).toBe('undone');
    expect(await everything(api)).toEqual(before);
  });

  it('can be carried on again and again, and asks about no car that it named before, even a sold one', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const sale = '2/10/2020,13 F-150,Sale,SOLD,"3,000.00"';
    await broughtIn(ada, expenseList(...JANUARY, sale));
    await broughtIn(ada, expenseList(...JANUARY, sale, FEBRUARY[0] ?? ''));
    const read = await uploaded(ada, expenseList(...JANUARY, sale, ...FEBRUARY));
    expect(asked(read)).toEqual([]);
    expect(read.reading?.earlier.map(({ sameRows }) => sameRows)).toEqual([6, 1]);
    await booked(ada, read);
    expect(await totals(ada)).toMatchObject({ count: 6, cents: 9500 });
  });

  it('written otherwise is still the same', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, expenseList(...JANUARY));
    const rewritten = JANUARY.map((row) => row.replace(/^1\/(\d+)\/2020/, '2020-01-$1').replace('"1,000.00"', '1000'));
    const read = await uploaded(ada, expenseList(...rewritten, ...FEBRUARY));
    expect(read.reading).toMatchObject({
      control: { taken: 2 },
      notData: { 'already in': 5 },
      earlier: [{ sameRows: 5 }],
    });
  });

  it('in any order', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, expenseList(...JANUARY));
    const read = await uploaded(ada, expenseList(...[...JANUARY, ...FEBRUARY].toReversed()));
    expect(read.reading).toMatchObject({ control: { taken: 2 }, notData: { 'already in': 5 } });
  });
});

describe('another list under the same headings', () => {
  it('is new, though its rows look like those of before on another day', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, expenseList(...JANUARY.slice(1)));
    const read = await uploaded(ada, expenseList(...JANUARY.slice(1).map((row) => row.replace(/^1/, '3'))));
    expect(read.reading).toMatchObject({ control: { taken: 4 }, earlier: [] });
  });

  it('that shares a few rows asks whether they happened again', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, expenseList(...JANUARY));
    const read = await uploaded(ada, expenseList(JANUARY[4] ?? '', ...FEBRUARY));
    expect(asked(read)).toMatchObject([{ id: 'earlier', kind: 'duplicate', preset: 'once' }]);
    expect((await ada.post(`/api/imports/${read.id}/commit`)).status).toBe(422);
    const twice = await answered(ada, read, { earlier: 'twice' });
    expect(twice.reading).toMatchObject({ control: { taken: 3 }, earlier: [] });
  });
});

describe('a row that changed', () => {
  const CHANGED = JANUARY.map((row) => row.replace('door,10.00', 'door,12.50'));

  it('in its amount must be asked, and stays as booked until someone says', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, expenseList(...JANUARY));
    const read = await uploaded(ada, expenseList(...CHANGED, ...FEBRUARY));
    expect(read.reading).toMatchObject({
      earlier: [{ sameRows: 4, changedRows: 1 }],
      control: { taken: 2 },
      notData: { 'already in': 5 },
    });
    expect(asked(read)).toMatchObject([
      { id: 'changed-row:amount', kind: 'changed-row', preset: 'keep', question: expect.stringContaining('12.50') },
    ]);
    await booked(ada, await answered(ada, read, { 'changed-row:amount': 'keep' }));
    expect(await totals(ada)).toMatchObject({ count: 6, cents: 9500 });
  });

  it.each([
    ['new', 6, 9750],
    ['both', 7, 10_750],
  ])('taken as %s, and undone to the letter', async (answer, count, cents) => {
    const api = await testApi();
    const ada = await api.owner();
    const first = await broughtIn(ada, expenseList(...JANUARY));
    const afterFirst = await everything(api);
    const read = await uploaded(ada, expenseList(...CHANGED, ...FEBRUARY), 'longer.csv');
    await booked(ada, await answered(ada, read, { 'changed-row:amount': answer }));
    expect(await totals(ada)).toMatchObject({ count, cents });
    const voided = await api.services.database.reader('entries').whereNotNull('voided_at');
    expect(voided.map((entry) => [entry.import_id, entry.cents, entry.void_reason])).toEqual(
      answer === 'new' ? [[first.id, 1000, 'Row 3 of “longer.csv” counts instead.']] : [],
    );
    await ada.post(`/api/imports/${read.id}/undo`);
    expect(await everything(api)).toEqual(afterFirst);
    expect((await ada.post(`/api/imports/${first.id}/undo`)).body.state).toBe('undone');
  });

  it('in the purchase changes the rebuild, and back', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, expenseList(...JANUARY));
    const afterFirst = await everything(api);
    const read = await uploaded(ada, expenseList(...JANUARY.map((row) => row.replace('"1,000.00"', '"1,100.00"'))));
    await booked(ada, await answered(ada, read, { 'changed-row:amount': 'new' }));
    const rows = await api.services.database.reader('rebuilds').whereNotNull('purchase_cents');
    expect(rows.map((row) => row.purchase_cents)).toEqual([110_000]);
    await ada.post(`/api/imports/${read.id}/undo`);
    expect(await everything(api)).toEqual(afterFirst);
  });

  it('only in its words is shown, not forced on anybody', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, expenseList(...JANUARY));
    const read = await uploaded(ada, expenseList(...JANUARY.map((row) => row.replace('hood', 'hood and hinges'))));
    expect(read.reading?.choices).toMatchObject([
      { id: 'earlier', mustAsk: false },
      { id: 'changed-row:text', mustAsk: false, preset: 'keep' },
    ]);
    expect(read.reading?.control.taken).toBe(0);
  });
});
