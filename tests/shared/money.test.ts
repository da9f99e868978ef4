import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { divideRounded, MAX_CENTS, parseCents, splitCents } from '#shared/money.ts';
import { publicCheck } from '../support/public-check.ts';

describe('parseCents', () => {
  it.each([
    ['1,250', 125_000],
    ['1250.5', 125_050],
    ['1250.', 125_000],
    ['.5', 50],
    ['0', 0],
    ['-0', 0],
    ['$1 250.50', 125_050],
    ['1\u00a0250\u202f000', 125_000_000],
    ['1’250.00', 125_000],
    ["1'250", 125_000],
    ['(45.00)', -4500],
    ['($45.00)', -4500],
    ['45-', -4500],
    ['-3', -300],
    ['\u22123', -300],
    ['-$3', -300],
    ['$-3', -300],
    ['+3', 300],
    ['12 €', 1200],
    ['1,234,567.89', 123_456_789],
    ['\uff11\uff12', 1200],
  ])('reads %s', (text, cents) => expect(parseCents(text)).toBe(cents));

  it.each([
    ['1.250,50', 125_050],
    ['1 250,5', 125_050],
    ['1.250', 125_000],
    ['1250', 125_000],
  ])('reads %s where the comma is the decimal mark', (text, cents) => expect(parseCents(text, ',')).toBe(cents));

  it.each([
    '',
    ' ',
    '.',
    '-',
    '()',
    '1.234',
    '1,25',
    '12 50',
    '12,34,567',
    '1..2',
    '1.2.3',
    '--5',
    '-5-',
    '-(5)',
    '(-5)',
    '1e5',
    '5%',
    'abc',
    '½',
  ])('does not read %j', (text) => expect(parseCents(text)).toBeNull());

  it('takes ten billion dollars and no more', () => {
    expect(parseCents('10000000000')).toBe(MAX_CENTS);
    expect(parseCents('-10000000000')).toBe(-MAX_CENTS);
    expect(parseCents('10000000000.01')).toBeNull();
  });

  it('reads every amount written with two decimals, with either mark', () => {
    fc.assert(
      fc.property(fc.integer({ min: -MAX_CENTS, max: MAX_CENTS }), (cents) => {
        const digits = String(Math.abs(cents)).padStart(3, '0');
        const sign = cents < 0 ? '-' : '';
        expect(parseCents(`${sign}${digits.slice(0, -2)}.${digits.slice(-2)}`)).toBe(cents + 0);
        expect(parseCents(`${sign}${digits.slice(0, -2)},${digits.slice(-2)}`, ',')).toBe(cents + 0);
      }),
    );
  });
});

describe('divideRounded', () => {
  // Source: rounding table of definitions §12 (public check "rounding-table"), here straight from the file.
  it('rounds half away from zero', () => {
    type Table = { half_up_away_from_zero: number[] };
    const { input, expected } = publicCheck<{ values: number[] }, Table>('rounding-table');
    const tenths = input.values.map((value) => BigInt(Math.round(value * 10)));
    expect(tenths.map((value) => Number(divideRounded(value, 10n)))).toEqual(expected.half_up_away_from_zero);
    expect(tenths.map((value) => Number(divideRounded(-value, -10n)))).toEqual(expected.half_up_away_from_zero);
  });

  it('is never more than a half away, and turns with the sign', () => {
    fc.assert(
      fc.property(
        fc.bigInt({ min: -(10n ** 30n), max: 10n ** 30n }),
        fc.bigInt({ min: 1n, max: 10n ** 15n }),
        (a, b) => {
          const rest = 2n * (a - divideRounded(a, b) * b);
          expect((rest < 0n ? -rest : rest) <= b).toBe(true);
          expect(divideRounded(-a, b)).toBe(-divideRounded(a, b));
        },
      ),
    );
  });

  it('refuses to divide by zero', () => expect(() => divideRounded(1n, 0n)).toThrow(RangeError));
});

describe('splitCents', () => {
  const weights = fc.array(fc.nat({ max: 1e12 }), { minLength: 1, maxLength: 12 });
  const total = fc.integer({ min: -MAX_CENTS, max: MAX_CENTS });

  it('adds up to the total, each part within a cent of its share', () => {
    fc.assert(
      fc.property(total, weights, (cents, shares) => {
        const parts = splitCents(cents, shares);
        const whole = shares.reduce((a, b) => a + b, 0);
        expect(parts.reduce((a, b) => a + b, 0)).toBe(cents + 0);
        for (const [i, part] of parts.entries()) {
          const exact = whole === 0 ? cents / shares.length : (cents / whole) * (shares[i] ?? 0);
          expect(Math.abs(part - exact)).toBeLessThanOrEqual(1.01);
        }
      }),
    );
  });

  it('gives the heavier item no less, and of two equal ones the earlier no less', () => {
    fc.assert(
      fc.property(fc.nat({ max: MAX_CENTS }), weights, (cents, shares) => {
        const parts = splitCents(cents, shares);
        for (let i = 1; i < shares.length; i += 1) {
          const [before, after] = [shares[i - 1] ?? 0, shares[i] ?? 0];
          const [earlier, later] = [parts[i - 1] ?? 0, parts[i] ?? 0];
          expect(before >= after ? earlier >= later : earlier <= later).toBe(true);
        }
      }),
    );
  });

  it('splits a negative total as the positive one, turned', () => {
    fc.assert(
      fc.property(total, weights, (cents, shares) => {
        expect(splitCents(-cents, shares)).toEqual(splitCents(cents, shares).map((part) => (part === 0 ? 0 : -part)));
      }),
    );
  });

  it('refuses to split over nothing', () => expect(() => splitCents(100, [])).toThrow(RangeError));
});
