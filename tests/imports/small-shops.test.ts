import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const meaningsOf = (text: string) => read(text).columns.map(({ meaning }) => meaning);

describe('sheets as small shops keep them', () => {
  it('headings that come twice are told apart by the groups above them', () => {
    const reading = read(
      [
        'Car,,Purchase,,Repair,,Sale,',
        'No.,Vehicle,Date,Price,Parts,Paint,Date,Price',
        '1,2012 Altima,2022-01-03,1900,810.25,220,2022-03-30,5700',
        '2,2014 Soul,2022-02-03,2050,655.00,180,2022-05-01,6150',
        '3,2016 Spark,2022-04-06,1500,720.00,160,,',
      ].join('\n'),
    );
    expect(reading.control.saleCents).toBe(1_185_000);
    expect(reading.rebuilds[0]?.dates).toEqual({ boughtOn: '2022-01-03', soldOn: '2022-03-30' });
  });

  it('in a list of parts by count and price, the total of the row is what was paid', () => {
    const reading = read(
      [
        'Vehicle,Part,Qty,Unit price,Total,Date',
        '2012 F-150,wheel,4,65.50,262.00,2021-05-03',
        '2012 F-150,bolt kit,2,7.25,14.50,2021-05-04',
        '2009 Odyssey,tire,2,70.00,140.00,2021-06-02',
        ',,,Total,416.50,',
      ].join('\n'),
    );
    expect(linesOf(reading).map(({ cents }) => cents)).toEqual([26_200, 1450, 14_000]);
    expect(reading.statedTotals).toMatchObject([{ stated: 41_650, imported: 41_650 }]);
  });

  it('a table with one vehicle per column is not read as one of them', () => {
    const reading = read(',2012 Altima,2014 Soul\nPurchase,1900.00,2050.00\nParts,810.25,655.00\nSold for,5700,6150');
    expect(reading.refusal?.message).toContain('side by side');
  });

  it('hours in columns named for people are not taken for money', () => {
    const reading = read('Car,Anton,Bea,Total\n2014 Passat,4,6.50,10.50\n2017 Rio,,2,2\n2011 RAV4,8,1.25,9.25');
    expect(reading.refusal).not.toBeNull();
  });

  it('labor with hours as its unit is hours', () => {
    const text = 'Vehicle,Purchase,Parts,Labour (h)\n2012 Aveo,900,412.50,22\n2011 Versa,1100,380.00,31.5';
    expect(meaningsOf(text)).toEqual(['vehicle', 'purchase', 'cost', 'hours']);
  });

  it('a number per car above a line of totals is its stock number, and the vehicle stands beside it', () => {
    const text =
      'Car,Vehicle,Bought for,Parts,Sold for\nC1,2013 Mazda3,2200,419.38,6400\nC2,2015 Elantra,1750,229.00,5300\nTotal,,3950,648.38,11700';
    expect(read(text).rebuilds).toMatchObject([
      { tag: 'C1', year: 2013, model: 'Mazda3' },
      { tag: 'C2', year: 2015, model: 'Elantra' },
    ]);
  });

  it('one row per vehicle is known by the day it was sold, too; unexplained sums are asked about, round ones as well', () => {
    const text = [
      'Stock,Yr,Make,Model,Acquired,Cost,Recon,Sublet,Pack,Lot,Sold,Retail',
      'A1,2012,Nissan,Altima,2022-01-03,1900,810.25,220,100,417,2022-02-20,5700',
      'A2,2014,Kia,Soul,2022-02-03,2050,655.00,180,100,93,2022-04-02,6150',
    ].join('\n');
    const reading = read(text);
    expect(reading.shape).toBe('vehicles');
    expect(reading.control).toMatchObject({ saleCents: 1_185_000, costCents: 435_000 });
    expect(reading.choices.map(({ column }) => column)).toEqual(['Recon', 'Pack']);
  });

  it('the price at the auction is the purchase, not its fee', () => {
    const text = '2014 Accord\nItem,Amount\nAuction price,2610.00\nBuyer fee,325.00\nTowing,150.00';
    expect(linesOf(read(text)).map(({ kind, category }) => category ?? kind)).toEqual([
      'purchase',
      'auction fees',
      'transport',
    ]);
  });

  it('money back typed positive is money back where the kind of cost says so, too', () => {
    const text = [
      'Date,Vehicle,Type,Description,Amount',
      '2022-01-08,2012 Altima,Parts,alternator,180.00',
      '2022-01-09,2012 Altima,Core return,alternator core,40.00',
      '2022-01-15,2012 Altima,Parts credit,hood,20.00',
      '2022-01-16,2012 Altima,Parts,return spring,12.00',
    ].join('\n');
    expect(linesOf(read(text)).map(({ cents, isGuess }) => [cents, isGuess])).toEqual([
      [18_000, false],
      [-4000, true],
      [-2000, true],
      [1200, false],
    ]);
  });

  it('the numbers of an account’s postings are no vehicles', () => {
    const text = [
      'Date,Description,Reference,Debit,Credit,Balance',
      '01/14/2023,Lot 55,1001,1850.00,,8150.00',
      '01/15/2023,Tow,1002,140.00,,8010.00',
      '01/25/2023,Fender,1003,155.40,,7854.60',
      '02/20/2023,Shop rent,1004,900.00,,6954.60',
      '03/15/2023,Deposit,1005,,5400.00,12354.60',
    ].join('\n');
    expect(read(text).refusal?.message).toContain('No column names the vehicle');
  });
});
