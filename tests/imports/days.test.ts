import { describe, expect, it } from 'vitest';
import { dayReader, isNotYet, looksLikeDay } from '../../server/features/imports/cells/days.ts';
import { linesOf, read } from './support.ts';

describe('a day', () => {
  const read = dayReader('MDY', '2026-12-01');
  it.each([
    ['Tue 1/5/16', '2016-01-05'],
    ['Mo., 04.05.20', '2020-05-04'],
    ['5/3/21 (Mon)', '2021-05-03'],
    ['mar 5, 2019', '2019-03-05'],
    ['Mar. 5, 2019', '2019-03-05'],
    ['3 de enero de 2022', '2022-01-03'],
    ['1er mars 2021', '2021-03-01'],
    ['12. Jan. 2022', '2022-01-12'],
  ])('%s is %s', (text, day) => {
    expect(read(text)).toBe(day);
    expect(looksLikeDay(text)).toBe(true);
  });

  it('a vehicle or a word beside a number is none', () => {
    expect(read('Fri 500')).toBe('bad');
    expect(looksLikeDay('Fri 500')).toBe(false);
  });

  it.each(['in shop', 'noch nicht', 'invendu', '—'])('%s says that it has not come yet', (text) =>
    expect(isNotYet(text)).toBe(true),
  );
});

describe('the order of day and month', () => {
  const list = (...days: string[]) =>
    ['Date,Car,What,Amount', ...days.map((day, i) => `${day},11 Miata,clips,${i + 1}.00`)].join('\n');

  it('is settled by a day with points in the same column', () => {
    const reading = read(list('3/4/2019', '05.04.2019', '3/2/2019'));
    expect(linesOf(reading).map(({ on }) => on)).toEqual(['2019-04-03', '2019-04-05', '2019-02-03']);
    expect(reading.choices.filter(({ kind }) => kind === 'date-order')).toEqual([]);
  });

  it('is settled by the weekday beside it', () => {
    expect(linesOf(read(list('Fri 3/1/2019', 'Sun 2/3/2019')))[0]?.on).toBe('2019-03-01');
    expect(linesOf(read(list('Thu 3/1/2019', 'Sat 2/3/2019')))[0]?.on).toBe('2019-01-03');
  });

  it('is settled by the rhythm of a weekly sheet', () => {
    const text = [
      'Semana;Coche;Lun;Mar;Mié;Jue;Vie',
      '02/03/2020;Corsa 2010;3;;2,5;;',
      '09/03/2020;Leon 2014;;4;;4;',
      '06/04/2020;Corsa 10;1,5;;;;',
    ].join('\n');
    const reading = read(text);
    expect(linesOf(reading).map(({ on }) => on)).toEqual([
      '2020-03-02',
      '2020-03-04',
      '2020-03-10',
      '2020-03-12',
      '2020-04-06',
    ]);
    expect(reading.choices).toEqual([]);
  });

  it('is asked where nothing settles it; under German, Spanish or French headings the day is offered first', () => {
    const [choice] = read('Fecha;Coche;Concepto;Importe\n03/04/2019;11 Ibiza;aleta;60,00').choices;
    expect(choice).toMatchObject({ kind: 'date-order', preset: 'DMY', mustAsk: true });
    expect(read(list('3/4/2019')).choices[0]).toMatchObject({ kind: 'date-order', preset: 'MDY' });
  });
});
