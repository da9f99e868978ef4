import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';
import { booked, expenseList, uploaded } from './imports-support.ts';

const FILE = expenseList(
  '1/22/2020,13 F-150,Purchase,bid,"1,000.00"',
  '1/23/2020,13 F-150,Parts,door,10.00',
  '1/24/2020,,Parts,lamp,5.00',
  '',
  '1/25/2020,10 Civic,Parts,hood,20.00',
);
const LONG = expenseList(...Array.from({ length: 250 }, (_, i) => `1/22/2020,13 F-150,Parts,door ${i},10.00`));

describe('the rows of a file', () => {
  it('are shown with what was read of them, and are the same rows once they are booked, with their entries', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const read = await uploaded(ada, FILE);
    const before = (await ada.get(`/api/imports/${read.id}/rows`)).body.rows;
    expect(
      before.map((row: { row: number; outcome: string; reason: string }) => [row.row, row.outcome, row.reason]),
    ).toEqual([
      [1, 'not data', 'heading'],
      [2, 'taken', null],
      [3, 'taken', null],
      [4, 'put aside', 'missing-vehicle'],
      [5, 'not data', 'blank'],
      [6, 'taken', null],
    ]);
    expect(before[2].lines).toMatchObject([{ kind: 'entry', rebuild: 0, cents: 1000, row: 3, col: 5, entryId: null }]);
    await booked(ada, read);
    const after = (await ada.get(`/api/imports/${read.id}/rows`)).body.rows;
    const withoutIds = after.map(({ lines, ...row }: { lines: object[] }) => ({
      ...row,
      lines: lines.map((line) => ({ ...line, entryId: null })),
    }));
    // Words of a fact stand in the row that it links to, not in the books.
    const factless = (rows: { lines: { kind: string; what: string | null }[] }[]) =>
      rows.map((row) => ({
        ...row,
        lines: row.lines.map((line) => (line.kind === 'purchase' ? { ...line, what: null } : line)),
      }));
    expect(withoutIds).toEqual(factless(before));
    const entries = (await ada.get('/api/entries')).body.rows.map((entry: { id: string }) => entry.id);
    expect(
      after.flatMap((row: { lines: { entryId: string | null }[] }) => row.lines.map((line) => line.entryId)),
    ).toEqual([null, entries[1], entries[0]]);
  });

  it('start where one looks, and go on', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const read = await uploaded(ada, LONG);
    for (const state of ['read', 'booked']) {
      if (state === 'booked') await booked(ada, read);
      const page = (await ada.get(`/api/imports/${read.id}/rows?sheet=1&row=150`)).body;
      expect([page.rows.length, page.rows[0].row, page.rows[0].lines.length]).toEqual([100, 150, 1]);
      const next = (await ada.get(`/api/imports/${read.id}/rows?cursor=${page.next}`)).body;
      expect(next.rows.map((row: { row: number }) => row.row)).toEqual([250, 251]);
      expect(next.next).toBe(null);
      const aside = (await ada.get(`/api/imports/${read.id}/rows?outcome=put%20aside`)).body;
      expect(aside).toEqual({ rows: [], next: null });
    }
  });

  it('are there for a file whose columns nobody could tell, too; a dropped one has none, another shop sees none', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const read = await uploaded(ada, 'alpha,beta\none,two\nthree,four');
    expect(read.state).toBe('refused');
    const { rows } = (await ada.get(`/api/imports/${read.id}/rows?row=2`)).body;
    expect(rows.map((row: { cells: string[] }) => row.cells)).toEqual([
      ['one', 'two'],
      ['three', 'four'],
    ]);
    const bob = await api.owner('Bob Stone');
    expect((await bob.get(`/api/imports/${read.id}/rows`)).status).toBe(404);
    await ada.delete(`/api/imports/${read.id}`);
    expect((await ada.get(`/api/imports/${read.id}/rows`)).body.rows).toEqual([]);
  });
});
