import { describe, expect, it } from 'vitest';
import type { Start, Surprises } from '#shared/contracts/bids-basis.ts';
import { sellingFor, startFor, surprisesFor } from '#shared/measures/like-cars.ts';

const CAR = { classId: 'SUV', damageId: 'front', isSeen: false };
const NOBODY = { classId: null, damageId: null, isSeen: null };

describe('where the plan of a car starts', () => {
  const hours = { n: 0, plannedSeconds: null, actualSeconds: null, ownSeconds: null };
  const start = (classId: string | null, damageId: string | null, n: number): Start => {
    return { classId, damageId, n, lines: [], hours };
  };
  const all = start(null, null, 3);

  it('is its class and damage, else its damage, else all', () => {
    expect(startFor([start('SUV', 'front', 5), start(null, 'front', 9), all], CAR)?.n).toBe(5);
    expect(startFor([start('SUV', 'front', 4), start(null, 'front', 9), all], CAR)?.n).toBe(9);
    expect(startFor([start(null, 'front', 4), all], CAR)).toBe(all);
    expect(startFor([start(null, 'front', 9), all], NOBODY)).toBe(all);
    expect(startFor([], CAR)).toBeNull();
  });
});

describe('what surprised on such a car', () => {
  const group = (damageId: string | null, isSeen: boolean | null, n: number): Surprises => {
    return { damageId, isSeen, n, x: 0, categories: [] };
  };
  const all = group(null, null, 2);

  it('is that of its damage and seen or not, else of its damage, else all', () => {
    expect(surprisesFor([group('front', false, 5), group('front', null, 8), all], CAR)?.n).toBe(5);
    expect(surprisesFor([group('front', true, 5), group('front', null, 8), all], CAR)?.n).toBe(8);
    expect(surprisesFor([group('front', false, 5), group('front', null, 8), all], { ...CAR, isSeen: null })?.n).toBe(8);
    expect(surprisesFor([group('front', null, 4), all], CAR)).toBe(all);
    expect(surprisesFor([], CAR)).toBeNull();
  });
});

it('days are those of its class once five of it were sold, else of all', () => {
  const wait = (soldCount: number) => {
    return { n: soldCount, soldCount, unsoldCount: 0, otherExitCount: 0, median: 1, lower: null, upper: null };
  };
  const rows = (sold: number) =>
    [null, 'SUV'].map((classId) => ({ classId, toSell: wait(classId ? sold : 20), held: wait(20) }));
  expect(sellingFor(rows(5), 'SUV')?.classId).toBe('SUV');
  expect(sellingFor(rows(4), 'SUV')?.classId).toBeNull();
  expect(sellingFor(rows(5), null)?.classId).toBeNull();
  expect(sellingFor([], 'SUV')).toBeNull();
});
