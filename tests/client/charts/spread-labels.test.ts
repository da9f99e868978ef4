import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { keepApart, spreadLabels } from '../../../src/charts/spread-labels.ts';

describe('labels at the end of lines', () => {
  test('stay where they are when they have room', () => {
    expect(spreadLabels([10, 60, 120], 16, 0, 200)).toEqual([10, 60, 120]);
  });

  test('never come closer than the gap, keep their order and stay inside when they fit', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 300 }), { minLength: 1, maxLength: 12 }), (places) => {
        const spread = spreadLabels(places, 17, 0, 300);
        const inOrder = places
          .map((place, at) => ({ place, at: spread[at] ?? Number.NaN }))
          .sort((a, b) => a.place - b.place || a.at - b.at)
          .map((one) => one.at);
        for (let at = 1; at < inOrder.length; at++) {
          expect((inOrder[at] ?? 0) - (inOrder[at - 1] ?? 0)).toBeGreaterThanOrEqual(17 - 1e-9);
        }
        expect(Math.min(...spread)).toBeGreaterThanOrEqual(0);
        expect(Math.max(...spread)).toBeLessThanOrEqual(300);
      }),
    );
  });
});

test('of labels that would overlap, the weightier stays', () => {
  const kept = keepApart([
    { from: 0, to: 40, weight: 100, name: 'small' },
    { from: 30, to: 70, weight: 900, name: 'large' },
    { from: 71, to: 99, weight: 5, name: 'beside' },
  ]);
  expect(kept.map((label) => label.name)).toEqual(['large', 'beside']);
});
