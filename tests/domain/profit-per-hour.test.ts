import { describe, expect, it } from 'vitest';
import { profitPerHour } from '../../server/domain/profit-per-hour.ts';
import { buildLine, buildRebuild, sale } from '../support/facts.ts';

const HOUR = 3600;

/** A rebuild that left `kept` cents after `own` unpaid and `paid` paid hours that cost `wages`. */
function left(kept: number, own: number | null, paid: number | null, wages = 0) {
  const frame = {
    exit: sale('2025-04-01', 500_000 + kept + wages),
    ownSeconds: own && own * HOUR,
    paidSeconds: paid && paid * HOUR,
  };
  return buildRebuild(frame, wages === 0 ? [] : [buildLine({ category: 'paid labor', cents: wages })]);
}

describe('profit per hour', () => {
  // By hand: 300,000 over 100 h and 100,000 over 25 h.
  const facts = [left(300_000, 100, 0), left(100_000, 25, null, 50_000), left(900_000, null, 10), left(5, 0, 0)];

  it('per own hour: only rebuilds whose hours are known and above 0', () => {
    expect(profitPerHour(facts, null).own).toEqual({ n: 2, missingCount: 2, pooledCents: 3200, medianCents: 3500 });
  });

  it('per hour of anybody: wages given back, both kinds of hours known', () => {
    const both = [left(300_000, 100, 20, 40_000), left(60_000, 0, 5, 10_000), left(1, 5, null)];
    expect(profitPerHour(both, null).all).toEqual({
      n: 2,
      missingCount: 1,
      paidLaborCents: 50_000,
      pooledCents: 410_000 / 125,
    });
  });

  it('after the wanted wage: what remains, and per rebuild', () => {
    expect(profitPerHour(facts, 2500).afterWage).toEqual({
      n: 2,
      missingCount: 2,
      wantedCentsPerHour: 2500,
      leftCents: 400_000 - 125 * 2500,
      leftPerRebuildCents: (400_000 - 125 * 2500) / 2,
    });
  });

  it('keeps the seconds: a third of an hour is no rounded third', () => {
    const third = buildRebuild({ exit: sale('2025-04-01', 500_001), ownSeconds: 1200 });
    expect(profitPerHour([third], 100)).toMatchObject({
      own: { pooledCents: 3 },
      afterWage: { leftCents: (3600 - 120_000) / 3600 },
    });
  });

  it('is nothing without hours, and nothing is left without a wage', () => {
    const none = profitPerHour([left(1, null, null)], 2500);
    expect(none.own).toEqual({ n: 0, missingCount: 1, pooledCents: null, medianCents: null });
    expect(none.all).toMatchObject({ n: 0, pooledCents: null });
    expect(none.afterWage).toMatchObject({ n: 0, leftCents: null, leftPerRebuildCents: null });
    expect(profitPerHour(facts, null).afterWage).toMatchObject({ n: 2, leftCents: null, leftPerRebuildCents: null });
  });

  it('leaves out what has no known purchase', () => {
    expect(profitPerHour([buildRebuild({ purchaseCents: null })], null).own).toMatchObject({ n: 0, missingCount: 1 });
  });
});
