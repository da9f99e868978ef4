import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { gapBarLayout } from '../../../src/charts/gap-bar-layout.ts';

const size = { width: 200, maxCents: 2000 };

describe('the gap bar', () => {
  test('over plan with a surprise: ink to the outline, rust beyond it, hatch at the end', () => {
    const shapes = gapBarLayout({ lockedCents: 1000, foreseenCents: 1200, surpriseCents: 300 }, size);
    expect(shapes.outline).toBe(100);
    expect(shapes.parts).toEqual([
      { kind: 'foreseen', isOver: false, from: 0, to: 100 },
      { kind: 'foreseen', isOver: true, from: 100, to: 120 },
      { kind: 'surprise', isOver: true, from: 120, to: 150 },
    ]);
    expect(shapes.isCut).toBe(false);
  });

  test('under plan: white is left inside the outline', () => {
    const shapes = gapBarLayout({ lockedCents: 1000, foreseenCents: 600, surpriseCents: 100 }, size);
    expect(shapes.parts).toEqual([
      { kind: 'foreseen', isOver: false, from: 0, to: 60 },
      { kind: 'surprise', isOver: false, from: 60, to: 70 },
    ]);
  });

  test('a surprise that crosses the outline is split there', () => {
    const { parts } = gapBarLayout({ lockedCents: 1000, foreseenCents: 900, surpriseCents: 300 }, size);
    expect(parts.map((part) => [part.kind, part.isOver])).toEqual([
      ['foreseen', false],
      ['surprise', false],
      ['surprise', true],
    ]);
  });

  test('without a locked estimate there is no outline and nothing is over', () => {
    const shapes = gapBarLayout({ lockedCents: null, foreseenCents: 500, surpriseCents: 500 }, size);
    expect(shapes.outline).toBeNull();
    expect(shapes.parts.some((part) => part.isOver)).toBe(false);
  });

  test('more than there is room for is cut and says so', () => {
    expect(gapBarLayout({ lockedCents: 1000, foreseenCents: 2500, surpriseCents: 0 }, size).isCut).toBe(true);
  });

  test('parts join up from zero to what was spent, whatever the amounts', () => {
    const cents = fc.integer({ min: 0, max: 5_000_000 });
    fc.assert(
      fc.property(cents, cents, cents, (lockedCents, foreseenCents, surpriseCents) => {
        const maxCents = 10_000_000;
        const { parts } = gapBarLayout({ lockedCents, foreseenCents, surpriseCents }, { width: maxCents, maxCents });
        let at = 0;
        for (const part of parts) {
          expect(part.from).toBeCloseTo(at, 3);
          expect(part.isOver).toBe(Math.round(part.from) >= lockedCents);
          at = part.to;
        }
        expect(at).toBeCloseTo(foreseenCents + surpriseCents, 3);
      }),
    );
  });
});
