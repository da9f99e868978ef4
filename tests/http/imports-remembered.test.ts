import { describe, expect, it } from 'vitest';
import type { Import, ImportSettings } from '#shared/contracts/imports.ts';
import { type Member, testApi } from '../support/api.ts';
import { booked, expenseList, settled, uploaded } from './imports-support.ts';

async function said(member: Member, read: Import, settings: ImportSettings): Promise<Import> {
  const reply = await member.patch(`/api/imports/${read.id}`, read.version, settings);
  if (reply.status !== 200) throw new Error(`change answered ${reply.status}: ${reply.text}`);
  return settled(member, read.id);
}
const choice = (read: Import, id: string) => read.reading?.choices.find((one) => one.id === id);

describe('what was said of a file', () => {
  const FIRST = expenseList('1/2/2020,13 F-150,frobs,Old Mill,10.00', '1/3/2020,13 F-150,Parts,Old Mill,20.00');
  const SECOND = expenseList('3/2/2021,10 Civic,frobs,online,30.00', '3/4/2021,10 Civic,Parts,online,40.00');
  const SAID: ImportSettings = {
    columns: [{ sheet: 1, col: 4, meaning: 'vendor', category: null }],
    answers: { 'category:frobs': 'paint & materials', 'date-order:1': 'DMY' },
  };

  it('is taken over for the next with the same headings, shown so, and can be changed', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const first = await uploaded(ada, FIRST, 'old.csv');
    const own = choice(first, 'category:frobs')?.options[1]?.value ?? '';
    await booked(ada, await said(ada, first, { ...SAID, answers: { ...SAID.answers, 'category:frobs': own } }));
    const read = await uploaded(ada, SECOND);
    expect(read.reading).toMatchObject({ rememberedFrom: { importId: first.id, fileName: 'old.csv' } });
    expect(read.reading?.columns[3]).toMatchObject({
      meaning: 'vendor',
      why: expect.stringMatching(/^as you said for “old\.csv” on \d{4}-\d\d-\d\d$/),
    });
    expect(choice(read, 'category:frobs')).toMatchObject({ answer: own });
    expect(choice(read, 'date-order:1')).toMatchObject({ answer: 'DMY', why: expect.stringContaining('old.csv') });
    expect(read.reading?.firstRows[1]?.lines[0]).toMatchObject({ category: own, vendor: 'online', on: '2021-02-03' });
    const changed = await said(ada, read, { answers: { 'date-order:1': 'MDY' } });
    expect(changed.reading?.firstRows[1]?.lines[0]).toMatchObject({ on: '2021-03-02', vendor: 'online' });
  });

  it('goes on from file to file, and gives way to what the dates themselves say', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await booked(ada, await said(ada, await uploaded(ada, FIRST), { ...SAID }));
    await booked(ada, await uploaded(ada, SECOND));
    const third = await uploaded(
      ada,
      expenseList('4/22/2022,08 Jetta,Parts,online,5.00', '4/23/2022,08 Jetta,Parts,x,6.00'),
    );
    expect(third.reading?.columns[3]).toMatchObject({ meaning: 'vendor' });
    expect(third.reading?.firstRows[1]?.lines[0]).toMatchObject({ on: '2022-04-22' });
  });

  it('says nothing of other headings, nor of other questions, nor in another shop', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await booked(ada, await said(ada, await uploaded(ada, FIRST), { ...SAID }));
    const other = await uploaded(ada, SECOND.replace('Details', 'Remarks'));
    expect(other.reading?.rememberedFrom).toBe(null);
    const bob = await api.owner('Bob Stone');
    expect((await uploaded(bob, SECOND)).reading?.rememberedFrom).toBe(null);
  });
});
