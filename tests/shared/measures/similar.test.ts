import { describe, expect, it } from 'vitest';
import { type PastRebuild, similarRebuilds } from '#shared/measures/similar.ts';

const CAR = { classId: 'SUV', damageId: 'front', isSeen: false, planCents: 200_000 };

/** A finished rebuild planned at `plan` cents; like the car unless told otherwise. */
function past(id: string, estimateCents: number, frame: Partial<PastRebuild> = {}): PastRebuild {
  return { id, estimateCents, classId: 'SUV', damageId: 'front', isSeen: false, leftOn: '2025-04-01', ...frame };
}
const ids = (...facts: PastRebuild[]) => similarRebuilds(facts, CAR, 9).map((one) => one.rebuild.id);

describe('similar rebuilds', () => {
  it('come by what they have in common: more of it first, then seen, damage, class', () => {
    const facts = [
      past('nothing', 200_000, { classId: 'van', damageId: 'rear', isSeen: true }),
      past('class', 200_000, { damageId: 'rear', isSeen: null }),
      past('damage', 200_000, { classId: 'van', isSeen: true }),
      past('seen', 200_000, { classId: 'van', damageId: 'rear' }),
      past('class and damage', 200_000, { isSeen: true }),
      past('class and seen', 200_000, { damageId: null }),
      past('damage and seen', 200_000, { classId: null }),
      past('all', 900_000),
    ];
    const expected = [
      'all',
      'damage and seen',
      'class and seen',
      'class and damage',
      'seen',
      'damage',
      'class',
      'nothing',
    ];
    expect(ids(...facts)).toEqual(expected);
    expect(ids(...facts.toReversed())).toEqual(expected);
  });

  it('of equals, by plan size: half and double are equally far, and the later one comes first', () => {
    const facts = [
      past('double', 400_000, { leftOn: '2025-01-01' }),
      past('near', 250_000),
      past('half', 100_000, { leftOn: '2025-01-02' }),
      past('triple', 600_000),
    ];
    expect(ids(...facts)).toEqual(['near', 'half', 'double', 'triple']);
    expect(ids(past('b', 200_000), past('a', 200_000))).toEqual(['a', 'b']);
  });

  it('are three, and say what is in common and how the plans compare', () => {
    const facts = ['a', 'b', 'c', 'd'].map((id) => past(id, 100_000, { classId: 'van' }));
    const found = similarRebuilds(facts, CAR);
    expect(found.map((one) => one.rebuild.id)).toEqual(['a', 'b', 'c']);
    expect(found[0]).toMatchObject({ inCommon: ['seen', 'damage'], planRatio: 0.5 });
  });

  it('takes nothing unknown as alike', () => {
    const unknown = { classId: null, damageId: null, isSeen: null };
    const [found] = similarRebuilds([past('a', 100_000, unknown)], { ...unknown, planCents: 100_000 });
    expect(found?.inCommon).toEqual([]);
    expect(similarRebuilds([], CAR)).toEqual([]);
  });

  it('looks at the plan size only once something is planned', () => {
    const found = similarRebuilds([past('old', 1_000), past('new', 900_000, { leftOn: '2025-05-01' })], {
      ...CAR,
      planCents: 0,
    });
    expect(found.map(({ rebuild, planRatio }) => [rebuild.id, planRatio])).toEqual([
      ['new', null],
      ['old', null],
    ]);
  });
});
