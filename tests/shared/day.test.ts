import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addDays, dayFromNumber, dayFromParts, dayInZone, dayNumber, daysBetween, isDay } from '#shared/day.ts';

const anyDay = fc.integer({ min: -7305, max: 47_846 }).map(dayFromNumber);

describe('days', () => {
  it.each(['1950-01-01', '2024-02-29', '2000-02-29', '2100-12-31'])('%s is a day', (text) =>
    expect(isDay(text)).toBe(true),
  );

  it.each([
    '2023-02-29',
    '2100-02-29',
    '2024-04-31',
    '2024-13-01',
    '2024-00-10',
    '2024-01-00',
    '1949-12-31',
    '2101-01-01',
    '2024-1-1',
    '24-01-01',
    '2024-01-01T00:00',
    '',
  ])('%j is none', (text) => expect(isDay(text)).toBe(false));

  it.each([
    ['1970-01-01', 0],
    ['2000-03-01', 11_017],
    ['1969-12-31', -1],
  ])('%s is day number %d', (day, number) => {
    expect(dayNumber(day)).toBe(number);
    expect(dayFromNumber(number)).toBe(day);
  });

  it('counts leap days and no summer time', () => {
    expect(daysBetween('2024-01-01', '2025-01-01')).toBe(366);
    expect(daysBetween('2025-03-29', '2025-03-31')).toBe(2);
    expect(daysBetween('2025-01-02', '2025-01-01')).toBe(-1);
    expect(addDays('2024-02-28', 1)).toBe('2024-02-29');
  });

  it('goes to a number and back, and adds what was subtracted', () => {
    fc.assert(
      fc.property(anyDay, anyDay, (from, to) => {
        expect(dayFromNumber(dayNumber(from))).toBe(from);
        expect(addDays(from, daysBetween(from, to))).toBe(to);
        expect(isDay(from)).toBe(true);
        // Text order is time order.
        expect(from < to).toBe(dayNumber(from) < dayNumber(to));
      }),
    );
  });

  it('makes a day of its parts, or says that there is none', () => {
    expect(dayFromParts(2024, 2, 29)).toBe('2024-02-29');
    expect(dayFromParts(2023, 2, 29)).toBeNull();
    expect(dayFromParts(24, 1, 1)).toBeNull();
    expect(dayFromParts(10_000, 1, 1)).toBeNull();
    expect(dayFromParts(2024, 1.5, 1)).toBeNull();
    expect(dayFromParts(Number.NaN, 1, 1)).toBeNull();
  });

  it('knows which day it is elsewhere', () => {
    const moment = new Date('2025-03-01T03:30:00Z');
    expect(dayInZone(moment, 'America/New_York')).toBe('2025-02-28');
    expect(dayInZone(moment, 'Europe/Berlin')).toBe('2025-03-01');
    expect(dayInZone(new Date('2024-12-31T23:30:00Z'), 'Europe/Berlin')).toBe('2025-01-01');
  });
});
