import { describe, expect, it } from 'vitest';
import { linesOf, read, sampleBytes } from './support.ts';
import { odsOf, xlsxOf, zipOf } from './workbooks.ts';

const HEADINGS = ['Date', 'Car', 'What for', 'Paid'];

describe('cells of a workbook', () => {
  it('a day is the same in both systems of counting days', () => {
    // 2021-01-09 is day 44,205 since 1900 and 42,743 since 1904: 1,462 days apart.
    const book = (serial: number, is1904: boolean) =>
      read(xlsxOf({ Costs: [HEADINGS, [{ serial, format: 14 }, '13 F-150', 'Parts', 12.5]] }, is1904));
    for (const reading of [book(44_205, false), book(42_743, true)]) {
      expect(linesOf(reading)).toMatchObject([{ on: '2021-01-09', cents: 1250, sheet: 1, row: 2, col: 4 }]);
    }
  });

  it('time under a clock format is hours, and binary noise is no fraction of a cent', () => {
    const hours = read(
      xlsxOf({
        Log: [
          ['Date', 'Car', 'Hours'],
          ['2021-05-03', '13 F-150', { serial: 3.5 / 24, format: 46 }],
        ],
      }),
    );
    expect(linesOf(hours)).toMatchObject([{ seconds: 12_600 }]);
    const money = read(xlsxOf({ Costs: [HEADINGS, ['2021-05-03', '13 F-150', 'Parts', 0.1 + 0.2]] }));
    expect(linesOf(money)).toMatchObject([{ cents: 30 }]);
  });

  it('an .ods workbook comes in like its .xlsx twin, its endless empty rows and columns left out', () => {
    const rows = [HEADINGS, ['2021-05-03', '13 F-150', 'Parts', 12.5], ['2021-05-04', '13 F-150', 'Towing', 80]];
    const [ods, xlsx] = [read(odsOf({ Costs: rows })), read(xlsxOf({ Costs: rows }))];
    expect(linesOf(ods)).toEqual(linesOf(xlsx));
    expect(ods.control).toEqual(xlsx.control);
    expect(ods.control.costCents).toBe(9250);
  });
});

