import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type CarTraits, pastOnRung, pickRung } from '#shared/measures/ladder-rungs.ts';
import { LEVELS } from '../../../server/domain/contingency.ts';
import type { RebuildFacts } from '../../../server/domain/facts.ts';
import { percentOnLadder, twoPartOnLadder } from '../../../server/domain/ladder.ts';
import { ladderRows } from '../../../server/domain/ladder-rows.ts';
import { buildLine, buildRebuild } from '../../support/facts.ts';

const car = fc.record({
  class: fc.constantFrom('SUV', 'van', null),
  damage: fc.constantFrom('front', 'rear', null),
  seen: fc.constantFrom(true, false, null),
});
const past = fc.record({
  car,
  plan: fc.integer({ min: 50_000, max: 400_000 }),
  actual: fc.integer({ min: 0, max: 700_000 }),
  isForeseen: fc.constantFrom(true, true, true, false, null),
  isOpen: fc.boolean(),
});

/** The rows as a sheet gets them; here the names serve as ids. */
function rowsOf(facts: readonly RebuildFacts[]) {
  return ladderRows(facts, LEVELS).map(({ class: classId, damage: damageId, seen: isSeen, ...row }) => {
    return { ...row, classId, damageId, isSeen };
  });
}

describe('the rung picked from rows worked out beforehand', () => {
  // Two ways to the same figure: climbing over the rebuilds for this one car, and picking from what was worked out for all.
  it('is the ladder’s own, at every level, for both rules', () => {
    fc.assert(
      fc.property(fc.array(past, { minLength: 5, maxLength: 70 }), car, (many, wanted) => {
        const facts = many.map(({ car: traits, plan, actual, isForeseen, isOpen }, i) =>
          buildRebuild(
            { ...traits, id: `r${i}`, estimates: new Map([['parts', plan]]), ...(isOpen ? { exit: null } : {}) },
            [buildLine({ cents: actual, isForeseen })],
          ),
        );
        const rows = rowsOf(facts);
        const traits: CarTraits = { classId: wanted.class, damageId: wanted.damage, isSeen: wanted.seen };
        for (const [i, level] of LEVELS.entries()) {
          const percent = percentOnLadder(facts, wanted, level);
          const one = pickRung(rows, traits, { level, countOf: (row) => row.percent.n });
          expect([one.row?.rung ?? null, one.n, one.k]).toEqual([percent.rung, percent.n, percent.k]);
          const taken = percent.taken && [percent.taken.overrunCents, percent.taken.estimateCents];
          expect(one.row?.percent.taken[i] ?? null).toEqual(taken);
          const twoPart = twoPartOnLadder(facts, wanted, level);
          const two = pickRung(rows, traits, { level, countOf: (row) => row.twoPart.n });
          expect([two.row?.rung ?? null, two.n, two.k]).toEqual([twoPart.rung, twoPart.n, twoPart.k]);
          expect(two.row?.twoPart.creepPercent ?? null).toBe(twoPart.creepPercent);
          expect(two.row?.twoPart.flatCents[i] ?? null).toBe(twoPart.flatCents);
        }
      }),
      { numRuns: 100 },
    );
  });

  it('of nothing is nothing', () => {
    const level = { p: 4, q: 5 };
    const unknown = { classId: null, damageId: null, isSeen: null };
    expect(pickRung([], unknown, { level, countOf: () => 0 })).toEqual({ row: null, n: 0, k: 1 });
    expect(pastOnRung([], unknown)).toEqual({ rung: null, members: [] });
  });
});

it('past rebuilds are taken from the finest rung with nine of them', () => {
  const many = (count: number, traits: Partial<CarTraits>) =>
    Array.from({ length: count }, () => ({ classId: 'SUV', damageId: 'front', isSeen: false, ...traits }));
  const like = { classId: 'SUV', damageId: 'front', isSeen: false };
  const found = (...past: CarTraits[][]) => {
    const { rung, members } = pastOnRung(past.flat(), like);
    return [rung, members.length];
  };
  expect(found(many(9, {}), many(3, { classId: 'van' }))).toEqual(['class+damage+seen', 9]);
  expect(found(many(8, {}), many(3, { classId: 'van' }))).toEqual(['damage+seen', 11]);
  expect(found(many(8, {}), many(3, { damageId: null }))).toEqual(['seen', 11]);
  expect(found(many(8, {}), many(3, { isSeen: true }))).toEqual(['all', 11]);
  expect(found(many(8, {}))).toEqual([null, 0]);
});
