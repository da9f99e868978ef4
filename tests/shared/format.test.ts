import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  formatAxisMoney,
  formatCount,
  formatHours,
  formatMoney,
  formatPercent,
  formatPerHour,
  formatSigned,
} from '#shared/format.ts';
import { formatDay, formatDayRange, formatDayShort } from '#shared/format-day.ts';
import { countInWords } from '#shared/formatter.ts';
import { parseCents } from '#shared/money.ts';

const us = { currency: 'USD', locale: 'en-US' };
const german = { currency: 'EUR', locale: 'de-DE' };

describe('money', () => {
  test.each([
    [1_842_000, '$18,420'],
    [1_842_049, '$18,420'],
    [1_842_050, '$18,421'],
    [2_160, '$21.60'],
    [900, '$9'],
    [-688, '−$6.88'],
    [0, '$0'],
  ])('%d cents reads %s', (cents, text) => {
    expect(formatMoney(cents, us)).toBe(text);
  });

  test('both decimals stand where sums must add up to the eye', () => {
    expect(formatMoney(1_842_000, { ...us, cents: 'always' })).toBe('$18,420.00');
  });

  test('an amount that rounds to nothing carries no minus', () => {
    expect(formatMoney(-40, { ...us, cents: 'never' })).toBe('$0');
  });

  test('a difference carries its sign, zero none', () => {
    expect([41_000, -125_000, 0].map((cents) => formatSigned(cents, us))).toEqual(['+$410', '−$1,250', '$0']);
  });

  test('another locale places its own marks', () => {
    expect(formatMoney(-125_050, { ...german, cents: 'always' })).toBe('−1.250,50\u00a0€');
  });

  test('axis figures are short', () => {
    expect([2_000_000, -50_000, 0, 120_000_000].map((cents) => formatAxisMoney(cents, us))).toEqual([
      '$20k',
      '−$500',
      '$0',
      '$1.2M',
    ]);
    expect(formatAxisMoney(2_000_000, german)).toBe('20k\u00a0€');
  });

  test('what is shown with cents reads back as the same cents', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e11, max: 1e11 }), (cents) => {
        expect(parseCents(formatMoney(cents, { ...us, cents: 'always' }))).toBe(cents === 0 ? 0 : cents);
      }),
    );
  });
});

test('pay by the hour', () => {
  expect(formatPerHour(2_160, us)).toBe('$21.60/h');
});

test('percentages', () => {
  expect(formatPercent(0.224, us)).toBe('22%');
  expect(formatPercent(0.224, { ...us, signed: true })).toBe('+22%');
  expect(formatPercent(-0.031, { ...us, signed: true, digits: 1 })).toBe('−3.1%');
  expect(formatPercent(-0.001, { ...us, signed: true })).toBe('0%');
});

test('hours lose decimals as they grow, unless asked to be exact', () => {
  expect([29_700, 138_600, 3_071_000].map((s) => formatHours(s, us))).toEqual(['8.25', '38.5', '853']);
  expect(formatHours(3_070_800 + 900, { ...us, exact: true })).toBe('853.25');
});

test('counts agree with their noun', () => {
  expect([0, 1, 1204].map((n) => formatCount(n, 'rebuild'))).toEqual(['0 rebuilds', '1 rebuild', '1,204 rebuilds']);
  expect(formatCount(2, 'entry', 'entries')).toBe('2 entries');
});

test('counts in a sentence are words up to twelve', () => {
  expect(countInWords(9, { locale: 'en-US', capital: true })).toBe('Nine');
  expect(countInWords(13, { locale: 'en-US' })).toBe('13');
});

test('days never leave day and month to guess', () => {
  expect(formatDay('2026-11-14')).toBe('14 Nov 2026');
  expect(formatDayShort('2026-09-03')).toBe('3 Sep');
  expect(formatDayRange('2026-01-01', '2026-11-30')).toBe('1 Jan – 30 Nov 2026');
  expect(formatDayRange('2025-12-01', '2026-11-30')).toBe('1 Dec 2025 – 30 Nov 2026');
});
