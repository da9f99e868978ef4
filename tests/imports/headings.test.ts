import { describe, expect, it } from 'vitest';
import { dealOf, headingMeanings, plannedPart } from '../../server/features/imports/words/headings.ts';
import { linesOf, read } from './support.ts';

const meaningsOf = (text: string) => read(text).columns.map(({ meaning }) => meaning);

describe('a heading', () => {
  it.each([
    ['Date purchased', 'buying'],
    ['Prix d’achat', 'buying'],
    ['Verkauft am', 'selling'],
    ['Sale ($)', 'selling'],
    ['Purchase fee', null],
    ['Sales tax', null],
    ['Date', null],
  ])('%s speaks of %s', (heading, deal) => expect(dealOf(heading)).toBe(deal));

  it.each([
    ['Parts budget', 'parts'],
    ['Piezas prev.', 'piezas'],
    ['Pièces prévu', 'pieces'],
    ['KVA Lack', 'lack'],
    ['Parts', null],
  ])('%s plans %s', (heading, part) => expect(plannedPart(heading)).toBe(part));

  it.each(['Montant TTC', 'How much', 'Betrag (€)', 'Importe'])('%s is an amount', (heading) =>
    expect(headingMeanings(heading)).toContain('amount'),
  );
});

describe('headings of a list', () => {
  it('each meaning goes to the heading that says it best, wherever it stands', () => {
    expect(
      meaningsOf('Notes,Unit price,Qty,Description,Amount,Car,Purchase date\n,3.00,2,clips,6.00,11 Miata,3/14/2019'),
    ).toEqual(['notes', 'derived', 'ignore', 'what', 'amount', 'vehicle', 'date']);
  });

  it('days, vehicles and amounts are known by the cells where no heading names them', () => {
    const text = [
      'Posted,Which of them,Spent on,How much did it come to',
      '"May 3, 2021",2010 Venza,the car,"$2,250.00"',
      '"May 9, 2021",10 Venza,used parts,$75.00',
    ].join('\n');
    expect(meaningsOf(text)).toEqual(['date', 'vehicle', 'category', 'amount']);
    expect(read(text).rebuilds).toMatchObject([{ year: 2010, model: 'Venza', purchaseCents: 225_000 }]);
  });

  it('a stock number is the vehicle’s name, and what stands beside it says which vehicle that is', () => {
    const text =
      'Date,Stock #,Model,Expense,Amount\n2022-01-05,S101,15 Jetta,Parts,30.00\n2022-01-06,S102,15 Jetta,Parts,20.00';
    expect(read(text).rebuilds).toMatchObject([
      { tag: 'S101', year: 2015, model: 'Jetta' },
      { tag: 'S102', year: 2015, model: 'Jetta' },
    ]);
  });

  it('hours on every row at a rate are a log of hours', () => {
    const text = 'Day,Tech,Unit,Hrs,Rate,Value\n6/14/2021,Sam,13 Focus,3.5,25,87.50\n6/15/2021,Sam,13 Focus,1,25,25.00';
    expect(read(text).shape).toBe('hours');
    expect(linesOf(read(text))[0]).toMatchObject({ kind: 'hours', seconds: 12_600, person: 'Sam' });
  });
});

describe('headings of a sheet with one vehicle per row', () => {
  it('a deal’s day and money are told apart by the cells', () => {
    const text = [
      'Réf,Véhicule,Acheté,Prix,Frais,Pièces réel,Vendu le,Vendu,Marge',
      'A1,Peugeot 308 2011,2020-02-03,1400,140,433,2020-04-11,3300,1327',
      'A2,Dacia Logan 2013,2020-03-01,1700,150,612,,,',
    ].join('\n');
    expect(meaningsOf(text)).toEqual([
      'stock number',
      'vehicle',
      'boughtOn',
      'purchase',
      'cost',
      'cost',
      'soldOn',
      'sale',
      'derived',
    ]);
  });

  it('planned and actual may stand in a row of their own below the groups', () => {
    const text = [
      'Nr.,Fahrzeug,Kaufpreis,Teile,,Lack,,verkauft am',
      ',,,Soll,Ist,Soll,Ist,',
      '1,2010 VW Polo,1200,300,352,100,120,2021-06-15',
      '2,2013 Ford Fiesta,2350,600,455,250,231,2021-07-15',
    ].join('\n');
    expect(
      read(text)
        .columns.map(({ meaning, category }) => [meaning, category])
        .slice(3, 7),
    ).toEqual([
      ['estimate', 'parts'],
      ['cost', 'parts'],
      ['estimate', 'paint & body materials'],
      ['cost', 'paint & body materials'],
    ]);
  });

  it('a column that is only called Cost is the purchase where no other is', () => {
    const text = [
      'Car,Buy date,Cost ($),Fees ($),Haul ($),Sublet ($)',
      '2009 Corolla,8/3/2021,1800,230,75,10',
      '2012 Passat,8/19/2021,2400,280,120,350',
    ].join('\n');
    expect(meaningsOf(text).slice(2)).toEqual(['purchase', 'cost', 'cost', 'cost']);
  });
});
