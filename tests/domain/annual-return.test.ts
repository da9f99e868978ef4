import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { annualReturn, annualReturns, hasFlows, hasSeveralReturns } from '../../server/domain/annual-return.ts';
import { type NetFlows, netFlows } from '../../server/domain/net-flows.ts';
import { buildLine, buildRebuild } from '../support/facts.ts';

/** The definition taken at its word: every step of the whole range, every turn halved until it stands, then the choice. */
function straightforward(net: NetFlows): number[] {
  const flows = [...net].filter(([, cents]) => cents !== 0).sort(([a], [b]) => a - b);
  const first = flows[0]?.[0] ?? 0;
  const last = (flows.at(-1)?.[0] ?? 0) - first;
  const value = (x: number): number => {
    const origin = x < 0 ? last : 0;
    return flows.reduce((total, [day, cents]) => total + cents * Math.exp((-x * (day - first - origin)) / 365), 0);
  };
  const roots: number[] = [];
  const [low, high] = [Math.log(0.0001), Math.log(1_000_001)];
  const grid = [low, ...Array.from({ length: 2303 }, (_, i) => (i - 921) / 100), high].toSorted((a, b) => a - b);
  for (let i = 1; i < grid.length; i += 1) {
    let [a, b] = [grid[i - 1] ?? 0, grid[i] ?? 0];
    if (value(b) === 0) roots.push(b);
    if (Math.sign(value(a)) * Math.sign(value(b)) >= 0) continue;
    for (let round = 0; round < 100; round += 1) {
      const middle = (a + b) / 2;
      if (Math.sign(value(middle)) === Math.sign(value(a))) a = middle;
      else b = middle;
    }
    roots.push((a + b) / 2);
  }
  return roots.toSorted((a, b) => (Math.abs(Math.abs(a) - Math.abs(b)) < 1e-9 ? b - a : Math.abs(a) - Math.abs(b)));
}

function days(...flows: [number, number][]): NetFlows {
  return netFlows(flows.map(([day, cents]) => ({ day, cents })));
}

/** How far a return is from ln(1 + r) = `root`, relative to 1 + r; null = no return, where only none agrees. */
function offBy(found: number | null, root: number | null): number {
  if (found === null || root === null) return found === root ? 0 : Number.POSITIVE_INFINITY;
  return Math.abs(found - Math.expm1(root)) / Math.exp(root);
}

const anyFlows = fc.array(fc.tuple(fc.nat({ max: 1500 }), fc.integer({ min: -1e7, max: 1e7 })), {
  minLength: 2,
  maxLength: 12,
});
const flip = fc.tuple(fc.integer({ min: 1, max: 900 }), fc.integer({ min: 1, max: 1e8 }), fc.nat({ max: 1e8 }));

// Published examples are checked in tests/reference.
describe('the search outward from 0', () => {
  const bothWays = (net: NetFlows): boolean =>
    [...net.values()].some((one) => one > 0) && [...net.values()].some((one) => one < 0);

  it('finds what the whole range, searched step by step, finds', () => {
    fc.assert(
      fc.property(anyFlows, (flows) => {
        const net = days(...flows);
        const roots = bothWays(net) ? straightforward(net) : [];
        expect(offBy(annualReturn(net), roots[0] ?? null)).toBeLessThanOrEqual(1e-9);
        expect(hasSeveralReturns(net)).toBe(roots.length > 1);
      }),
      { numRuns: 150 },
    );
  });

  it('gives a flip the return that brings its price to its proceeds', () => {
    fc.assert(
      fc.property(flip, ([held, price, proceeds]) => {
        const exact = (365 / held) * Math.log(proceeds / price);
        const isInRange = exact >= Math.log(0.0001) && exact <= Math.log(1_000_001);
        const found = annualReturn(days([100, -price], [100 + held, proceeds]));
        expect(offBy(found, isInRange ? exact : null)).toBeLessThanOrEqual(1e-9);
      }),
    );
  });

  it('is the same when every amount doubles and when all days move', () => {
    fc.assert(
      fc.property(anyFlows, (flows) => {
        const found = annualReturn(days(...flows));
        expect(annualReturn(days(...flows.map(([day, cents]): [number, number] => [day, 2 * cents])))).toBe(found);
        expect(annualReturn(days(...flows.map(([day, cents]): [number, number] => [day + 20_000, cents])))).toBe(found);
      }),
    );
  });
});

