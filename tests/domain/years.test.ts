import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dayFromNumber } from '#shared/day.ts';
import { shopYearOf, shopYears, yearSpan, yearSpans } from '../../server/domain/years.ts';
import { buildLine, buildRebuild, sale } from '../support/facts.ts';

describe('the shop year', () => {
  it.each([
    ['2025-06-30', 7, 2024],
    ['2025-07-01', 7, 2025],
    ['2025-01-01', 1, 2025],
    ['2025-12-31', 12, 2025],
  ])('%s falls, with start month %d, in %d', (day, month, year) => expect(shopYearOf(day, month)).toBe(year));

  it('holds each day exactly once, leap years too', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 40_000 }).map(dayFromNumber),
        fc.integer({ min: 1, max: 12 }),
        (day, month) => {
          const { from, to } = yearSpan(shopYearOf(day, month), month);
          expect(from <= day && day <= to).toBe(true);
        },
      ),
    );
    expect(yearSpan(2023, 3)).toEqual({ from: '2023-03-01', to: '2024-02-29' });
  });
});

describe('what each year left', () => {
  // By hand: the first left in 2023/24 with a late bill in the next year; nothing left in 2024/25.
  const facts = [
    buildRebuild({ id: 'a', boughtOn: '2023-02-01', exit: sale('2023-09-01', 1_000_000) }, [
      buildLine({ cents: 100_000, on: '2023-08-01' }),
      buildLine({ cents: 20_000, on: '2024-08-01' }),
      buildLine({ cents: 3000, on: null }),
    ]),
    buildRebuild({ id: 'b', boughtOn: '2025-07-01', exit: { kind: 'scrapped', on: '2025-08-01', proceedsCents: 0 } }),
    buildRebuild({ id: 'c', boughtOn: '2025-07-01', exit: sale('2025-08-02', 1), purchaseCents: null }),
    buildRebuild({ id: 'd', boughtOn: '2025-07-01', exit: null }),
  ];
  const overhead = [
    { on: '2023-07-01', cents: 40_000 },
    { on: '2024-06-30', cents: 5000 },
    { on: '2024-07-01', cents: 6000 },
  ];
  const input = { facts, overhead, asOf: '2025-10-15', startMonth: 7 };
  const tiedUp = [
    { on: '2023-06-30', rebuildCount: 1, cents: 500_000 },
    { on: '2025-10-15', rebuildCount: 1, cents: 7 },
  ];

  it('lists years without a gap, the last up to the as-of day', () => {
    expect(yearSpans(input)).toEqual([
      { year: 2022, from: '2022-07-01', to: '2023-06-30', tiedUpOn: '2023-06-30' },
      { year: 2023, from: '2023-07-01', to: '2024-06-30', tiedUpOn: '2024-06-30' },
      { year: 2024, from: '2024-07-01', to: '2025-06-30', tiedUpOn: '2025-06-30' },
      { year: 2025, from: '2025-07-01', to: '2026-06-30', tiedUpOn: '2025-10-15' },
    ]);
  });

  it('counts whole profits in the year of the exit, overhead on its day', () => {
    const years = shopYears(input, tiedUp);
    expect(
      years.map((year) => [year.exitCount, year.soldCount, year.profitCents, year.overheadCents, year.keptCents]),
    ).toEqual([
      [0, 0, 0, 0, 0],
      [1, 1, 377_000, 45_000, 332_000],
      [0, 0, 0, 6000, -6000],
      [2, 1, -500_000, 0, -500_000],
    ]);
    expect(years.map((year) => [year.lateCount, year.lateCents, year.noPurchaseCount])).toEqual([
      [0, 0, 0],
      [1, 20_000, 0],
      [0, 0, 0],
      [0, 0, 1],
    ]);
  });

  it('takes over what was tied up, where it was fed in', () => {
    expect(shopYears(input, tiedUp).map((year) => year.tiedUp)).toEqual([tiedUp[0], null, null, tiedUp[1]]);
  });

  it('of an empty shop is the one year of the as-of day', () => {
    const years = shopYears({ facts: [], overhead: [], asOf: '2025-03-01', startMonth: 1 }, []);
    expect(years).toMatchObject([
      { year: 2025, to: '2025-12-31', tiedUpOn: '2025-03-01', exitCount: 0, keptCents: 0, tiedUp: null },
    ]);
  });
});
