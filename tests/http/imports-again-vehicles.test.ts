import { describe, expect, it } from 'vitest';
import type { Import } from '#shared/contracts/imports.ts';
import { type Member, testApi } from '../support/api.ts';
import { booked, broughtIn, everything, settled, uploaded } from './imports-support.ts';

async function answered(member: Member, read: Import, answers: Record<string, string>): Promise<Import> {
  const reply = await member.patch(`/api/imports/${read.id}`, read.version, { answers });
  if (reply.status !== 200) throw new Error(`change answered ${reply.status}: ${reply.text}`);
  return settled(member, read.id);
}
const totals = async (member: Member) => (await member.get('/api/entries')).body.totals;
const asked = (read: Import) => (read.reading?.choices ?? []).filter((choice) => choice.mustAsk);

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
