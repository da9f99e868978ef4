import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const text = (rows: readonly (readonly (string | number)[])[]) =>
  rows.map((row) => row.map((cell) => (String(cell).includes(',') ? `"${cell}"` : cell)).join(',')).join('\n');
const short = (file: string | Buffer, books = {}) => {
  const reading = read(file, {}, books);
  return linesOf(reading).map((line) => [
    line.rebuild === null ? null : reading.rebuilds[line.rebuild]?.model,
    line.kind === 'entry' ? line.category : line.kind,
    line.kind === 'hours' ? line.seconds / 3600 : line.cents / 100,
    line.on,
  ]);
};

describe('the day of a sale apart from its price', () => {
  const COSTS = [
    ['2013 F-150'],
    ['Bought', '4/18/2019', '', 'Miles', '120,400'],
    ['bid', '4/18/2019', 'Larkfield auction', '1000.00'],
    [],
    ['Parts'],
    ['Date', 'Item', 'From', 'Cost'],
    ['5/1/2019', 'hood', 'Old Mill', '150.00'],
    ['5/20/2019', 'clips', '', ''],
  ];

  it.each([
    [
      'below',
      [
        ['Sold', '8/22/2019'],
        ['Sale price', '', '', '9,500.00'],
      ],
    ],
    [
      'after',
      [
        ['Sale price', '', '', '9,500.00'],
        ['Sold on', '8/22/2019'],
      ],
    ],
  ])('is taken from the row %s the costs; a cost without an amount is still put aside', (_, rows) => {
    const reading = read(text([...COSTS, ...rows]));
    expect(reading.rebuilds[0]).toMatchObject({ saleCents: 950_000, dates: { soldOn: '2019-08-22' } });
    expect(reading.asides.map(({ reason, row }) => [reason, row])).toEqual([['missing-amount', 8]]);
  });

  it('is left out while no price stands anywhere', () => {
    expect(read(text([...COSTS, ['Sold', '8/22/2019']])).rebuilds[0]?.dates).toEqual({ boughtOn: '2019-04-18' });
  });
});

it.each(['2013 F-150', '2014 A4', '2016 X5'])('a title may name its vehicle by a letter and a number: %s', (title) => {
  const sheet = [[title], ['Date', 'Item', 'Cost'], ['5/1/2019', 'hood', '150.00'], ['5/2/2019', 'lamp', '50.00']];
  expect(read(text(sheet))).toMatchObject({ shape: 'vehicle sheet', rebuilds: [{ tag: title }] });
});

it.each(['2013 Q2', '2014 W12'])('but no quarter and no week: %s', (title) => {
  const sheet = [[title], ['Date', 'Item', 'Cost'], ['5/1/2019', 'hood', '150.00'], ['5/2/2019', 'lamp', '50.00']];
  expect(read(text(sheet)).rebuilds).toEqual([]);
});

describe('two tables beside each other', () => {
  const sheet = [
    ['2013 Ford F-150'],
    ['Date', 'Item', 'Cost', '', 'Date', 'Task', 'Hours'],
    ['5/1/2019', 'hood', '150.00', '', '5/2/2019', 'hang hood', '3.5'],
    ['5/3/2019', 'lamp', '50.00', '', '5/4/2019', 'wire lamp', '2'],
    ['', '', '', '', '5/5/2019', 'clean', 'long'],
    ['5/6/2019', 'clips', '4.50'],
    ['Total', '', '204.50', '', 'Total', '', '5.5'],
    ['Sold', '8/22/2019', '9500.00'],
  ];

  it('are read both, and what cannot be read in one of them is put aside', () => {
    const reading = read(text(sheet));
    expect(short(text(sheet))).toEqual([
      ['F-150', 'parts', 150, '2019-05-01'],
      ['F-150', 'hours', 3.5, '2019-05-02'],
      ['F-150', 'parts', 50, '2019-05-03'],
      ['F-150', 'hours', 2, '2019-05-04'],
      ['F-150', 'parts', 4.5, '2019-05-06'],
      ['F-150', 'sale', 9500, '2019-08-22'],
    ]);
    expect(reading.asides.map(({ row, reason }) => [row, reason])).toEqual([[5, 'bad-hours']]);
    expect(reading.statedTotals.map(({ measure, stated, imported }) => [measure, stated, imported])).toEqual([
      ['money', 20_450, 20_450],
      ['hours', 19_800, 19_800],
    ]);
  });

  it('a cell at fault in one leaves the other in', () => {
    const faulty = sheet.map((row, at) => (at === 2 ? row.with(2, 'about a hundred') : row));
    const { asides, control } = read(text(faulty));
    expect(asides).toMatchObject([{ row: 3, col: 3, isCell: true }, { row: 5 }]);
    expect(control).toMatchObject({ hoursSeconds: 19_800, costCents: 5450 });
  });
});

describe('columns of a sheet about one vehicle', () => {
  const sheet = text([
    ['2013 Ford F-150'],
    ['Parts'],
    ['Date', 'Item', 'Guess', 'Cost'],
    ['5/1/2019', 'hood', '120.00', '150.00'],
    ['Sold', '8/22/2019', '', '9500.00'],
  ]);

  it('are shown with what they were taken for', () => {
    const { columns } = read(sheet);
    expect(columns.map(({ heading, meaning }) => [heading, meaning])).toEqual([
      ['Date', 'date'],
      ['Item', 'what'],
      ['Guess', 'estimate'],
      ['Cost', 'amount'],
    ]);
  });

  it('hold what a person says', () => {
    const columns = [
      { col: 3, meaning: 'amount' as const, category: null },
      { col: 4, meaning: 'ignore' as const, category: null },
    ];
    const reading = read(sheet, { columns });
    expect(linesOf(reading).map(({ kind, cents }) => [kind, cents])).toEqual([
      ['entry', 12_000],
      ['sale', 950_000],
    ]);
    expect(reading.columns[2]).toMatchObject({ meaning: 'amount', why: 'You said so.' });
  });
});
