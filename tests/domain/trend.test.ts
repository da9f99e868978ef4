import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { trend } from '../../server/domain/trend.ts';

const points = (xs: readonly number[], ys: readonly number[]) => xs.map((x, i) => ({ x, y: ys[i] ?? 0 }));

// Source of the figures: scipy 1.17.1, stats.theilslopes(y, x, 0.95).
describe('trend', () => {
  it('is the median slope with its rank interval', () => {
    const xs = [0.1, 0.5, 0.9, 1.3, 1.3, 2.0, 2.6, 3.1, 3.9, 4.4];
    const ys = [0.42, 0.31, 0.55, 0.4, 0.38, 0.61, 0.47, 0.52, 0.66, 0.4];
    const { n, slope, lower, upper, isThin } = trend(points(xs, ys));
    expect([n, isThin]).toEqual([10, false]);
    expect(slope).toBeCloseTo(0.04525641025641024, 12);
    expect(lower).toBeCloseTo(-0.03888888888888886, 12);
    expect(upper).toBeCloseTo(0.1, 12);
  });

  it('counts ties', () => {
    const ys = [49, 51, 47, 50, 49, 48, 52, 49, 50, 51, 48, 49];
    const { slope, lower, upper } = trend(points([...ys.keys()], ys));
    expect(slope).toBe(0);
    expect(lower).toBeCloseTo(-1 / 3, 12);
    expect(upper).toBeCloseTo(0.4, 12);
  });

  it('is marked where it rests on too few, and null on one day', () => {
    const few = trend(points([1, 2, 3, 4], [1, 3, 2, 6]));
    expect(few).toMatchObject({ n: 4, lower: -1, upper: 4, isThin: true });
    expect(few.slope).toBeCloseTo(19 / 12, 12);
    expect(trend(points([3, 3], [1, 2]))).toEqual({ n: 2, slope: null, lower: null, upper: null, isThin: true });
    expect(trend([]).slope).toBeNull();
  });

  it('is not pulled by one far rebuild, and turns with its sign', () => {
    const straight = points([1, 2, 3, 4, 5, 6, 7, 8, 9], [2, 4, 6, 8, 10, 12, 14, 16, 900]);
    expect(trend(straight).slope).toBe(2);
    const some = fc.array(fc.record({ x: fc.integer({ min: 0, max: 50 }), y: fc.integer({ min: -99, max: 99 }) }), {
      minLength: 2,
      maxLength: 25,
    });
    fc.assert(
      fc.property(some, (list) => {
        const [up, down] = [trend(list), trend(list.map(({ x, y }) => ({ x, y: -y })))];
        expect(down.slope ?? 0).toBeCloseTo(-(up.slope ?? 0), 9);
        expect(up.lower ?? 0).toBeLessThanOrEqual(up.slope ?? 0);
        expect(up.upper ?? 0).toBeGreaterThanOrEqual(up.slope ?? 0);
      }),
    );
  });
});
