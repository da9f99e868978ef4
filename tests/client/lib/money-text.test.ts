import { expect, test } from 'vitest';
import { centsTextSchema, centsToText, optionalCentsTextSchema } from '../../../src/lib/money-text.ts';

test('typed amounts become cents, by the shop’s own mark', () => {
  expect(centsTextSchema('.').parse('$1,250.5')).toBe(125_050);
  expect(centsTextSchema(',').parse('1.250,5')).toBe(125_050);
});

test('what cannot be read says so with the text', () => {
  const result = centsTextSchema('.').safeParse('12,50,0');
  expect(result.error?.issues[0]?.message).toBe('“12,50,0” cannot be read as an amount.');
  const optional = optionalCentsTextSchema('.').safeParse('plenty');
  expect(optional.error?.issues[0]?.message).toBe('“plenty” cannot be read as an amount.');
});

test('an empty optional amount is nothing, not zero', () => {
  expect(optionalCentsTextSchema('.').parse('  ')).toBeNull();
  expect(optionalCentsTextSchema('.').parse('0')).toBe(0);
});

test('cents go back to text that reads as the same cents', () => {
  expect(centsToText(125_050, ',')).toBe('1250,50');
  expect(centsToText(null, '.')).toBe('');
});
