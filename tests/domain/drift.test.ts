import { describe, expect, it } from 'vitest';
import { addDays } from '#shared/day.ts';
import { drift } from '../../server/domain/drift.ts';
import type { PlannedOutcome } from '../../server/domain/sets.ts';

const LEVEL = { p: 4, q: 5 };
const AS_OF = '2026-12-15';

/** One rebuild per overrun, in percent of its plan, a day apart from `firstOn` on. */
function outcomes(firstOn: string, percents: readonly number[]): PlannedOutcome[] {
  return percents.map((percent, i) => {
    const exitOn = addDays(firstOn, i);
    const overrunCents = percent * 1_000;
    return { id: exitOn, exitOn, boughtOn: null, estimateCents: 100_000, overrunCents, surpriseCents: 0 };
  });
}
const upTo = (count: number) => Array.from({ length: count }, (_, i) => i + 1);
/** Thirty rebuilds that were 1, 2 … 30 % over: at 4 of 5 the 25th is taken, 25 %. */
const BEFORE = outcomes('2023-01-01', upTo(30));
const looked = (recent: readonly number[]) => drift([...BEFORE, ...outcomes('2026-01-01', recent)], LEVEL, AS_OF);

describe('drift', () => {
  // By hand: of 12 new ones 12·25/31 are to be expected within; 3 or fewer happen 6 times in 10,000.
  it('holds the recent ones against the figure of the years before', () => {
    const found = looked([...Array.from({ length: 9 }, () => 40), 5, 6, 7]);
    expect(found).toMatchObject({ after: '2024-12-15', withinCount: 3, verdict: 'costs more' });
    expect(found.expectedCount).toBeCloseTo(9.677, 3);
    expect(found.chanceOfFew).toBeCloseTo(0.0006, 4);
    expect([found.before.uplift, found.recent.uplift, found.all.uplift]).toEqual([0.25, 0.4, 0.4]);
    expect([found.before.n, found.recent.n, found.all.n]).toEqual([30, 12, 42]);
  });

  it('agrees with as many within as are to be expected', () => {
    expect(looked([...upTo(10), 40, 40])).toMatchObject({ withinCount: 10, verdict: 'agrees' });
    expect(looked(upTo(12))).toMatchObject({ withinCount: 12, verdict: 'agrees' });
  });

  it('says that work costs less when all of many stay below', () => {
    expect(looked(upTo(24))).toMatchObject({ withinCount: 24, verdict: 'costs less' });
  });

  it('counts ties against a warning', () => {
    expect(looked(Array.from({ length: 24 }, () => 25))).toMatchObject({ withinCount: 24, verdict: 'agrees' });
  });

  it('says too few yet rather than that all is well', () => {
    expect(looked([])).toMatchObject({ withinCount: 0, verdict: null });
    // The chance of one above is 6/31, of two 6·7/(31·32): neither would say anything; of three 6·7·8/(31·32·33) = 1 %.
    expect(looked([40])).toMatchObject({ verdict: null });
    expect(looked([40, 40])).toMatchObject({ verdict: null });
    expect(looked([40, 40, 40])).toMatchObject({ withinCount: 0, verdict: 'costs more' });
    const few = drift([...BEFORE.slice(0, 3), ...outcomes('2026-01-01', upTo(9))], LEVEL, AS_OF);
    expect(few).toMatchObject({ withinCount: null, expectedCount: null, chanceOfFew: null, verdict: null });
    expect(few.recent.uplift).toBe(0.08);
  });

  it('begins the day after the same day two years ago', () => {
    const around = outcomes('2024-12-15', [1, 1]);
    expect(drift(around, LEVEL, AS_OF).recent.n).toBe(1);
    expect(drift([], LEVEL, '2024-02-29').after).toBe('2022-02-28');
    expect(drift([], LEVEL, '2026-03-01').after).toBe('2024-03-01');
  });
});
