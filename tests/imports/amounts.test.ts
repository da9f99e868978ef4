import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const centsOf = (text: string) => linesOf(read(text)).map(({ kind, cents }) => [kind, cents]);

describe('the amount of a list', () => {
  it('is count times price, whichever column stands first', () => {
    const text = [
      'Date,Car,Item,Qty,Price,Line',
      '3/2/2021,11 Escape,headlight,2,64.50,129.00',
      '3/3/2021,11 Escape,oil filter,3,7.25,21.75',
      '3/9/2021,11 Escape,fender,1,118.40,118.40',
    ].join('\n');
    expect(centsOf(text).map(([, cents]) => cents)).toEqual([12_900, 2_175, 11_840]);
  });

  it('is net and tax together', () => {
    const text = [
      'Date,Car,Payee,Net,Sales tax,Total paid',
      '2022-01-05,15 Jetta,Auction,3000.00,,3000.00',
      '2022-01-15,15 Jetta,LKT,200.00,14.00,214.00',
      '2022-01-25,15 Jetta,LKT,150.50,10.54,161.04',
    ].join('\n');
    expect(centsOf(text).map(([, cents]) => cents)).toEqual([300_000, 21_400, 16_104]);
    expect(
      read(text)
        .columns.map(({ meaning }) => meaning)
        .slice(3),
    ).toEqual(['derived', 'derived', 'amount']);
  });

  it('counts the other way round where money out stands negative', () => {
    const text = [
      'Date,Car,Description,Category,Amount',
      '2021-05-02,12 Prius,bid,Purchase,-3100.00',
      '2021-05-06,12 Prius,tow,Towing,-90.00',
      '2021-05-11,12 Prius,battery pack,Parts,-899.00',
      '2021-05-14,12 Prius,core return,Parts,150.00',
      '2021-06-20,12 Prius,sold,Sale,6400.00',
    ].join('\n');
    expect(centsOf(text)).toEqual([
      ['purchase', 310_000],
      ['entry', 9_000],
      ['entry', 89_900],
      ['entry', -15_000],
      ['sale', 640_000],
    ]);
  });

  it('Soll beside Haben is money out, and Soll beside Ist is a plan', () => {
    const cashBook =
      'Datum;Kfz;Kostenart;Soll;Haben\n3.1.2022;Octavia 2009;Ersatzteile;74,80;\n4.1.2022;Octavia 2009;Lack;20,00;';
    expect(centsOf(cashBook)).toEqual([
      ['entry', 7_480],
      ['entry', 2_000],
    ]);
    const plan = 'Fahrzeug;Kostenart;Soll;Ist\nOctavia 2009;Teile;80,00;74,80\nOctavia 2009;Lack;30,00;';
    expect(centsOf(plan)).toEqual([
      ['estimate', 8_000],
      ['entry', 7_480],
      ['estimate', 3_000],
    ]);
  });

  it('in one foreign currency beside plain dollar signs is put aside alone', () => {
    const text =
      'Date,Car,What,Amount\n2021-04-01,12 Tundra,bid,$6100.00\n2021-04-05,12 Tundra,ferry,$120 CAD\n2021-04-06,12 Tundra,caps,US$45';
    const { asides, control } = read(text);
    expect(asides).toMatchObject([{ row: 3, reason: 'currency' }]);
    expect(control.costCents).toBe(614_500);
  });
});

describe('what a text says of a cost', () => {
  const categoryOf = (what: string) => {
    const [line] = linesOf(read(`Date,Car,What,Amount\n2021-04-01,12 Tundra,${what},45.00`));
    return line?.kind === 'entry' ? line.category : line?.kind;
  };
  it.each([
    ['bid', 'purchase'],
    ['winning bid at Elm', 'purchase'],
    ['bought from private owner', 'purchase'],
    ['bought new tires', 'parts'],
    ['Recambios', 'parts'],
    ['main d’œuvre externe', 'outside labor (sublet)'],
    ['for sale sign', 'other'],
    ['sold to Ray', 'sale'],
  ])('%s is %s', (what, category) => expect(categoryOf(what)).toBe(category));
});
