import { expect, test } from 'vitest';
import { parsePercent, percentToText } from '../../../src/features/bids/percent-text.ts';

test.each([
  ['6.5', { p: 13, q: 200 }],
  ['6.5 %', { p: 13, q: 200 }],
  ['7', { p: 7, q: 100 }],
  ['.5', { p: 1, q: 200 }],
  ['0', { p: 0, q: 1 }],
  ['', { p: 0, q: 1 }],
  ['six', null],
  ['-1', null],
  ['1.23456', null],
])('%s is read as a fraction in lowest terms', (text, fraction) => {
  expect(parsePercent(text, '.')).toEqual(fraction);
});

test('a fraction comes back as it was typed, in the shop’s decimal mark', () => {
  expect(percentToText({ p: 13, q: 200 }, ',')).toBe('6,5');
  expect(parsePercent('6,5', ',')).toEqual({ p: 13, q: 200 });
  expect(percentToText({ p: 0, q: 1 }, '.')).toBe('');
});
