import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const outcomes = (text: string) => read(text).firstRows.map(({ outcome, reason }) => reason ?? outcome);

describe('rows beside the data', () => {
  it('balances brought over and carried on are counted, and are no costs', () => {
    const text = [
      'Date,Car,Item,Amount,Balance',
      '3/1/2021,,Brought forward from Feb,"1,834.22","1,834.22"',
      '3/2/2021,11 Escape,headlight,64.50,"1,898.72"',
      ',,Carried forward,,"1,898.72"',
    ].join('\n');
    expect(outcomes(text)).toEqual(['heading', 'carried', 'taken', 'carried']);
  });

  it('a row that only repeats the sums of its columns is a total, whatever it calls itself', () => {
    const text = [
      'Car,Bid,Fees,Tow,Parts',
      '2009 Corolla,1800,230,75,655.20',
      '2012 Passat,2400,280,120,1210.90',
      '2 cars,4200,510,195,1866.10',
    ].join('\n');
    expect(outcomes(text)).toEqual(['heading', 'taken', 'taken', 'total']);
    expect(outcomes(text.replace('2 cars', '2011 Jetta').replace('1866.10', '1866.11')).at(-1)).toBe('taken');
  });

  it('a signature below the vehicles is a note; a vehicle of which nothing else is known comes in', () => {
    const text = 'Car,Bid,Fees,Tow\n2009 Corolla,1800,230,75\n2012 Passat,,,\nsigned: D. Okafor,,,';
    expect(outcomes(text)).toEqual(['heading', 'taken', 'taken', 'note']);
  });

  it('a sale that has not happened yet leaves its day open', () => {
    const text = 'Car,Bid,Fees,Tow,Sold on,Sold for\n2009 Corolla,1800,230,75,in shop,';
    expect(read(text).asides).toEqual([]);
  });
});

describe('a sheet about one vehicle', () => {
  it('takes year, make, model and stock number from labels, the stock number as its tag', () => {
    const text = [
      'Stock no,H-7',
      'Vehicle: 2011 Honda Civic,',
      'Title,salvage',
      'Date,Item,Where,Paid',
      '2020-01-10,bid,Auction,1900.00',
    ].join('\n');
    expect(read(text).rebuilds).toMatchObject([{ year: 2011, make: 'Honda', model: 'Civic', titleBrand: 'salvage' }]);
  });

  it('a cost from a shop called Total is no total', () => {
    const text = [
      '2011 Honda Civic,,,',
      'Date,Item,Where,Paid',
      '2020-01-10,bid,Auction,1900.00',
      '2020-01-12,hood,Total Auto Parts,95.00',
      ',,Total,1995.00',
    ].join('\n');
    expect(read(text).control.costCents).toBe(199_500);
  });

  it('the day of the sale may stand first, or inside its words', () => {
    const sheet = (sale: string) =>
      `2011 VW Golf;;;\nDatum;Was;Wo;Betrag\n12.03.2021;Kaufpreis;Auktion;2150,00\n${sale}`;
    for (const sale of ['18.04.2021;Verkauft;;4300,00', 'verkauft am 18.04.2021;;;4300,00']) {
      expect(read(sheet(sale)).rebuilds).toMatchObject([{ saleCents: 430_000, dates: { soldOn: '2021-04-18' } }]);
    }
  });
});

it('a day without a year takes the year in the title above the list', () => {
  const text = 'Expenses 2018,,,\nDate,Car,What,Amount\n3-Jan,07 Camry,bid,1300.00\n14-Dec,07 Camry,tags,120.00';
  expect(linesOf(read(text)).map(({ on, isGuess }) => [on, isGuess])).toEqual([
    ['2018-01-03', true],
    ['2018-12-14', true],
  ]);
});
