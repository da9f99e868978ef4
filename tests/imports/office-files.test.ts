import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { openFile } from '../../server/features/imports/sheets/open-file.ts';
import { bytesOf } from '../../server/features/imports/text/bytes.ts';

const FOLDER = path.resolve(import.meta.dirname, '../fixtures/workbooks');
const open = (name: string) => openFile(bytesOf(readFileSync(path.join(FOLDER, name))));

/** Rows of a sheet by their lines, as they would be read. */
function rowsOf(name: string, sheet = 0): Record<number, string[]> {
  const rows: Record<number, string[]> = {};
  open(name).sheets[sheet]?.forEachRow((cells, line) => (rows[line] = cells));
  return rows;
}

// How these were made stands in the folder's README; what they hold is what receipts.fods says.
describe.each(['receipts.xlsx', 'receipts.ods'])('%s, as an office program writes it', (name) => {
  it('comes in by its stored values: formulas, days, shares, two lines in one cell, an error', () => {
    expect(rowsOf(name)).toEqual({
      1: ['Yard receipts 2021'],
      2: ['Date', 'Car', 'What for', 'Details', 'Paid', 'Tax rate', 'Paid by'],
      3: ['2021-03-05', '13 F-150', 'Parts', 'fender & liner', '1240.5', '6.25%', 'card'],
      4: ['2021-03-09', '13 F-150', 'Paint', 'two quarts\nand clear', '90.5', '6.25%', 'cash'],
      5: ['2021-03-11', '12 Caravan', 'Towing', 'from the yard', '80', '', 'cash'],
      6: ['2021-03-12', '12 Caravan', 'Parts', 'lamp', '#DIV/0!', '', 'cash'],
      7: ['Total', '', '', '', '1411'],
    });
  });

  it('says what is hidden and what is noted on a cell', () => {
    expect(open(name).sheets[0]?.hints).toEqual([
      { row: 0, col: 6, kind: 'hidden column', text: expect.stringContaining('read like the others') },
      { row: 3, col: 4, kind: 'comment', text: 'came with a dent\nkept it' },
      { row: 5, col: null, kind: 'hidden row', text: expect.stringContaining('Row 5') },
    ]);
  });

  it('reads a hidden sheet like the others, with time of more than a day', () => {
    expect(open(name).sheets.map((sheet) => [sheet.name, sheet.isHidden])).toEqual([
      ['Receipts', false],
      ['Hours', true],
    ]);
    expect(rowsOf(name, 1)).toMatchObject({
      2: ['2021-04-01', '13 F-150', '3:30', '1'],
      3: ['2021-04-02', '13 F-150', '26:15', '0'],
    });
  });
});

it('the same sheet as CSV comes in by what it shows', () => {
  expect(rowsOf('receipts.csv')).toMatchObject({
    3: ['03/05/2021', '13 F-150', 'Parts', 'fender & liner', '1240.5', '6.25%', 'card'],
    4: ['03/09/2021', '13 F-150', 'Paint', 'two quarts\nand clear', '90.5', '6.25%', 'cash'],
  });
});

it('a workbook of the old kind is refused with what to do', () => {
  expect(() => open('receipts.xls')).toThrow(/old kind.*save it as \.xlsx/i);
});
