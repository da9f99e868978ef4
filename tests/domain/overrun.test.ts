import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { overrun, overrunByCategory, rebuildOverrun } from '../../server/domain/overrun.ts';
import { buildLine, buildOutcome, buildRebuild } from '../support/facts.ts';

describe('overrun', () => {
  // Source: definitions §15 and public check "ratios-pooled-mean".
  it('pooled is ruled by the large, the mean by the small', () => {
    const one = overrun([buildOutcome('a', 300, 100), buildOutcome('b', 900, 1000)]);
    expect(one.pooled).toBeCloseTo(1 / 11, 14);
    expect(one.mean).toBeCloseTo(0.95, 14);
    expect(one).toMatchObject({ n: 2, isThin: true, estimateCents: 1100, actualCents: 1200 });
  });

  it('counts what nobody planned, and leaves chosen extras out', () => {
    const lines = [
      buildLine({ cents: 250_000 }),
      buildLine({ category: 'tax', cents: 25_000 }),
      buildLine({ cents: 99, isExtra: true }),
    ];
    expect(rebuildOverrun(buildRebuild({}, lines))).toBe(0.1);
  });

  it('says whom it left out', () => {
    const estimates = new Map(['parts', 'paint', 'tax'].map((category) => [category, 100]));
    const lines = [...estimates].map(([category, cents]) => buildLine({ category, cents }));
    const facts = [buildRebuild({ estimates }, lines), buildOutcome('a', 100, 0), buildOutcome('b', 110, 100)];
    expect(overrun(facts)).toMatchObject({ n: 1, overwrittenCount: 1, noEstimateCount: 1 });
    expect(facts.map(rebuildOverrun)).toEqual([null, null, 0.1]);
  });

  it('of nothing is nothing, of equals has no spread', () => {
    expect(overrun([])).toMatchObject({
      n: 0,
      pooled: null,
      median: null,
      mean: null,
      q10: null,
      q90: null,
      isThin: true,
    });
    const five = overrun(Array.from({ length: 5 }, (_, i) => buildOutcome(String(i), 110, 100)));
    expect(five).toMatchObject({ n: 5, pooled: 0.1, median: 0.1, q10: 0.1, q90: 0.1, isThin: false });
  });

  it('is the same in any order and when every sum doubles', () => {
    const pairs = fc.array(fc.tuple(fc.nat({ max: 1e8 }), fc.integer({ min: 1, max: 1e8 })), { maxLength: 12 });
    fc.assert(
      fc.property(pairs, (list) => {
        const make = (factor: number) =>
          list.map(([actual, estimate], i) => buildOutcome(String(i), factor * actual, factor * estimate));
        const one = overrun(make(1));
        expect(overrun(make(1).toReversed()).pooled).toBe(one.pooled);
        expect(overrun(make(2))).toMatchObject({ pooled: one.pooled, median: one.median, q75: one.q75 });
      }),
    );
  });
});

describe('overrun by category', () => {
  // By hand: parts planned twice, tax once and spent unplanned once, paint planned and never spent.
  const facts = [
    buildRebuild(
      {
        estimates: new Map([
          ['parts', 100],
          ['tax', 40],
          ['paint', 50],
        ]),
      },
      [buildLine({ cents: 150 }), buildLine({ category: 'tax', cents: 30 })],
    ),
    buildRebuild({ estimates: new Map([['parts', 300]]) }, [
      buildLine({ cents: 300 }),
      buildLine({ category: 'tax', cents: 70 }),
    ]),
    buildRebuild({ exit: null }, [buildLine({ category: 'unseen' })]),
  ];

  it('sets planned against actual, with the unbudgeted beside it', () => {
    const rows = overrunByCategory(facts);
    expect(rows.map(({ category, n, pooled, median }) => [category, n, pooled, median])).toEqual([
      ['paint', 1, -1, -1],
      ['parts', 2, 0.125, 0.25],
      ['tax', 1, -0.25, -0.25],
    ]);
    expect(rows.map(({ unbudgetedCount, unbudgetedCents }) => [unbudgetedCount, unbudgetedCents])).toEqual([
      [0, 0],
      [0, 0],
      [1, 70],
    ]);
  });

  it('of nothing has no row; a category that was only spent has no ratio', () => {
    expect(overrunByCategory([])).toEqual([]);
    const [row] = overrunByCategory([buildRebuild({ estimates: new Map() }, [buildLine({ cents: 5 })])]);
    expect(row).toMatchObject({
      category: 'parts',
      n: 0,
      pooled: null,
      median: null,
      unbudgetedCents: 5,
      isThin: true,
    });
  });
});
