import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareGroups } from '../../server/domain/group-comparison.ts';
import { withoutFurthest } from '../../server/domain/group-without-one.ts';
import { kaplanMeier, medianDays } from '../../server/domain/kaplan-meier.ts';
import { medianDaysWithoutOne } from '../../server/domain/median-days-without-one.ts';
import type { OnMarket } from '../../server/domain/sets.ts';

const onMarket = (list: readonly { days: number; isSold: boolean }[]): OnMarket[] =>
  list.map((one, i) => ({ ...one, id: `r${i}`, class: null, isOtherExit: false }));

describe('the middle of the selling curve without one', () => {
  it('moves as far as the whole curve done again says', () => {
    const one = fc.record({ days: fc.integer({ min: 0, max: 12 }), isSold: fc.boolean() });
    fc.assert(
      fc.property(fc.array(one, { maxLength: 14 }), (list) => {
        const members = onMarket(list);
        const middle = medianDays(kaplanMeier(members)).days;
        const moves = members.flatMap((_, i) => {
          const days = medianDays(kaplanMeier(members.toSpliced(i, 1))).days;
          return days === null || middle === null ? [] : [Math.abs(days - middle)];
        });
        const found = medianDaysWithoutOne(members);
        expect(found === null).toBe(moves.length === 0);
        expect(Math.abs((found?.value ?? 0) - (found ? (middle ?? 0) : 0))).toBeCloseTo(Math.max(0, ...moves), 9);
      }),
    );
  });

  it('names who', () => {
    const members = onMarket([1, 3, 5, 9].map((days) => ({ days, isSold: true })));
    expect(medianDaysWithoutOne(members)).toEqual({ id: 'r0', value: 5 });
  });
});

describe('a pulled figure without its furthest', () => {
  it('is the fit of the others', () => {
    const groups = new Map([
      ['a', [10, 12, 14, 40]],
      ['b', [3, 4, 8]],
      ['c', [20, 26]],
    ]);
    const members = [10, 12, 14, 40].map((value) => ({ id: `m${value}`, value }));
    const found = withoutFurthest(compareGroups(groups), 0, members);
    const again = compareGroups(new Map([...groups, ['a', [10, 12, 14]]]));
    expect(found?.id).toBe('m40');
    expect(found?.value).toBeCloseTo(again.groups[0]?.shrunken?.value ?? 0, 9);
  });

  it('is the mean of the others where nothing can be pooled, and nothing for one alone', () => {
    const members = [1, 2, 9].map((value) => ({ id: `m${value}`, value }));
    expect(withoutFurthest(compareGroups(new Map([['a', [1, 2, 9]]])), 0, members)).toEqual({ id: 'm9', value: 1.5 });
    expect(withoutFurthest(compareGroups(new Map([['a', [1]]])), 0, members.slice(0, 1))).toBeNull();
  });
});
