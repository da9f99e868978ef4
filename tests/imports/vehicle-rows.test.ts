import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const list = (...rows: string[]) => ['Date,Car,What for,Details,Paid', ...rows].join('\n');
const car = (...rows: string[]) => ['Stock,Year,Model,Bought,Bid,Parts,Tow,Sold on,Sold for', ...rows].join('\n');

describe('one vehicle per row', () => {
  it('never imports a column that adds up the others, whatever it is called', () => {
    const text = [
      'Stock,Year,Model,Bid,Parts,Tow,Whole lot',
      'A1,2012,Jetta,100.00,20.00,5.00,125.00',
      'A2,2013,Golf,200.00,30.00,,230.00',
      'A3,2014,Soul,300.00,40.00,9.00,349.00',
      'TOTAL,,,600.00,90.00,14.00,704.00',
    ].join('\n');
    const reading = read(text);
    expect(reading.columns[6]?.meaning).toBe('derived');
    expect(reading.control).toMatchObject({ costCents: 70_400, taken: 3, notData: 2 });
    expect(reading.statedTotals.every((total) => total.stated === total.imported)).toBe(true);
  });

  it('knows a row of sums that bears no label', () => {
    const reading = read(
      car(
        'A1,2012,Jetta,2020-01-02,100.00,20.00,5.00,,',
        'A2,2013,Golf,2020-01-03,200.00,30.00,,,',
        ',,,,300.00,50.00,5.00,,',
      ),
    );
    expect(reading.notData.total).toBe(1);
    expect(reading.control.costCents).toBe(35_500);
  });

  it('takes a vehicle that cost and fetched what those before it did together: only a row without a name is their sum', () => {
    const same = (stock: string) => `${stock},2014,Focus,1/2/2020,1000,500,100,3/2/2020,2500`;
    const reading = read(car(same('A1'), same('A2'), `A3,2015,Focus,1/2/2020,2000,1000,200,3/2/2020,5000`));
    expect(reading.rebuilds.map(({ tag }) => tag)).toEqual(['A1', 'A2', 'A3']);
    expect(reading.control.saleCents).toBe(1_000_000);
  });

  it('puts aside the cell that it cannot read, and takes the rest of the row', () => {
    const reading = read(
      car('A1,2012,Jetta,2020-02-30,100.00,20+tax?,5.00,,', 'A2,2013,Golf,2020-01-03,200.00,30.00,-,2020-05-05,'),
    );
    expect(reading.asides).toMatchObject([
      { row: 2, col: 4, reason: 'bad-date', isCell: true },
      { row: 2, col: 6, reason: 'ambiguous-amount', isCell: true },
      { row: 3, col: 8, reason: 'missing-amount', isCell: true },
    ]);
    expect(reading.control).toMatchObject({ taken: 2, costCents: 33_500 });
    expect(reading.rebuilds[1]).toMatchObject({ saleCents: null, dates: { boughtOn: '2020-01-03' } });
  });

  it('makes nothing that the books could not show again: notes, headings and names may be long', () => {
    const long = (most: number) => 'x'.repeat(most);
    const heads = `Stock,Model,Bought,Bid,Parts ${long(600)},Notes,Comments`;
    const reading = read(`${heads}\nA1,Focus,1/2/2020,1000,50,${long(3000)},${long(3000)}`);
    expect(reading.asides).toMatchObject([{ row: 2, col: 7, reason: 'cell-too-long' }]);
    expect(reading.rebuilds[0]?.notes).toHaveLength(3000);
    expect(linesOf(reading).filter(({ kind }) => kind === 'entry')).toMatchObject([{ cents: 5000, what: null }]);
    expect(read(list(`2020-01-02,13 ${long(90)},Parts,door,10.00`)).rebuilds).toMatchObject([
      { year: 2013, model: null },
    ]);
  });

  it('takes one vehicle once, and says so when it stands there twice', () => {
    const reading = read(
      car('A1,2012,Jetta,2020-01-02,100.00,20.00,5.00,,', 'A1,2012,Jetta,2020-01-02,100.00,21.00,5.00,,'),
    );
    expect(reading.asides).toMatchObject([{ row: 3, reason: 'duplicate', cents: 12_600 }]);
  });

  it('keeps a vehicle of which only facts are known', () => {
    expect(
      read(car('A1,2012,Jetta,2020-01-02,100.00,20.00,5.00,,', 'A2,2013,Golf,2020-01-03,,,,,')).rebuilds,
    ).toMatchObject([{ tag: 'A1' }, { tag: 'A2', purchaseCents: null }]);
  });

  it('does not count a vehicle again whose books the shop has', () => {
    const existing = {
      id: 'x',
      tag: 'a1',
      year: 2012,
      make: null,
      model: 'Jetta',
      hasPurchase: true,
      hasLeft: false,
      hasBaseline: false,
      hasEntries: true,
    };
    const reading = read(
      car('A1,2012,Jetta,2020-01-02,100.00,20.00,5.00,,', 'A2,2013,Golf,2020-01-03,200.00,30.00,,,'),
      {},
      { rebuilds: [existing] },
    );
    expect(reading.asides).toMatchObject([{ row: 2, reason: 'duplicate' }]);
    expect(reading.control.costCents).toBe(23_000);
  });
});
