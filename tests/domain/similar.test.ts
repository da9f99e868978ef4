import { describe, expect, it } from 'vitest';
import { similarRebuilds } from '../../server/domain/similar.ts';
import { buildOutcome, buildRebuild, sale } from '../support/facts.ts';

const CAR = { class: 'SUV', damage: 'front', seen: false, planCents: 200_000 };

/** A finished rebuild planned at `plan` cents; like the car unless told otherwise. */
function past(id: string, plan: number, frame: Parameters<typeof buildRebuild>[0] = {}) {
  return buildOutcome(id, plan, plan, { class: 'SUV', damage: 'front', seen: false, ...frame });
}
const ids = (...facts: Parameters<typeof similarRebuilds>[0]) =>
  similarRebuilds(facts, CAR, 9).map((one) => one.rebuild.id);

describe('similar rebuilds', () => {
  it('come by what they have in common: more of it first, then seen, damage, class', () => {
    const facts = [
      past('nothing', 200_000, { class: 'van', damage: 'rear', seen: true }),
      past('class', 200_000, { damage: 'rear', seen: null }),
      past('damage', 200_000, { class: 'van', seen: true }),
      past('seen', 200_000, { class: 'van', damage: 'rear' }),
      past('class and damage', 200_000, { seen: true }),
      past('class and seen', 200_000, { damage: null }),
      past('damage and seen', 200_000, { class: null }),
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
      past('double', 400_000, { exit: sale('2025-01-01', 1) }),
      past('near', 250_000),
      past('half', 100_000, { exit: sale('2025-01-02', 1) }),
      past('triple', 600_000),
    ];
    expect(ids(...facts)).toEqual(['near', 'half', 'double', 'triple']);
    expect(ids(past('b', 200_000), past('a', 200_000))).toEqual(['a', 'b']);
  });

  it('are three, and say what is in common and how the plans compare', () => {
    const facts = ['a', 'b', 'c', 'd'].map((id) => past(id, 100_000, { class: 'van' }));
    const found = similarRebuilds(facts, CAR);
    expect(found.map((one) => one.rebuild.id)).toEqual(['a', 'b', 'c']);
    expect(found[0]).toMatchObject({ inCommon: ['seen', 'damage'], planRatio: 0.5 });
  });

  it('takes nothing unknown as alike, and leaves out what is unfinished or has no estimate', () => {
    const unknown = { class: null, damage: null, seen: null };
    const [found] = similarRebuilds([past('a', 100_000, unknown)], { ...unknown, planCents: 100_000 });
    expect(found?.inCommon).toEqual([]);
    expect(ids(past('open', 100_000, { exit: null }), buildRebuild({ estimates: new Map() }))).toEqual([]);
  });
});
