import { existsSync, readdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { recoverImports } from '../../server/features/imports/background.ts';
import { importFolder, importPath } from '../../server/features/imports/files.ts';
import { testApi } from '../support/api.ts';
import { expenseList, filesBroughtIn, type NamedFile, settled, uploadFiles } from './imports-support.ts';

const OVERVIEW = [
  'Stock,Year,Make,Model,Purchase,Parts,Paint,Sold for,Sold on',
  'A1,2013,Ford,F-150,1000.00,30.00,40.00,3000.00,5/1/2020',
  'A2,2010,Honda,Civic,800.00,25.00,,1900.00,6/1/2020',
].join('\n');
const RECEIPTS = [
  'Date,Car,What for,Details,Paid',
  '1/22/2020,A1,Parts,door,10.00',
  '1/23/2020,A1,Parts,hood,20.00',
  '1/25/2020,A1,Paint,base coat,40.00',
  '2/23/2020,A2,Parts,lamp,25.00',
].join('\n');
const FILES: NamedFile[] = [
  ['cars.csv', OVERVIEW],
  ['receipts.csv', RECEIPTS],
];

describe('several files in one import', () => {
  it('an overview and the receipts behind it are checked, not counted twice', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const done = await filesBroughtIn(ada, FILES);
    expect(done).toMatchObject({
      state: 'committed',
      fileName: 'cars.csv and 1 more',
      files: [
        { number: 1, name: 'cars.csv' },
        { number: 2, name: 'receipts.csv' },
      ],
      reading: {
        sheets: [
          { number: 1, file: 1, name: 'cars', shape: 'vehicles' },
          { number: 2, file: 2, name: 'receipts', shape: 'expenses' },
        ],
        control: { rebuilds: 2, entries: 4, centsByCategory: { purchase: 180_000 }, costCents: 189_500 },
      },
    });
    const entries = await api.services.database.reader('entries').orderBy('import_row');
    expect(entries.map((entry) => [entry.import_sheet, entry.import_row, entry.cents])).toEqual([
      [2, 2, 1000],
      [2, 3, 2000],
      [2, 4, 4000],
      [2, 5, 2500],
    ]);
  });

  it('the order of choosing them changes nothing', async () => {
    const books = [];
    for (const files of [FILES, FILES.toReversed()]) {
      const api = await testApi();
      const ada = await api.owner();
      await filesBroughtIn(ada, files);
      const entries = await api.services.database.reader('entries').select('cents', 'dated_on', 'import_sheet');
      const rebuilds = await api.services.database.reader('rebuilds').select('tag', 'purchase_cents', 'sale_cents');
      books.push([entries, rebuilds]);
    }
    expect(books[1]).toEqual(books[0]);
  });

  it('pasted cells come as a file of their own', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const pasted =
      'Date\tCar\tWhat for\tPaid\n1/22/2020\t13 F-150\tParts\t10.00\n1/23/2020\t13 F-150\tParts\t1,020.00\n';
    const done = await filesBroughtIn(ada, [['Pasted cells.tsv', pasted]]);
    expect(done).toMatchObject({
      fileName: 'Pasted cells.tsv',
      reading: { control: { entries: 2, costCents: 103_000 } },
    });
  });

  it('one of them that is in the books already stops all, by name, until someone insists', async () => {
    const api = await testApi();
    const ada = await api.owner();
    await filesBroughtIn(ada, [['old.csv', RECEIPTS]]);
    const again = await uploadFiles(ada, FILES);
    expect([again.status, again.body.type]).toEqual([409, '/problems/already-in']);
    expect(again.body.detail).toContain('receipts.csv');
    const twins = await uploadFiles(ada, [
      ['a.csv', OVERVIEW],
      ['b.csv', OVERVIEW],
    ]);
    expect([twins.status, twins.body.detail]).toEqual([409, expect.stringContaining('same file')]);
    const anyway = await uploadFiles(ada, FILES, '?importAnyway=true');
    expect(anyway.status).toBe(201);
    await settled(ada, anyway.body.id);
  });

  it('refuses what is no table by its name, and more than twenty', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const picture = await uploadFiles(ada, [
      FILES[0] as NamedFile,
      ['door.csv', Buffer.from('89504e470d0a1a0a', 'hex')],
    ]);
    expect([picture.status, picture.body.detail]).toEqual([422, expect.stringContaining('“door.csv”')]);
    const many = await uploadFiles(
      ada,
      Array.from({ length: 21 }, (_, i): NamedFile => [`${i}.csv`, expenseList(`1/1/2020,a,Parts,x,${i}`)]),
    );
    expect(many.status).toBe(400);
    const open = await uploadFiles(ada, [FILES[0] as NamedFile, ['odd.csv', `${RECEIPTS}\n"never closed,1`]]);
    const read = await settled(ada, open.body.id);
    expect([read.state, read.refusal]).toEqual(['refused', expect.stringContaining('“odd.csv”')]);
    expect(readdirSync(importFolder(api.services.config.dataDir))).toHaveLength(2);
  });

  it('dropping an import removes its files; a start removes what no import needs', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { body } = await uploadFiles(ada, FILES);
    await settled(ada, body.id);
    const folder = importFolder(api.services.config.dataDir);
    writeFileSync(path.join(folder, 'left-by-a-stop'), 'x');
    await recoverImports(api.services);
    expect(readdirSync(folder)).toHaveLength(2);
    expect(existsSync(importPath(api.services.config.dataDir, body.id, 2))).toBe(true);
    await ada.delete(`/api/imports/${body.id}`);
    expect(readdirSync(folder)).toEqual([]);
  });
});
