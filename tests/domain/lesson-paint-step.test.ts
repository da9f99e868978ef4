import { describe, expect, it } from 'vitest';
import type { Day } from '#shared/day.ts';
import { demoBook } from '../../seeds/demo/generate.ts';
import { drift } from '../../server/domain/drift.ts';
import type { PlannedOutcome } from '../../server/domain/sets.ts';

const LEVEL = { p: 4, q: 5 };
const PAINT = 'outside labor (sublet)';

/** Planned and actual paint of the demo's vehicles, in order of leaving; what left after the day of looking is not known. */
function paintUpTo(asOf: Day): PlannedOutcome[] {
  const outcomes = demoBook().vehicles.flatMap(({ tag, dates, exit, baseline, entries }): PlannedOutcome[] => {
    const exitOn = dates.soldOn ?? exit?.on ?? null;
    const estimateCents = baseline?.lines.get(PAINT) ?? 0;
    if (exitOn === null || exitOn > asOf || estimateCents <= 0) return [];
    const paint = entries.filter(({ category, isExtra }) => category === PAINT && !isExtra);
    const overrunCents = paint.reduce((total, { cents }) => total + cents, 0) - estimateCents;
    return [{ id: tag, exitOn, boughtOn: dates.boughtOn, estimateCents, overrunCents, surpriseCents: 0 }];
  });
  return outcomes.sort((a, b) => (a.exitOn < b.exitOn ? -1 : 1));
}

// L5 of the demo: from 2024 on the paint shop charges more, and the plans follow only a year later. A rule from all years
// is stale then, and the last 24 months beside the years before say so.
describe('the paint shop that became dearer in 2024', () => {
  const verdictOn = (day: Day) => drift(paintUpTo(day), LEVEL, day).verdict;

  it('is noticed in the autumn of 2025, when a rule from all years still asks for too little', () => {
    const found = drift(paintUpTo('2025-09-30'), LEVEL, '2025-09-30');
    expect(found.verdict).toBe('costs more');
    expect(found.all.uplift ?? 0).toBeLessThan(found.recent.uplift ?? 0);
  });

  it('was not there before, and no longer stands out once the plans have followed', () => {
    expect([verdictOn('2023-12-31'), verdictOn('2026-06-30')]).not.toContain('costs more');
  });
});
