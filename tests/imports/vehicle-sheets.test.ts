import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';
import { xlsxOf } from './workbooks.ts';

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

const car = (title: string, factor = 1): (string | number)[][] => [
  [title],
  ['Bought', '4/18/2019', '', 'Miles', '120,400'],
  ['bid', '4/18/2019', 'Larkfield auction', (1000 * factor).toFixed(2)],
  [],
  ['Parts'],
  ['Date', 'Item', 'From', 'Cost'],
  ['5/1/2019', 'hood', 'Old Mill', (150 * factor).toFixed(2)],
  ['5/13/2019', 'battery', 'online', '49.50'],
  ['Parts subtotal', '', '', (150 * factor + 49.5).toFixed(2)],
  [],
  ['My hours'],
  ['Date', 'Task', 'Who', 'Hrs'],
  ['5/2/2019', 'hang hood', 'Bex', '3:30'],
  ['Total hours', '', '', '3.5'],
  [],
  ['TOTAL', '', '', (1150 * factor + 49.5).toFixed(2)],
  ['Sold', '7/7/2019', '', (2000 * factor).toFixed(2)],
  ['Profit', '', '', '1.00'],
];
const linesOfCar = (model: string, factor = 1) => [
  [model, 'purchase', 1000 * factor, '2019-04-18'],
  [model, 'parts', 150 * factor, '2019-05-01'],
  [model, 'parts', 49.5, '2019-05-13'],
  [model, 'hours', 3.5, '2019-05-02'],
  [model, 'sale', 2000 * factor, '2019-07-07'],
];

describe('a sheet about one vehicle', () => {
  it('gives its facts, its costs by section, its hours without money, and its sale', () => {
    const reading = read(text(car('2011 Subaru Outback - green - hit in front')));
    expect(short(text(car('2011 Subaru Outback - green - hit in front')))).toEqual(linesOfCar('Outback'));
    expect(reading.rebuilds).toMatchObject([
      { year: 2011, make: 'Subaru', model: 'Outback', damageName: 'front', odometer: 120_400, saleCents: 200_000 },
    ]);
    expect(reading.statedTotals.map(({ stated, imported }) => stated - imported)).toEqual([0, 0, 0]);
    expect(reading.asides).toEqual([]);
  });

  it('several stand one below the other, each with its own totals', () => {
    const file = text([...car('2011 Subaru Outback'), [], [], ...car('2009 Kia Soul', 2)]);
    expect(short(file)).toEqual([...linesOfCar('Outback'), ...linesOfCar('Soul', 2)]);
    expect(read(file).statedTotals.every(({ stated, imported }) => stated === imported)).toBe(true);
  });

  it('or one to a tab, beside an overview that is not counted again', () => {
    const book = xlsxOf({
      Overview: [
        ['Year', 'Make', 'Model', 'Total in', 'Sold for'],
        ['2011', 'Subaru', 'Outback', 1199.5, 2000],
        ['2009', 'Kia', 'Soul', 2349.5, 4000],
      ],
      Outback: car('2011 Subaru Outback'),
      '2009 Kia Soul': car('costs', 2),
    });
    const reading = read(book);
    expect(reading.rebuilds.map(({ model, saleCents }) => [model, saleCents])).toEqual([
      ['Outback', 200_000],
      ['Soul', 400_000],
    ]);
    expect(reading.control).toMatchObject({ costCents: 119_950 + 234_950, saleCents: 600_000, rebuilds: 2 });
  });

  it('a tab names its vehicle where no title does', () => {
    const rows = car('').slice(1);
    const reading = read(xlsxOf({ '2011 Miata': rows, '09 Civic': rows, Notes: [['call Dov']] }));
    expect(reading.rebuilds.map(({ year, model }) => [year, model])).toEqual([
      [2011, 'Miata'],
      [2009, 'Civic'],
    ]);
    expect(reading.control.costCents).toBe(2 * 119_950);
  });

  it('an estimate beside the actual cost is planned money, also where nothing came of it', () => {
    const file = text([
      ['Estimate for 2013 Ford Escape'],
      ['Item', 'Category', 'Estimate', 'Actual'],
      ['front bumper', 'Parts', '180', '165.50'],
      ['hood', 'Parts', '220', ''],
      ['Total', '', '400', '165.50'],
    ]);
    expect(short(file).map((line) => line.slice(0, 3))).toEqual([
      ['Escape', 'estimate', 180],
      ['Escape', 'parts', 165.5],
      ['Escape', 'estimate', 220],
    ]);
    expect(read(file).control).toMatchObject({ costCents: 16_550, estimateCents: 40_000 });
  });

  it('labels before values say what an amount was', () => {
    const file = text([
      ['Vehicle:', '2014 Honda Fit'],
      ['Purchased:', '5/6/2020', 'Price:', '2,100.00'],
      ['Auction:', 'Larkfield', 'Buyer fee:', '210.00'],
      ['Sold:', '8/20/2020', 'Price:', '3,900.00'],
    ]);
    expect(short(file)).toEqual([
      ['Fit', 'purchase', 2100, '2020-05-06'],
      ['Fit', 'auction fees', 210, null],
      ['Fit', 'sale', 3900, '2020-08-20'],
    ]);
  });

  it('a subtotal that differs from its rows is shown', () => {
    const rows = car('2011 Subaru Outback');
    rows[8] = ['Parts subtotal', '', '', '210.00'];
    expect(read(text(rows)).statedTotals).toContainEqual(
      expect.objectContaining({ row: 9, stated: 21_000, imported: 19_950 }),
    );
  });

  it('an amount that cannot be read is put aside, and so are figures before any vehicle', () => {
    const rows = [['shop', '12.00'], ...car('2011 Subaru Outback')];
    rows[7] = ['5/1/2019', 'hood', 'Old Mill', 'see receipt'];
    expect(read(text(rows)).asides).toMatchObject([
      { row: 1, reason: 'missing-vehicle' },
      { row: 8, reason: 'bad-amount' },
    ]);
  });

  it('in German, too', () => {
    const rows = [
      'VW Golf 2010 - Heckschaden;;;',
      'Gekauft;03.02.2020;;',
      'Kaufpreis;03.02.2020;Auktion Nordtal;1.200,00 €',
      '',
      'Teile;;;',
      'Datum;Bezeichnung;Lieferant;Betrag',
      '10.02.2020;Heckklappe;Teilehof;137,43 €',
      'Zwischensumme;;;137,43 €',
      '',
      'Arbeit;;;',
      'Datum;Tätigkeit;Wer;Stunden',
      '11.02.2020;Heckklappe montiert;Jo;2,5',
      '',
      'Gesamt;;;1.337,43 €',
      'Verkauft;20.04.2020;;2.100,00 €',
      'Gewinn;;;762,57 €',
    ].join('\n');
    expect(short(rows, { currency: 'EUR', locale: 'de-DE' })).toEqual([
      ['Golf', 'purchase', 1200, '2020-02-03'],
      ['Golf', 'parts', 137.43, '2020-02-10'],
      ['Golf', 'hours', 2.5, '2020-02-11'],
      ['Golf', 'sale', 2100, '2020-04-20'],
    ]);
  });
});
