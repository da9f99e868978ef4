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

describe('a sheet with one vehicle per row, later', () => {
  const HEADINGS = 'Stock,Year,Make,Model,Purchase,Parts,Paint,Hours,Sold for,Sold on';
  const CIVIC = 'A2,2010,Honda,Civic,800.00,25.00,,12,,';
  const FORD = 'A1,2013,Ford,F-150,1000.00,30.00,40.00,20,3000.00,5/21/2020';

  it('fills what was blank, brings new costs and cars, and nothing twice', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, [HEADINGS, FORD, CIVIC].join('\n'));
    const afterFirst = await everything(api);
    const sold = 'A2,2010,Honda,Civic,800.00,25.00,60.00,12,1900.00,6/21/2020';
    const fresh = 'A3,2008,Mazda,3,500.00,15.00,,4,,';
    const read = await uploaded(ada, [HEADINGS, FORD, sold, fresh].join('\n'));
    expect(asked(read)).toEqual([]);
    expect(read.reading).toMatchObject({
      control: { taken: 2, putAside: 0, notData: 2, costCents: 57_500, saleCents: 190_000 },
      notData: { 'already in': 1 },
    });
    await booked(ada, read);
    const { rows } = (await ada.get('/api/rebuilds')).body;
    expect(rows).toHaveLength(3);
    expect(rows.find((row: { tag: string }) => row.tag === 'A2')).toMatchObject({
      purchaseCents: 80_000,
      costCents: 88_500,
      proceedsCents: 190_000,
      stage: 'sold',
      ownSeconds: 12 * 3600,
    });
    await ada.post(`/api/imports/${read.id}/undo`);
    expect(await everything(api)).toEqual(afterFirst);
  });

  it.each([
    ['keep', 82_500, 12],
    ['new', 83_500, 15],
  ])('asks about changed figures once, and does what was said: %s', async (answer, costCents, hours) => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, [HEADINGS, FORD, CIVIC].join('\n'));
    const afterFirst = await everything(api);
    const read = await uploaded(ada, [HEADINGS, FORD, CIVIC.replace('25.00,,12', '35.00,,15')].join('\n'));
    expect(asked(read)).toMatchObject([{ id: 'changed-row:amount' }]);
    await booked(ada, await answered(ada, read, { 'changed-row:amount': answer }));
    const { rows } = (await ada.get('/api/rebuilds')).body;
    expect(rows.find((row: { tag: string }) => row.tag === 'A2')).toMatchObject({
      costCents,
      ownSeconds: hours * 3600,
    });
    await ada.post(`/api/imports/${read.id}/undo`);
    expect(await everything(api)).toEqual(afterFirst);
  });

  it('takes a changed price in place of the old, and a column that was put in between', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, [HEADINGS, FORD, CIVIC].join('\n'));
    const wider = [
      HEADINGS.replace('Paint', 'Tires,Paint'),
      FORD.replace('1000.00,30.00,', '1050.00,30.00,,'),
      CIVIC.replace('25.00,', '25.00,90.00,'),
    ].join('\n');
    const read = await uploaded(ada, wider);
    expect(read.reading).toMatchObject({ earlier: [{ changedRows: expect.any(Number) }], control: { putAside: 0 } });
    await booked(ada, await answered(ada, read, { 'changed-row:amount': 'new' }));
    const { rows } = (await ada.get('/api/rebuilds')).body;
    expect(rows.map((row: { tag: string; costCents: number }) => [row.tag, row.costCents]).toSorted()).toEqual([
      ['A1', 112_000],
      ['A2', 91_500],
    ]);
  });
});

describe('a sheet about one car, later', () => {
  const COSTS = [
    '2013 Ford F-150 - red,,,',
    'Bought,4/18/2019,,',
    'bid,4/18/2019,Larkfield auction,1000.00',
    ',,,',
    'Parts,,,',
    'Date,Item,From,Cost',
    '5/21/2019,hood,Old Mill,185.00',
    '5/22/2019,battery,online,80.00',
  ];

  it('brings the lines that were added, and the sale', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await broughtIn(ada, [...COSTS, 'Parts subtotal,,,265.00'].join('\n'));
    const afterFirst = await everything(api);
    const foot = ['5/23/2019,lamp,online,40.00', 'Parts subtotal,,,305.00', 'Sold,7/17/2019,,2000.00'];
    const read = await uploaded(ada, [...COSTS, ...foot].join('\n'));
    expect(asked(read)).toEqual([]);
    expect(read.reading).toMatchObject({
      control: { costCents: 4000, saleCents: 200_000 },
      notData: { 'already in': 5 },
      statedTotals: [{ stated: 30_500, imported: 30_500, explanation: 'Agrees exactly.' }],
    });
    await booked(ada, read);
    expect(await totals(ada)).toMatchObject({ count: 3, cents: 30_500 });
    const { rows } = (await ada.get('/api/rebuilds')).body;
    expect(rows).toMatchObject([{ costCents: 130_500, proceedsCents: 200_000 }]);
    await ada.post(`/api/imports/${read.id}/undo`);
    expect(await everything(api)).toEqual(afterFirst);
  });
});
