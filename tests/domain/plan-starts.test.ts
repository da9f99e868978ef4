import { describe, expect, it } from 'vitest';
import { hoursBias, planStart } from '../../server/domain/plan-starts.ts';
import { buildLine, buildRebuild } from '../support/facts.ts';

/** A finished rebuild by planned and actual parts and paint, in dollars; hours planned, own, paid. */
function past(id: string, parts: [number, number], paint: [number, number], hours: (number | null)[] = []) {
  const [plannedHours = null, own = null, paid = null] = hours;
  const seconds = (value: number | null) => (value === null ? null : value * 3600);
  const frame = { id, ownSeconds: seconds(own), paidSeconds: seconds(paid) };
  const estimates = new Map([
    ['parts', parts[0] * 100],
    ['paint', paint[0] * 100],
  ]);
  const lines = [buildLine({ cents: parts[1] * 100 }), buildLine({ category: 'paint', cents: paint[1] * 100 })];
  return { ...buildRebuild({ ...frame, estimates }, lines), plannedSeconds: seconds(plannedHours) };
}

// Worked out by hand.
describe('where a plan may start', () => {
  const set = [
    past('a', [900, 1000], [300, 300], [40, 50, 10]),
    past('b', [1000, 1300], [0, 250], [60, 80, 0]),
    past('c', [1400, 1300], [500, 700], [50, null, 0]),
  ];

  it('is the middle of what was planned and of what it came to, over those that planned for it', () => {
    const { n, categories, hours } = planStart(set);
    expect(n).toBe(3);
    expect(categories.get('parts')).toEqual({ n: 3, planCents: 100_000, actualCents: 130_000 });
    expect(categories.get('paint')).toEqual({ n: 2, planCents: 40_000, actualCents: 50_000 });
    expect(hours).toEqual({ n: 2, plannedSeconds: 180_000, actualSeconds: 252_000, ownSeconds: 234_000 });
  });

  it('says nothing of nothing', () => {
    const { n, categories, hours } = planStart([]);
    expect([n, categories.size]).toEqual([0, 0]);
    expect(hours).toEqual({ n: 0, plannedSeconds: null, actualSeconds: null, ownSeconds: null });
  });

  it('sums the hours planned and worked where all are known', () => {
    expect(hoursBias(set)).toEqual({ n: 2, plannedSeconds: 360_000, actualSeconds: 504_000 });
    expect(hoursBias(set.map((one) => ({ ...one, exit: null })))).toMatchObject({ n: 0 });
    expect(hoursBias([])).toEqual({ n: 0, plannedSeconds: 0, actualSeconds: 0 });
  });
});
