import { describe, expect, it } from 'vitest';
import { nearestDay, yearlessParts } from '../../server/features/imports/cells/days.ts';
import { aboutHours, readHours } from '../../server/features/imports/cells/hours.ts';
import { aboutCents } from '../../server/features/imports/cells/money.ts';
import { isRefund } from '../../server/features/imports/words/refunds.ts';
import { linesOf, read } from './support.ts';

// Golden cells, worked out by hand.

describe('money that is only said roughly', () => {
  it.each([
    ['~200', 20_000],
    ['1,300 ish', 130_000],
    ['$1.2k', 120_000],
    ['2k', 200_000],
    ['2x45', 9000],
    ['2 x $45.50', 9100],
    ['150?', 15_000],
    ['about 20', 2000],
    ['approx. $80', 8000],
    ['400+tax', null],
    ['some', null],
    ['100 or 200?', null],
  ])('%s is %s cents', (text, cents) => expect(aboutCents(text, '.')).toBe(cents));
  it('with a decimal comma, too', () => {
    expect(aboutCents('ca. 1.250,50', ',')).toBe(125_050);
    expect(aboutCents('1,5k', ',')).toBe(150_000);
  });

  it('comes in marked as a guess', () => {
    const reading = read('Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00\n2020-01-03,13 F-150,Parts,~200');
    expect(linesOf(reading).map(({ cents, isGuess }) => [cents, isGuess])).toEqual([
      [1000, false],
      [20_000, true],
    ]);
  });
});

describe('hours in every form', () => {
  it.each([
    ['3½', 12_600],
    ['1 1/2', 5400],
    ['½', 1800],
    ['3h30', 12_600],
    ['2 h 15 min', 8100],
    ['half day', 'bad'],
  ])('%s is %s', (text, seconds) => expect(readHours(text)).toBe(seconds));
  it.each([
    ['half day', 14_400],
    ['halber Tag', 14_400],
    ['all day', 28_800],
    ['2 days', 57_600],
    ['~3', 10_800],
    ['1-2', null],
    ['a while', null],
  ])('%s is roughly %s seconds', (text, seconds) => expect(aboutHours(text)).toBe(seconds));
});

describe('days without a year', () => {
  it.each([
    ['3/4', { month: 3, day: 4 }],
    ['4.3.', { month: 3, day: 4 }],
    ['4-Mar', { month: 3, day: 4 }],
    ['March 4th', { month: 3, day: 4 }],
    ['spring', null],
  ])('%s', (text, parts) => expect(yearlessParts(text, 'MDY')).toEqual(parts));
  it('take the year that brings them nearest', () => {
    expect(nearestDay({ month: 1, day: 3 }, '2019-12-28')).toBe('2020-01-03');
    expect(nearestDay({ month: 12, day: 30 }, '2020-01-02')).toBe('2019-12-30');
    expect(nearestDay({ month: 2, day: 30 }, '2020-01-02')).toBeNull();
  });
  it('follow the row above, and are marked', () => {
    const rows = ['12/28/2019,13 F-150,Parts,10.00', '1/3,13 F-150,Parts,11.00', '4-Jan,13 F-150,Parts,12.00'];
    const reading = read(['Date,Car,What for,Paid', ...rows].join('\n'));
    expect(linesOf(reading).map(({ on, isGuess }) => [on, isGuess])).toEqual([
      ['2019-12-28', false],
      ['2020-01-03', true],
      ['2020-01-04', true],
    ]);
  });
  it('a column of dates that lost its format is read by its numbers', () => {
    const reading = read('Date,Car,What for,Paid\n44205,13 F-150,Parts,10.00\n44206,13 F-150,Parts,11.00');
    expect(linesOf(reading).map(({ on }) => on)).toEqual(['2021-01-09', '2021-01-10']);
  });
});

describe('refunds typed positive', () => {
  it.each([
    ['returned door shell', true],
    ['core return, tail light', true],
    ['Gutschrift Stoßfänger', true],
    ['tow home, no return trip', false],
    ['door shell', false],
  ])('%s: %s', (text, is) => expect(isRefund(text)).toBe(is));
  it('stay refunds, marked as a guess', () => {
    const reading = read(
      'Date,Car,What for,Details,Paid\n2020-01-02,13 F-150,Parts,hood,100.00\n2020-01-09,13 F-150,Parts,returned hood,100.00',
    );
    expect(linesOf(reading).map(({ cents, isGuess }) => [cents, isGuess])).toEqual([
      [10_000, false],
      [-10_000, true],
    ]);
    expect(reading.control.costCents).toBe(0);
  });
});
