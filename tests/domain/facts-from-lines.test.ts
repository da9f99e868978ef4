import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Line } from '../../server/domain/facts-from-lines.ts';
import { buildLine, buildRebuild, sale } from '../support/facts.ts';

describe('a rebuild summed from its entries', () => {
  // By hand from definitions §18.1.
  const lines = [
    buildLine({ cents: 100_000 }),
    buildLine({ cents: 30_000, isForeseen: false }),
    buildLine({ cents: -5000, isForeseen: false }),
    buildLine({ cents: 20_000, isForeseen: false, isExtra: true }),
    buildLine({ category: 'paint', cents: 0, freeCents: 7000, isForeseen: false }),
    buildLine({ category: 'paint', cents: 0, freeCents: 9000, isExtra: true }),
    buildLine({ category: 'paid labor', cents: 40_000 }),
    buildLine({ category: 'paid labor', cents: 1000, isExtra: true, on: '2025-04-02' }),
    buildLine({ category: 'tax', cents: 0, on: '2025-05-01' }),
    buildLine({ category: 'tax', cents: -300, on: '2025-05-02' }),
    buildLine({ category: 'tax', cents: 400, on: '2025-04-01' }),
  ];
  const facts = buildRebuild({}, lines);

  it('keeps the sums of each category', () => {
    expect(facts.categories.get('parts')).toEqual({
      paidCents: 145_000,
      planningCents: 125_000,
      unforeseenCents: 25_000,
      surpriseCount: 1,
      extraCents: 20_000,
      freeCents: 0,
      entryCount: 4,
    });
    expect(facts.categories.get('paint')).toEqual({
      paidCents: 0,
      planningCents: 7000,
      unforeseenCents: 0,
      surpriseCount: 0,
      extraCents: 0,
      freeCents: 16_000,
      entryCount: 2,
    });
  });

  it('has two actuals: paid and planning', () => {
    expect(facts.paidCents).toBe(186_100);
    expect(facts.planningCents).toBe(172_100);
    expect(facts.estimateCents).toBe(250_000);
  });

  it('counts paid labor with extras, surprises at planning value and never below 0', () => {
    expect(facts.paidLaborCents).toBe(41_000);
    expect(facts.surprisePlanningCents).toBe(37_000);
  });

  it('calls late what is dated after the exit and not 0', () => {
    expect([facts.lateCount, facts.lateCents]).toEqual([2, 700]);
  });

  it('has a return; it has none with an undated entry, an unknown purchase or while it is held', () => {
    expect(facts.xirr).not.toBeNull();
    const undated = buildRebuild({}, [buildLine({ on: null })]);
    expect([undated.hasUndated, undated.xirr, undated.lateCount]).toEqual([true, null, 0]);
    expect(buildRebuild({ purchaseCents: null }, lines).xirr).toBeNull();
    expect(buildRebuild({ boughtOn: null }, lines).xirr).toBeNull();
    expect(buildRebuild({ exit: null }, lines).xirr).toBeNull();
  });

  it('is untold with one entry whose foreseen nobody said, and not with no entry at all', () => {
    expect(
      buildRebuild({}, [...lines, buildLine({ cents: 0, isExtra: true, isForeseen: null })]).hasUnknownForeseen,
    ).toBe(true);
    expect(facts.hasUnknownForeseen).toBe(false);
    expect(buildRebuild().hasUnknownForeseen).toBe(false);
  });

  it('100 that became 110 in 365 days returned ten percent', () => {
    const year = { boughtOn: '2025-01-01', exit: sale('2026-01-01', 110_000), purchaseCents: 100_000 };
    expect(buildRebuild(year).xirr).toBeCloseTo(0.1, 10);
  });
});

const line: fc.Arbitrary<Line> = fc.record({
  on: fc.constantFrom('2025-01-05', '2025-02-01', '2025-06-01', null),
  category: fc.constantFrom('parts', 'paint', 'tax'),
  cents: fc.integer({ min: -1e6, max: 1e6 }),
  isForeseen: fc.constantFrom(true, false, null),
  isExtra: fc.boolean(),
  freeCents: fc.constant(null),
});

it('order and splitting of entries change no sum', () => {
  fc.assert(
    fc.property(fc.array(line, { maxLength: 20 }), (lines) => {
      const one = buildRebuild({}, lines);
      const turned = buildRebuild({}, lines.toReversed());
      expect(turned).toEqual({ ...one, xirr: turned.xirr });
      const paid = lines.reduce((total, { cents }) => total + cents, 0);
      const chosen = lines.reduce((total, { cents, isExtra }) => total + (isExtra ? cents : 0), 0);
      expect(one.paidCents).toBe(paid);
      expect(one.planningCents).toBe(paid - chosen);
    }),
  );
});
