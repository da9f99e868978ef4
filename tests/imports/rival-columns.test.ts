import { describe, expect, it } from 'vitest';
import { read } from './support.ts';

const sales = (one: string, two: string) =>
  `Stock,Year,Model,Bought,Bid,Parts,${one},${two},Sold on\nA1,2012,Jetta,2020-01-02,1000,200,2900,2500,2020-03-13\nA2,2013,Golf,2020-01-13,1200,210,3900,3500,2020-04-01\nA3,2014,Soul,2020-02-02,1300,220,,,`;
const list = (heads: string, ...rows: string[]) =>
  [`Date,Car,Category,Details,${heads}`, ...rows.map((row, i) => `1/${13 + i}/2021,13 Focus,Parts,door,${row}`)].join(
    '\n',
  );

describe('several columns that may hold one thing', () => {
  it('the sale: what was asked is none, and nobody is asked', () => {
    const reading = read(sales('Asked', 'Sold for'));
    expect(reading.choices).toEqual([]);
    expect(reading.control.saleCents).toBe(600_000);
  });

  it('the sale stands beside what was paid out of it: the sale is taken, and the choice is shown', () => {
    const reading = read(sales('Sold for', 'Paid out'));
    expect(reading.choices).toMatchObject([{ kind: 'sale', preset: 'Sold for', mustAsk: false }]);
    expect(reading.control.saleCents).toBe(680_000);
    expect(read(sales('Sold for', 'Paid out'), { answers: { sale: 'Paid out' } }).control.saleCents).toBe(600_000);
  });

  it('two columns that both say the sale, and differ, must be asked about', () => {
    const reading = read(sales('Sale', 'Sold price'));
    expect(reading.choices).toMatchObject([{ id: 'sale', mustAsk: true, preset: 'Sale' }]);
    const answered = read(sales('Sale', 'Sold price'), { answers: { sale: 'Sold price' } });
    expect(answered.control.saleCents).toBe(600_000);
    expect(answered.columns.map(({ meaning }) => meaning).slice(6, 8)).toEqual(['ignore', 'sale']);
  });

  it('what was paid: the column called so is taken before one of prices', () => {
    const reading = read(list('Amount,Paid', '100.00,90.00', '50.00,50.00', '70.00,65.00'));
    expect(reading.choices).toMatchObject([{ kind: 'amount-column', preset: 'Paid', mustAsk: false }]);
    expect(reading.control.costCents).toBe(20_500);
  });

  it('two columns of amounts that differ without arithmetic must be asked about', () => {
    const text = list('Amount,Total', '100.00,90.00', '50.00,50.00', '70.00,65.00');
    expect(read(text).choices).toMatchObject([{ kind: 'amount-column', preset: 'Amount', mustAsk: true }]);
    expect(read(text, { answers: { 'amount-column': 'Total' } }).control.costCents).toBe(20_500);
  });

  it('but not net and gross, nor columns that agree', () => {
    const taxed = read(list('Net,Amount', '100.00,119.00', '50.00,59.50', '70.00,83.30'));
    expect(taxed.choices.filter(({ mustAsk }) => mustAsk)).toEqual([]);
    expect(read(list('Amount,Total', '100.00,100.00', '50.00,50.00')).choices).toEqual([]);
  });
});
