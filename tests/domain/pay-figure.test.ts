import { expect, it } from 'vitest';
import { payFigure } from '../../server/domain/pay-figure.ts';

// Source of the figures: by hand. 1,000 kept and 200 of wages on 8,000 of cost, 40 own hours and 10 paid ones.
const sums = {
  n: 2,
  profitCents: 100_000,
  laborCents: 20_000,
  costCents: 800_000,
  ownSeconds: 40 * 3600,
  allSeconds: 50 * 3600,
};

it('says what is kept by each view', () => {
  expect(payFigure('per-hour', null)(sums)).toBe(2500);
  expect(payFigure('all-hours', null)(sums)).toBe(2400);
  expect(payFigure('after-wage', 2000)(sums)).toBe((100_000 - 80_000) / 2);
  expect(payFigure('on-cost', null)(sums)).toBe(0.125);
});

it('says nothing where hours, a wage or cost are missing', () => {
  const unknown = { ...sums, ownSeconds: 0, allSeconds: 0, costCents: 0 };
  for (const view of ['per-hour', 'all-hours', 'after-wage', 'on-cost'] as const) {
    expect(payFigure(view, 2000)(unknown)).toBeNull();
  }
  expect(payFigure('after-wage', null)(sums)).toBeNull();
});