describe('sheets of a workbook', () => {
  const PARTS = [
    HEADINGS,
    ['2021-05-03', '101', 'Parts', 120.5],
    ['2021-05-04', '101', 'Supplies', 12],
    ['2021-05-05', '2012 Dodge Caravan', 'Parts', 75.25],
  ];
  const overview = (...parts: (number | null)[]) => [
    ['Stock', 'Year', 'Make', 'Model', 'Bid', 'Fees', 'Parts', 'Sold for'],
    ['101', 2013, 'Ford', 'F-150', 1000, 50, parts[0] ?? null, 2000],
    ['102', 2012, 'Dodge', 'Caravan', 900, 40, parts[1] ?? null, null],
  ];

  it('an overview is checked against its receipts and not added to them; both name the same vehicles', () => {
    const reading = read(xlsxOf({ Cars: overview(132.5, 75.25), Receipts: PARTS }));
    expect(reading.rebuilds.map(({ tag }) => tag)).toEqual(['101', '102']);
    expect(reading.control.costCents).toBe(199_000 + 20_775);
    expect(reading.columns.find(({ sheet, col }) => sheet === 1 && col === 7)).toMatchObject({ meaning: 'derived' });
    expect(
      linesOf(reading)
        .filter(({ sheet }) => sheet === 2)
        .map(({ rebuild }) => rebuild),
    ).toEqual([0, 0, 1]);
  });

  it('where an overview differs from its receipts on most rows, a person is asked whether it is the same money', () => {
    const book = xlsxOf({ Cars: overview(500, 600), Receipts: PARTS });
    const [choice] = read(book).choices.filter(({ kind }) => kind === 'overlap');
    expect(choice).toMatchObject({ mustAsk: true, preset: 'same' });
    const both = read(book, { answers: { [choice?.id ?? '']: 'both' } });
    expect(both.control.costCents).toBe(199_000 + 110_000 + 20_775);
  });

  it('a difference of one row is shown beside what came in', () => {
    const rows = [
      ...overview(132.5, 75.25),
      ['103', 2010, 'Kia', 'Soul', 700, 30, 99, null],
      ['104', 2011, 'Kia', 'Rio', 600, 20, 10, null],
    ];
    const parts = [...PARTS, ['2021-06-01', '103', 'Parts', 98], ['2021-06-01', '104', 'Parts', 10]];
    const reading = read(xlsxOf({ Cars: rows, Receipts: parts }));
    expect(reading.statedTotals).toContainEqual(
      expect.objectContaining({ sheet: 1, row: 4, col: 7, stated: 9900, imported: 9800 }),
    );
  });

  it('a copy of a sheet is asked about and put aside meanwhile; only what is new on it comes in', () => {
    const book = xlsxOf({ Parts: PARTS, 'Parts (2)': [...PARTS, ['2021-05-09', '101', 'Parts', 5]] });
    const reading = read(book);
    const [choice] = reading.choices.filter(({ kind }) => kind === 'sheets');
    expect(choice).toMatchObject({ mustAsk: true, preset: 'copy' });
    expect(reading.control).toMatchObject({ costCents: 20_775 + 500, putAside: 3 });
    expect(read(book, { answers: { [choice?.id ?? '']: 'both' } }).control.costCents).toBe(2 * 20_775 + 500);
  });

  it('a vehicle that a later year sheet carries on counts once; what changed meanwhile is put aside', () => {
    const reading = read(
      xlsxOf({
        '2019': [
          ['Car', 'Bid', 'Fees', 'Parts', 'Sold for'],
          ['2011 Miata', 2870, 150, 221.07, 5200],
          ['2012 Caravan', 900, 50, 100, null],
        ],
        '2020': [
          ['Vehicle', 'Bid', 'Buyer fee', 'Tow', 'Parts', 'Sale price'],
          ['2012 Caravan', 900, 50, 30, 140, 1900],
          ['2010 Altima', 1100, 60, 90, 300, 2300],
        ],
      }),
    );
    expect(reading.rebuilds.map(({ model }) => model)).toEqual(['Miata', 'Caravan', 'Altima']);
    expect(reading.control).toMatchObject({ costCents: 324_107 + 105_000 + 3000 + 155_000, saleCents: 940_000 });
    expect(reading.asides).toMatchObject([
      { sheet: 2, row: 2, col: 5, isCell: true, reason: 'duplicate', cents: 14_000 },
    ]);
  });

  it('a sheet of notes is counted and left out; figures on it are put aside, never lost', () => {
    const reading = read(xlsxOf({ Costs: PARTS, Notes: [['call the tow yard'], ['owed to Dov', '$45.00']] }));
    expect(reading.sheets.map(({ name, shape }) => [name, shape])).toEqual([
      ['Costs', 'expenses'],
      ['Notes', null],
    ]);
    expect(reading.asides).toMatchObject([{ sheet: 2, row: 2, reason: 'not-a-data-row', cents: 4500 }]);
    expect(reading.notData.note).toBe(1);
  });
});

describe('workbooks that cannot come in', () => {
  const sheet = (xml: string) =>
    zipOf({
      'xl/workbook.xml': '<workbook><sheets><sheet name="A"/></sheets></workbook>',
      'xl/worksheets/sheet1.xml': xml,
    });
  const bomb = Buffer.concat(Array<Buffer>(64).fill(Buffer.alloc(1024 * 1024, 32)));
  it.each([
    ['cut off', sampleBytes('p04_workbook_2021.xlsx').subarray(0, 6000), 'damaged', 'cut off'],
    ['made to burst its reader', sheet(`<worksheet>${bomb.toString('latin1')}</worksheet>`), 'too-large', 'CSV'],
    [
      'with a document type of its own',
      sheet('<!DOCTYPE a [<!ENTITY b "c">]><worksheet/>'),
      'damaged',
      'document type',
    ],
    ['with broken XML', sheet('<worksheet><sheetData></worksheet>'), 'damaged', 'damaged'],
    ['of nothing', sheet('<worksheet/>'), 'empty', 'No sheet'],
    ['that is a text document', zipOf({ 'word/document.xml': '<a/>' }), 'not-text', 'no spreadsheet'],
    ['locked', Buffer.from('d0cf11e0a1b11ae1', 'hex'), 'not-text', 'password'],
  ])('a workbook %s is refused in words', (_, bytes, kind, words) => {
    expect(read(bytes).refusal).toMatchObject({ kind, message: expect.stringContaining(words) });
  });
});
