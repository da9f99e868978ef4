import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { contingencies, contingency, LEVELS, rankAt } from '../../server/domain/contingency.ts';
import { creepPercent, twoPartRule, twoPartRules } from '../../server/domain/two-part-rule.ts';
import { flatReserve, type Overran, reserve, twoPartReserve } from '#shared/measures/reserves.ts';
import { buildLine, buildOutcome, buildRebuild } from '../support/facts.ts';

const over = (...percents: number[]): Overran[] =>
  percents.map((overrunCents) => ({ overrunCents, estimateCents: 100 }));
const overran = fc.record({
  overrunCents: fc.integer({ min: -1e9, max: 1e9 }),
  estimateCents: fc.integer({ min: 1, max: 1e9 }),
});
const level = fc.constantFrom(...LEVELS, { p: 19, q: 20 });

describe('the rank', () => {
  // By hand: (n + 1)·p/q raised to a whole number.
  it.each([
    [35, 4, 5, 29],
    [35, 2, 3, 24],
    [1, 1, 2, 1],
    [2, 2, 3, 2],
    [0, 1, 2, 1],
    [9, 9, 10, 9],
  ])('of %d at %d/%d is %d', (n, p, q, k) => expect(rankAt(n, { p, q })).toBe(k));

  it('two thirds are not 67 percent', () => {
    expect(rankAt(199, { p: 2, q: 3 })).toBe(134);
    expect(rankAt(299, { p: 2, q: 3 })).toBe(200);
    expect(rankAt(299, { p: 67, q: 100 })).toBe(201);
  });
});

describe('the percent rule', () => {
  it('takes one overrun, uninterpolated, whatever their order', () => {
    expect(contingency(over(30, -10, 20, 40), { p: 4, q: 5 })).toMatchObject({
      n: 4,
      k: 4,
      uplift: 0.4,
      guarantee: 0.8,
    });
    expect(contingency(over(30, -10, 20, 40), { p: 1, q: 2 })).toMatchObject({ k: 3, uplift: 0.3, guarantee: 0.6 });
  });

  it('is too few yet rather than the largest', () => {
    expect(contingency(over(30, -10, 20), { p: 4, q: 5 })).toMatchObject({
      k: 4,
      taken: null,
      uplift: null,
      guarantee: null,
    });
    expect(contingency([], { p: 1, q: 2 })).toMatchObject({ n: 0, k: 1, taken: null });
  });

  it('would have covered at least its share of the rebuilds that it was made from', () => {
    fc.assert(
      fc.property(fc.array(overran, { minLength: 1, maxLength: 60 }), level, (set, at) => {
        const one = contingency(set, at);
        const { taken } = one;
        expect(taken === null).toBe(one.k > set.length);
        if (taken === null) return;
        const covered = set.filter(({ overrunCents, estimateCents }) => overrunCents <= reserve(taken, estimateCents));
        expect(covered.length).toBeGreaterThanOrEqual(one.k);
        expect(one.guarantee).toBeGreaterThanOrEqual(at.p / at.q - 1e-12);
      }),
    );
  });

  it('never cuts a plan, and asks whole cents that are just enough', () => {
    expect(reserve({ overrunCents: -5, estimateCents: 100 }, 1e6)).toBe(0);
    fc.assert(
      fc.property(overran, fc.nat({ max: 5e6 }), (taken, plan) => {
        const cents = reserve(taken, plan);
        const needed = BigInt(Math.max(0, taken.overrunCents)) * BigInt(plan);
        const per = BigInt(taken.estimateCents);
        expect(BigInt(cents) * per >= needed && (cents === 0 || BigInt(cents - 1) * per < needed)).toBe(true);
      }),
    );
  });

  it('a flat percentage is raised to the next cent', () => {
    expect([flatReserve(15, 100), flatReserve(15, 101), flatReserve(0, 101), flatReserve(15, 0)]).toEqual([
      15, 16, 0, 0,
    ]);
  });

  it('looks at completed rebuilds with a plan', () => {
    const facts = [
      buildOutcome('a', 130, 100),
      buildOutcome('b', 90, 100),
      buildOutcome('c', 90, 0),
      buildOutcome('d', 900, 100, { exit: null }),
    ];
    expect(contingencies(facts, LEVELS).map(({ n, k, uplift }) => [n, k, uplift])).toEqual([
      [2, 2, 0.3],
      [2, 2, 0.3],
      [2, 3, null],
      [2, 3, null],
    ]);
  });
});

describe('the two-part rule', () => {
  const outcome = (overrunCents: number, surpriseCents: number) => ({
    id: '',
    exitOn: '',
    boughtOn: null,
    estimateCents: 1000,
    overrunCents,
    surpriseCents,
  });

  it.each([
    [0, 1000, 0],
    [-5, 1000, 0],
    [100, 1000, 10],
    [101, 1000, 11],
    [1, 1000, 1],
  ])('creep of %d on %d is %d percent', (creep, estimate, percent) =>
    expect(creepPercent(creep, estimate)).toBe(percent),
  );

  // By hand: creep (100 + 50 + 150)/3000 = 10 %; residuals 400, −50, 50.
  it('is a percentage for known work and dollars for surprises', () => {
    const set = [outcome(500, 400), outcome(50, 0), outcome(150, 0)];
    expect(twoPartRule(set, { p: 1, q: 2 })).toMatchObject({ n: 3, creepPercent: 10, k: 2, flatCents: 50 });
    expect(twoPartRule(set, { p: 3, q: 4 })).toMatchObject({ k: 3, flatCents: 400 });
    expect(twoPartRule(set, { p: 4, q: 5 })).toMatchObject({ creepPercent: 10, k: 4, flatCents: null });
    expect(twoPartReserve(10, 50, 2001)).toBe(251);
  });

  it('has no negative part, and none at all over nothing', () => {
    expect(twoPartRule([outcome(-500, 0)], { p: 1, q: 2 })).toMatchObject({ creepPercent: 0, flatCents: 0 });
    expect(twoPartRule([], { p: 1, q: 2 })).toMatchObject({ n: 0, creepPercent: null, k: 1, flatCents: null });
  });

  it('leaves out rebuilds with an entry of unknown foreseen, and counts them', () => {
    const { rules, unknownCount } = twoPartRules(
      [buildOutcome('a', 130, 100), buildRebuild({}, [buildLine({ isForeseen: null })])],
      LEVELS,
    );
    expect([rules[0]?.n, unknownCount]).toEqual([1, 1]);
  });
});
