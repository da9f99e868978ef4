import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ceilProduct, compareFractions } from '#shared/exact.ts';

const amount = fc.integer({ min: -1e12, max: 1e12 });
const divisor = fc.integer({ min: 1, max: 1e12 });

describe('ceilProduct', () => {
  it.each([
    [7, 1, 2, 4],
    [8, 1, 2, 4],
    [-7, 1, 2, -3],
    [0, 5, 3, 0],
    // Doubles say 505,823 here (public check "reserve-exact").
    [505_822, 213_016, 213_016, 505_822],
  ])('%d × %d ÷ %d, raised, is %d', (a, b, c, expected) => expect(ceilProduct(a, b, c)).toBe(expected));

  it('is the smallest whole number not below a·b/c', () => {
    fc.assert(
      fc.property(amount, fc.nat({ max: 1e12 }), divisor, (a, b, c) => {
        const got = BigInt(ceilProduct(a, b % c, c));
        const product = BigInt(a) * BigInt(b % c);
        expect(got * BigInt(c) >= product && (got - 1n) * BigInt(c) < product).toBe(true);
      }),
    );
  });
});

describe('compareFractions', () => {
  it('tells apart what a double cannot', () => {
    const [a, b, c, d] = [999_999_999_998, 999_999_999_999, 999_999_999_997, 999_999_999_998] as const;
    expect(a / b).toBe(c / d);
    expect(compareFractions(a, b, c, d)).toBeGreaterThan(0);
    expect(compareFractions(c, d, a, b)).toBeLessThan(0);
  });

  it('has the sign of the exact difference', () => {
    fc.assert(
      fc.property(amount, divisor, amount, divisor, (a, b, c, d) => {
        const cross = BigInt(a) * BigInt(d) - BigInt(c) * BigInt(b);
        expect(Math.sign(compareFractions(a, b, c, d))).toBe(cross > 0n ? 1 : cross < 0n ? -1 : 0);
      }),
    );
  });
});
