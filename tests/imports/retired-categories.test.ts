import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const books = { categories: ['parts', 'glass', 'other'], retiredCategories: ['Frame bench', 'windscreens'] };
const categories = (text: string) => linesOf(read(text, {}, books)).map(({ category, isGuess }) => [category, isGuess]);

describe('categories that a shop has retired', () => {
  it('are understood where an old file writes them out, in any case', () => {
    const rows = ['1/13/2021,13 Focus,frame BENCH,90.00', '1/14/2021,13 Focus,Parts,80.00'].join('\n');
    expect(categories(`Date,Car,Category,Paid\n${rows}`)).toEqual([
      ['Frame bench', false],
      ['parts', false],
    ]);
  });

  it('are known as a heading of a sheet with one vehicle per row, too', () => {
    expect(categories('Stock,Year,Model,Frame bench,Parts\nA1,2012,Jetta,20.00,5.00\nA2,2013,Golf,21.00,6.00')).toEqual(
      [
        ['Frame bench', false],
        ['parts', false],
        ['Frame bench', false],
        ['parts', false],
      ],
    );
  });

  it('take nothing that is not called so', () => {
    expect(categories('Date,Car,Category,Paid\n1/13/2021,13 Focus,windshield,90.00')).toEqual([['glass', false]]);
  });
});
