import { describe, expect, it } from 'vitest';
import { surpriseRate } from '../../server/domain/surprise-rate.ts';
import { buildLine, buildRebuild } from '../support/facts.ts';

const surprise = (cents: number, category = 'parts') => buildLine({ category, cents, isForeseen: false });

describe('surprise rate', () => {
  // By hand: two of four told rebuilds are surprised; 300 + 50 − 20 of 1,330 paid.
  const facts = [
    buildRebuild({}, [buildLine({ cents: 1000 }), surprise(300), surprise(50, 'tax')]),
    buildRebuild({}, [surprise(-20)]),
    buildRebuild({}, []),
    buildRebuild({}, [surprise(1, 'tax'), surprise(-1, 'tax')]),
    buildRebuild({}, [surprise(5000), buildLine({ isForeseen: null })]),
    buildRebuild({ exit: null }, [surprise(5000)]),
  ];

  it('counts rebuilds with a surprise above 0, over those where everything was said', () => {
    expect(surpriseRate(facts)).toMatchObject({ n: 4, x: 2, rate: 0.5, unknownCount: 1, unforeseenCents: 330 });
    expect(surpriseRate(facts).shareOfWork).toBeCloseTo(330 / 1330, 14);
  });

  it('by category, each over the same rebuilds', () => {
    const rows = surpriseRate(facts).categories;
    expect(rows.map(({ category, n, x, unforeseenCents }) => [category, n, x, unforeseenCents])).toEqual([
      ['parts', 4, 1, 280],
      ['tax', 4, 2, 50],
    ]);
  });

  it('a chosen extra and a free part are no surprise', () => {
    const lines = [
      buildLine({ isForeseen: false, isExtra: true }),
      buildLine({ cents: 0, freeCents: 900, isForeseen: false }),
    ];
    expect(surpriseRate([buildRebuild({}, lines)])).toMatchObject({ n: 1, x: 0, lower: 0, unforeseenCents: 0 });
  });

  it('of nothing is nothing', () => {
    expect(surpriseRate([])).toEqual({
      n: 0,
      x: 0,
      rate: null,
      lower: null,
      upper: null,
      unknownCount: 0,
      unforeseenCents: 0,
      shareOfWork: null,
      categories: [],
    });
  });
});
