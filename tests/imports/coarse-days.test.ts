import { describe, expect, it } from 'vitest';
import { firstOfWeek, isCoarseDay } from '../../server/features/imports/cells/coarse-days.ts';
import { linesOf, read } from './support.ts';

const COARSE = [
  'Mar 2021',
  'März 2021',
  'marzo de 2021',
  '3/2021',
  '2021-03',
  'Q2 2021',
  '2021 Q2',
  '2021-W14',
  'KW 14/2021',
  'spring 2021',
  '2021',
];

describe('dates that name less than a day', () => {
  it('are known in every usual form, and days are none of them', () => {
    expect(COARSE.filter((cell) => !isCoarseDay(cell))).toEqual([]);
    expect(['3/4/2021', 'Mar 4', '4-Mar', '2021-03-04', '43900', 'Ford 2021', '13 Focus'].filter(isCoarseDay)).toEqual(
      [],
    );
  });

  it.each([...COARSE, 'Mar-21'])('a cost of %s comes in without a day, as a guess', (cell) => {
    const reading = read(`Date,Car,Category,Paid\n1/13/2021,13 Focus,Parts,90\n${cell},13 Focus,Parts,50`);
    expect(linesOf(reading).at(-1)).toMatchObject({ on: null, cents: 5000, isGuess: true });
    expect(reading.asides).toEqual([]);
  });

  it('are no day of a rebuild: the cell is put aside, the sale stays', () => {
    const reading = read(
      'Stock,Year,Model,Bought,Bid,Sold on,Sold for\nA1,2012,Jetta,Mar 2021,100,Q2 2021,900\nA2,2013,Golf,2021,100,1/13/2021,900',
    );
    expect(reading.rebuilds).toMatchObject([
      { purchaseCents: 10_000, saleCents: 90_000, dates: {} },
      { purchaseCents: 10_000, saleCents: 90_000, dates: { soldOn: '2021-01-13' } },
    ]);
    expect(reading.asides.map(({ row, col, reason }) => [row, col, reason])).toEqual([
      [2, 4, 'bad-date'],
      [2, 6, 'bad-date'],
      [3, 4, 'bad-date'],
    ]);
  });

  it('are put aside in the facts of a vehicle sheet, too', () => {
    const reading = read(
      '2013 Ford Focus\nBought,Mar 2021,Miles,103000\nParts\nhood,100.00\nfender,80.00\nTotal,180.00',
    );
    expect(reading.rebuilds[0]).toMatchObject({ dates: {}, odometer: 103_000 });
    expect(reading.asides).toMatchObject([{ row: 2, col: 2, reason: 'bad-date', isCell: true }]);
  });

  it('a week of a weekly grid gives its weekdays their days (ISO 8601: week 53 of 2020 began on 2020-12-28)', () => {
    expect(firstOfWeek('2020-W53')).toBe('2020-12-28');
    expect(firstOfWeek('KW 1/2021')).toBe('2021-01-04');
    const reading = read('Week,Car,Who,Mon,Tue,Wed\n2021-W14,13 Focus,Al,2,,1.5\n2021-W15,13 Focus,Al,,3,');
    expect(linesOf(reading).map(({ on, seconds }) => [on, seconds / 3600])).toEqual([
      ['2021-04-05', 2],
      ['2021-04-07', 1.5],
      ['2021-04-13', 3],
    ]);
  });
});
