import { describe, expect, it } from 'vitest';
import { hoursToText, parseHours } from '../../../src/lib/hours-text.ts';

describe('hours as people type them', () => {
  it.each([
    ['3', 10_800],
    ['3.5', 12_600],
    ['3,5', 12_600],
    ['.25', 900],
    ['3:30', 12_600],
    ['0:45', 2700],
    ['2h', 7200],
    ['2h 30', 9000],
    ['2 h 5 min', 7500],
    ['45m', 2700],
    ['45 min', 2700],
  ])('reads %s', (text, seconds) => expect(parseHours(text)).toBe(seconds));

  it.each(['', 'a day', '3:75', '-2', '1:2:3', '3.5.1'])('does not guess at “%s”', (text) => {
    expect(parseHours(text)).toBeNull();
  });

  it('come back as they were, to the hundredth', () => {
    expect(hoursToText(12_600)).toBe('3.5');
    expect(hoursToText(null)).toBe('');
  });
});
