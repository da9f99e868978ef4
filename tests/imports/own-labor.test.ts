import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const LIST = [
  'Date,Car,Category,Notes,Cost',
  '2022-03-04,12 Sonic,Parts,hood,180.00',
  '2022-03-09,12 Sonic,Labor,my labor,300.00',
  '2022-03-12,12 Sonic,Labor,my labor,175.00',
].join('\n');

describe('money for own time in a list', () => {
  it('is asked about, and put aside meanwhile', () => {
    const { choices, asides, control } = read(LIST);
    expect(choices.filter(({ kind }) => kind === 'own-labor')).toMatchObject([
      { id: 'own-labor', preset: 'leave out', mustAsk: true },
    ]);
    expect(asides).toMatchObject([
      { row: 3, reason: 'bad-hours', cents: 30_000 },
      { row: 4, reason: 'bad-hours', cents: 17_500 },
    ]);
    expect(control).toMatchObject({ costCents: 18_000, putAsideCents: 47_500 });
  });

  it('becomes hours at a rate that makes whole quarters of them, when someone says so', () => {
    const [choice] = read(LIST).choices.filter(({ kind }) => kind === 'own-labor');
    expect(choice?.options.map(({ value }) => value)).toContain('hours at 25');
    const { control } = read(LIST, { answers: { 'own-labor': 'hours at 25' } });
    expect(control).toMatchObject({ hoursSeconds: 19 * 3600, costCents: 18_000, putAside: 0 });
  });

  it('is a cost when it was paid to somebody', () => {
    const reading = read(LIST, { answers: { 'own-labor': 'paid work' } });
    expect(reading.control.centsByCategory).toMatchObject({ 'outside labor (sublet)': 47_500 });
  });

  it('needs no asking where its words name the hours, or somebody was paid', () => {
    const text = [
      'When,Vehicle,What,Paid to,Type,Amount',
      '6/21/2021,09 Camry,labor 12h x $25,,Labor,300.00',
      '6/28/2021,09 Camry,weld rail,Iron Mike,Labor,200.00',
    ].join('\n');
    const reading = read(text);
    expect(reading.choices.filter(({ kind }) => kind === 'own-labor')).toEqual([]);
    expect(linesOf(reading)).toMatchObject([
      { kind: 'hours', seconds: 12 * 3600, cents: 0 },
      { kind: 'entry', category: 'outside labor (sublet)', cents: 20_000 },
    ]);
  });
});

describe('a column of money for own time', () => {
  const rows = (heading: string) =>
    `Car,Bid,Fees,Tow,Parts,${heading}\n2009 Corolla,1800,230,75,655.20,250.00\n2012 Passat,2400,280,120,1210.90,400.00`;
  it('is asked about where no column holds the hours', () => {
    const reading = read(rows('Labor'));
    expect(reading.choices).toMatchObject([{ kind: 'own-labor', column: 'Labor', preset: 'leave out' }]);
    const id = reading.choices[0]?.id ?? '';
    expect(read(rows('Labor'), { answers: { [id]: 'paid work' } }).control.costCents).toBe(742_110);
  });

  it('only repeats the hours where another column holds them', () => {
    const text = rows('My labor @ $25,My labor hrs')
      .replaceAll('250.00', '250.00,10')
      .replaceAll('400.00', '400.00,16');
    expect(read(text).choices).toEqual([]);
    expect(read(text).control).toMatchObject({ hoursSeconds: 26 * 3600 });
  });
});
