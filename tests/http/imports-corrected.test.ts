import { describe, expect, it } from 'vitest';
import type { Import, ImportSettings } from '#shared/contracts/imports.ts';
import { type Member, testApi } from '../support/api.ts';
import { booked, expenseList, settled, uploaded } from './imports-support.ts';

const FILE = expenseList(
  '1/22/2020,13 F-150,Parts,door,10.00',
  '1/23/2020,13 F-150,Parts,hood,twenty',
  '1/24/2020,,Parts,lamp,5.00',
  '1/25/2020,13 F-150,Parts,a coffee,3.00',
  'Total,,,,38.00',
);

async function changed(member: Member, { id, version }: Import, settings: ImportSettings): Promise<Import> {
  const reply = await member.patch(`/api/imports/${id}`, version, settings);
  if (reply.status !== 200) throw new Error(`change answered ${reply.status}: ${reply.text}`);
  return settled(member, id);
}

describe('rows put right in place', () => {
  it('names the cells that may be mended', async () => {
    const api = await testApi();
    const read = await uploaded(await api.owner(), FILE);
    expect(read.reading?.asides).toMatchObject([
      { row: 3, reason: 'bad-amount', cols: [5] },
      { row: 4, reason: 'missing-vehicle', cols: [2] },
    ]);
  });

  it('reads corrected cells in place of the raw ones, leaves rows out, and books the same', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const read = await changed(ada, await uploaded(ada, FILE), {
      cells: [
        { sheet: 1, row: 3, col: 5, text: '20.00' },
        { sheet: 1, row: 4, col: 2, text: '13 F-150' },
      ],
      leftOut: [{ sheet: 1, row: 5 }],
    });
    expect(read.reading).toMatchObject({
      control: { rowsRead: 6, taken: 3, putAside: 0, notData: 3, costCents: 3500 },
      notData: { heading: 1, total: 1, 'left out': 1 },
      statedTotals: [{ stated: 3800, imported: 3500 }],
    });
    expect(read.settings.cells).toHaveLength(2);
    expect(await booked(ada, read)).toMatchObject({ state: 'committed', reading: { control: { costCents: 3500 } } });
    const { rows } = (await ada.get('/api/entries')).body;
    expect(rows.map((row: { cents: number }) => row.cents).toSorted()).toEqual([1000, 2000, 500]);
  });

  it('keeps the raw cells with the rows, and who corrected what in the trail', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const first = await uploaded(ada, FILE);
    const read = await changed(ada, first, { cells: [{ sheet: 1, row: 3, col: 5, text: '20.00' }] });
    await booked(ada, await changed(ada, read, { leftOut: [{ sheet: 1, row: 5 }] }));
    const kept = await api.services.database.reader('import_rows').whereIn('row', [3, 5]).orderBy('row');
    expect(kept.map((row) => [JSON.parse(row.cells)[4], row.outcome, row.reason])).toEqual([
      ['twenty', 'taken', null],
      ['3.00', 'not data', 'left out'],
    ]);
    const trail = await api.services.database.reader('trail').where({ subject_id: first.id }).orderBy('number');
    expect(trail.map((record) => record.action)).toEqual([
      'upload file',
      'answer for file',
      'answer for file',
      'commit import',
    ]);
    expect(JSON.parse(trail[1].after).cells).toEqual([{ sheet: 1, row: 3, col: 5, text: '20.00' }]);
    expect(trail.every((record) => record.actor_id !== null)).toBe(true);
  });

  it('a correction that is taken back is gone, and a wrong one stays put aside', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const wrong = await changed(ada, await uploaded(ada, FILE), {
      cells: [{ sheet: 1, row: 3, col: 5, text: 'about a lot' }],
    });
    expect(wrong.reading?.asides[0]).toMatchObject({ row: 3, text: 'about a lot' });
    const back = await changed(ada, wrong, { cells: [], leftOut: [] });
    expect(back.reading?.asides[0]).toMatchObject({ row: 3, text: 'twenty' });
  });

  it('refuses damaged text and places that no sheet has', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { id, version } = await uploaded(ada, FILE);
    for (const cell of [
      { sheet: 1, row: 3, col: 5, text: '\ud800' },
      { sheet: 1, row: 0, col: 5, text: 'x' },
    ])
      expect((await ada.patch(`/api/imports/${id}`, version, { cells: [cell] })).status).toBe(400);
  });
});