describe('edges', () => {
  it('has no return with money one way only, on one day, or none at all', () => {
    expect(annualReturn(days())).toBeNull();
    expect(annualReturn(days([0, -100]))).toBeNull();
    expect(annualReturn(days([0, -100], [9, -50]))).toBeNull();
    expect(annualReturn(days([5, -100], [5, 130]))).toBeNull();
    expect(annualReturn(days([0, -100], [0, 100], [9, 50], [9, -50]))).toBeNull();
  });

  it('takes exactly 0 for money that came back unchanged', () =>
    expect(annualReturn(days([0, -100], [400, 100]))).toBe(0));

  it('takes the positive one of two equally far', () => {
    // −100, 202, −100 at equal steps: the two rates are r and 1/(1 + r) − 1.
    const found = annualReturn(days([0, -100], [365, 202], [730, -100]));
    expect(found).toBeGreaterThan(0);
    expect(Math.log1p(found ?? 0)).toBeCloseTo(Math.acosh(1.01), 9);
  });

  it('has a root on a step, though the step multiplies in place of powers', () => {
    const x = 0.37;
    const net = days([0, -1_000_000], [365, 1_000_000 * Math.exp(x)]);
    expect(Math.log1p(annualReturn(net) ?? 0)).toBeCloseTo(x, 12);
  });

  it('overflows nowhere over 150 years', () => {
    expect(annualReturn(days([0, -1e12], [54_750, 1]))).toBeCloseTo(Math.expm1((365 / 54_750) * Math.log(1e-12)), 9);
    expect(annualReturn(days([0, 1e12], [20_000, -1], [54_750, 1e12]))).toBeNull();
  });

  it('reaches both ends of its range and not beyond', () => {
    expect(annualReturn(days([0, -1], [365, 1_000_001]))).toBeCloseTo(1_000_000, 3);
    expect(annualReturn(days([0, -1], [365, 1_000_002]))).toBeNull();
    expect(annualReturn(days([0, -10_000], [365, 1]))).toBeCloseTo(-0.9999, 12);
    expect(annualReturn(days([0, -10_001], [365, 1]))).toBeNull();
  });

  it('pools 120,000 flows in milliseconds', () => {
    // 2,000 flips of 60 entries over eleven years; the budget is far above the few milliseconds it takes.
    const flows = Array.from({ length: 2000 }, (_, i) => {
      const entries = Array.from({ length: 58 }, (_, j): [number, number] => [2 * i + j, -4000 - ((i * j) % 900)]);
      return [...entries, [2 * i, -500_000], [2 * i + 90 + (i % 40), 900_000]] as [number, number][];
    });
    const net = days(...flows.flat());
    const start = performance.now();
    expect(annualReturn(net)).not.toBeNull();
    expect(performance.now() - start).toBeLessThan(250);
  });
});

describe('the shop', () => {
  it('counts whom it left out', () => {
    const facts = [
      buildRebuild({ id: 'a' }),
      buildRebuild({ id: 'b' }, [buildLine({ on: null })]),
      buildRebuild({ id: 'c', purchaseCents: null }),
      buildRebuild({ id: 'd', boughtOn: null }),
      buildRebuild({ id: 'e', exit: null }),
    ];
    expect(facts.map(hasFlows)).toEqual([true, false, false, false, false]);
    expect(annualReturns(facts, days([0, -100], [365, 110]))).toMatchObject({
      n: 1,
      undatedCount: 1,
      noPurchaseCount: 2,
    });
    expect(annualReturns(facts, days([0, -100], [365, 110])).pooled).toBeCloseTo(0.1, 12);
  });

  it('has none over nothing', () => {
    expect(annualReturns([], new Map())).toEqual({
      pooled: null,
      n: 0,
      median: null,
      undatedCount: 0,
      noPurchaseCount: 0,
    });
  });
});
