import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const list = (...cars: string[]) =>
  ['Date,Car,Category,Paid', ...cars.map((car, i) => `2020-01-${13 + i},${car},Parts,${i + 1}0.00`)].join('\n');
const carsOf = (text: string, answers: Record<string, string> = {}) => {
  const reading = read(text, { answers });
  return linesOf(reading).map(({ rebuild }) => reading.rebuilds[rebuild ?? -1]?.tag);
};

describe('one vehicle or two of the same year and model', () => {
  const text = list('13 Focus', '2013 Ford Focus', '13 Focus', '12 Jetta');

  it('any spelling can be made a vehicle of its own, another one, or be put aside', () => {
    expect(carsOf(text)).toEqual(['13 Focus', '13 Focus', '13 Focus', '12 Jetta']);
    const answer = (value: string) => carsOf(text, { 'vehicle:2013 Ford Focus': value });
    expect(answer('own')).toEqual(['13 Focus', '2013 Ford Focus', '13 Focus', '12 Jetta']);
    expect(answer('2012|jetta')).toEqual(['13 Focus', '12 Jetta', '13 Focus', '12 Jetta']);
    expect(answer('aside')).toEqual(['13 Focus', '13 Focus', '12 Jetta']);
  });

  it('the spelling used most can leave, too, and others can join what left', () => {
    expect(carsOf(text, { 'vehicle:13 Focus': 'own' })).toEqual([
      '13 Focus',
      '2013 Ford Focus',
      '13 Focus',
      '12 Jetta',
    ]);
    const joined = { 'vehicle:13 Focus': 'own', 'vehicle:12 Jetta': 'own|13 focus' };
    expect(carsOf(text, joined)).toEqual(['13 Focus', '2013 Ford Focus', '13 Focus', '13 Focus']);
  });

  it('names what an answer calls each vehicle', () => {
    expect(read(text).rebuilds.map(({ vehicleId }) => vehicleId)).toEqual(['2013|focus', '2012|jetta']);
  });

  it('two colors are taken for two vehicles, and asked about; words for one color are not', () => {
    const colors = list('13 Focus red', '13 Focus red', '2013 Focus blue', '13 Focus');
    expect(carsOf(colors)).toEqual(['13 Focus red', '13 Focus red', '2013 Focus blue', '13 Focus red']);
    expect(read(colors).choices).toMatchObject([{ id: 'vehicle:2013 Focus blue', preset: 'own', mustAsk: true }]);
    const same = carsOf(colors, { 'vehicle:2013 Focus blue': '2013|focus' });
    expect(new Set(same).size).toBe(1);
    expect(read(list('13 Focus silver', '2013 Focus grau')).choices).toEqual([]);
  });
});
