import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const PARTED = [
  'Car,Date,What,Cost',
  '2010 Malibu,2021-01-04,bought at auction,1200.00',
  ',2021-01-05,tow,90.00',
  ',2021-01-09,fender,140.00',
  'Malibu total,,,1430.00',
  '',
  '2012 Cruze,2021-05-04,bought at auction,1500.00',
  ',2021-05-05,tow,95.00',
  'Cruze total,,,1595.00',
];
const BARE = [
  'Date,Car,What for,Amount',
  '2021-01-04,2010 Malibu,Purchase,1200.00',
  '2021-01-05,,Towing,90.00',
  '2021-01-09,,Parts,140.00',
  '2021-05-04,2012 Cruze,Purchase,1500.00',
  '2021-05-05,,Towing,95.00',
];
const owners = (reading: ReturnType<typeof read>) =>
  linesOf(reading).map(({ rebuild, cents }) => [rebuild === null ? null : reading.rebuilds[rebuild]?.tag, cents]);

describe('a vehicle named on the first of its rows only', () => {
  it('stands for all of them where totals part the blocks; their totals agree, and the rows are kept as they stood', () => {
    const reading = read(PARTED.join('\n'));
    expect(owners(reading)).toEqual([
      ['2010 Malibu', 120_000],
      ['2010 Malibu', 9000],
      ['2010 Malibu', 14_000],
      ['2012 Cruze', 150_000],
      ['2012 Cruze', 9500],
    ]);
    expect(reading.statedTotals.every(({ stated, imported }) => stated === imported)).toBe(true);
    expect(reading.firstRows.find(({ row }) => row === 3)?.cells[0]).toBe('');
    expect(reading.choices[0]).toMatchObject({ kind: 'vehicle', mustAsk: false });
  });

  it('is asked about where nothing parts them', () => {
    const asked = read(BARE.join('\n'));
    expect(asked.choices).toMatchObject([{ id: 'names-above:2', mustAsk: true, preset: 'above' }]);
    expect(asked.asides.map(({ row, reason }) => [row, reason])).toEqual([
      [3, 'missing-vehicle'],
      [4, 'missing-vehicle'],
      [6, 'missing-vehicle'],
    ]);
    const answered = read(BARE.join('\n'), { answers: { 'names-above:2': 'above' } });
    expect(answered.control).toMatchObject({ costCents: 302_500, putAside: 0 });
  });

  it('is nothing to ask about in a list where vehicles come back, or where few rows name none', () => {
    const again = [...BARE, '2021-05-06,2012 Cruze,Parts,20.00', '2021-05-07,2012 Cruze,Parts,21.00'];
    expect(read(again.join('\n')).choices).toEqual([]);
  });
});
