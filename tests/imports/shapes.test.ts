import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const EURO = { currency: 'EUR', locale: 'de-DE' };
const costs = (text: string, books = {}) =>
  linesOf(read(text, {}, books)).map(({ kind, category, cents, on }) => [
    kind === 'entry' ? category : kind,
    cents,
    on,
  ]);

describe('languages', () => {
  it('a list in Spanish, its headings in several words', () => {
    const text = [
      'Taller Rueda Vieja;;;;',
      'Fecha;Coche;Tipo de gasto;Concepto;Importe (€)',
      '14/03/2022;Ibiza 2012;Compra;Subasta;1.850,00',
      '15/03/2022;Ibiza 2012;Grúa;Traslado;120,00',
      '22/03/2022;Ibiza 2012;Piezas;Faro derecho;85,50',
      '20/04/2022;Ibiza 2012;Venta;Vendido;-3.400,00',
    ].join('\n');
    expect(costs(text, EURO)).toEqual([
      ['purchase', 185_000, '2022-03-14'],
      ['transport', 12_000, '2022-03-15'],
      ['parts', 8550, '2022-03-22'],
      ['sale', 340_000, '2022-04-20'],
    ]);
  });

  it('a list in French, with money back in a column of its own', () => {
    const text = [
      'Date;Véhicule;Catégorie;Désignation;Dépense;Recette',
      '03/05/2021;Clio 2008;Achat;enchère;1 200,00 €;',
      '14/05/2021;Clio 2008;Pièces;phare gauche;62,50 €;',
      '28/05/2021;Clio 2008;Pièces;avoir phare gauche;;62,50 €',
      '29/05/2021;Clio 2008;Contrôle technique;contrôle;78,00 €;',
      '10/06/2021;Clio 2008;Vente;vendue;;2 600,00 €',
    ].join('\n');
    expect(costs(text, EURO)).toEqual([
      ['purchase', 120_000, '2021-05-03'],
      ['parts', 6250, '2021-05-14'],
      ['parts', -6250, '2021-05-28'],
      ['inspection', 7800, '2021-05-29'],
      ['sale', 260_000, '2021-06-10'],
    ]);
  });
});

describe('headings', () => {
  it('none at all: the columns are known by what they hold', () => {
    const text = [
      '3/14/2019,11 Miata,purchase,bid,"2,870.00"',
      '3/16/2019,11 Miata,towing,tow home,185.00',
      '4/2/2019,12 Caravan,purchase,bid,900.00',
      '4/15/2019,12 Caravan,parts,grille,105.00',
    ].join('\n');
    const reading = read(text);
    expect(reading.format.headingRow).toBeNull();
    expect(reading.control).toMatchObject({ rowsRead: 4, taken: 4, costCents: 406_000, rebuilds: 2 });
    expect(linesOf(reading).at(-1)).toMatchObject({ category: 'parts', what: 'grille', on: '2019-04-15' });
  });

  it('none of which anybody knows: the columns are known by what they hold, the words above are headings', () => {
    const reading = read(
      'Aa,Bb,Cc,Dd\n3/14/2019,11 Miata,x,1.00\n3/15/2019,11 Miata,y,2.00\n3/16/2019,11 Miata,z,3.00',
    );
    expect(reading.columns.map(({ meaning }) => meaning)).toEqual(['date', 'vehicle', 'what', 'amount']);
    expect(reading.control).toMatchObject({ taken: 3, notData: 1, costCents: 600 });
  });

  it('in two rows: groups above planned and actual', () => {
    const text = [
      'Our cars 2019,,,,,,,',
      ',,,,Parts,,Paint,',
      'No,Year,Model,Bid,est,actual,est,actual',
      '1,2011,Miata,"2,870.00",300,350.10,100,90.00',
      '2,2012,Caravan,900.00,200,180.00,,',
    ].join('\n');
    const reading = read(text);
    expect(reading.columns.slice(4).map(({ meaning, category }) => [meaning, category])).toEqual([
      ['estimate', 'parts'],
      ['cost', 'parts'],
      ['estimate', 'paint & body materials'],
      ['cost', 'paint & body materials'],
    ]);
    expect(reading.control).toMatchObject({ costCents: 439_010, estimateCents: 60_000, taken: 2, notData: 3 });
  });

  it('with units in a row below them', () => {
    const text = 'Date,Car,What for,Paid\n,,,(USD)\n2020-01-02,13 F-150,Parts,10.00';
    expect(read(text).control).toMatchObject({ taken: 1, notData: 2, putAside: 0, costCents: 1000 });
  });

  it('that say who the vehicle is in one column: year, make and model are read out of it', () => {
    const text = [
      'Car,Date of purchase,Price paid ($),Towing ($),Parts ($),Own hours (h),Sold (date),Sale price ($)',
      '2011 Mazda Miata,3/14/2019,2870,185,221.07,25.5,6/19/2019,5200',
      '2012 Dodge Caravan,4/2/2019,900,,139.66,8,,',
    ].join('\n');
    expect(read(text).rebuilds).toMatchObject([
      { year: 2011, make: 'Mazda', model: 'Miata', purchaseCents: 287_000, saleCents: 520_000 },
      { year: 2012, make: 'Dodge', model: 'Caravan', purchaseCents: 90_000, saleCents: null },
    ]);
  });
});

describe('a vehicle in one column beside its number', () => {
  it('is read out of that column', () => {
    const text = [
      'Unit,Yr/Make/Model,Purchase price,Auction fees,Sale price',
      'V1,2014 Honda Civic,3200,310,6500',
      'V2,2016 Mazda 3,4100,390,',
    ].join('\n');
    expect(read(text).rebuilds).toMatchObject([
      { tag: 'V1', year: 2014, make: 'Honda', model: 'Civic' },
      { tag: 'V2', year: 2016, make: 'Mazda', model: '3' },
    ]);
  });
});

describe('a weekly grid of hours', () => {
  it('is taken day by day; its sums per week are not', () => {
    const text = [
      'Week of,Car,Who,Mon,Tue,Wed,Thu,Fri,Total',
      '2019-03-04,11 Miata,Bex,2,1:30,,3,,6.5',
      '2019-03-04,12 Caravan,Jo,,,half day,,x,4',
    ].join('\n');
    const reading = read(text);
    expect(linesOf(reading).map(({ on, seconds, person, isGuess }) => [on, seconds / 3600, person, isGuess])).toEqual([
      ['2019-03-04', 2, 'Bex', false],
      ['2019-03-05', 1.5, 'Bex', false],
      ['2019-03-07', 3, 'Bex', false],
      ['2019-03-06', 4, 'Jo', true],
    ]);
    expect(reading.asides).toMatchObject([{ row: 3, col: 8, reason: 'bad-hours', isCell: true }]);
  });
});

describe('own work in a list of costs', () => {
  it('at a rate becomes hours, no money; paid work stays money', () => {
    const text = [
      'Date,Car,What,Kind,Hrs,Rate,Amount',
      '2019-03-14,11 Miata,bid,Purchase,,,2870.00',
      '2019-03-16,11 Miata,weld floor,Labor,4,25,100.00',
      '2019-03-18,11 Miata,frame pull,Outside labor,3,80,240.00',
    ].join('\n');
    const reading = read(text);
    expect(linesOf(reading).map(({ kind, cents, seconds }) => [kind, cents, seconds / 3600])).toEqual([
      ['purchase', 287_000, 0],
      ['hours', 0, 4],
      ['entry', 24_000, 0],
    ]);
  });
});
