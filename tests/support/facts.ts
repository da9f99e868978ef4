import type { RebuildFacts } from '../../server/domain/facts.ts';
import { factsFromLines, type Line, type RebuildFrame } from '../../server/domain/facts-from-lines.ts';

/** One paid, foreseen entry, unless told otherwise. */
export function buildLine(line: Partial<Line> = {}): Line {
  return {
    on: '2025-02-01',
    category: 'parts',
    cents: 100_000,
    isForeseen: true,
    isExtra: false,
    freeCents: null,
    ...line,
  };
}

/** A sale, for `buildRebuild`. */
export function sale(on: string, proceedsCents: number): RebuildFrame['exit'] {
  return { kind: 'sold', on, proceedsCents };
}

/** A rebuild that was bought for 5,000, planned at 2,500 of parts and sold for 10,000, unless told otherwise. */
export function buildRebuild(frame: Partial<RebuildFrame> = {}, lines: readonly Line[] = []): RebuildFacts {
  const whole: RebuildFrame = {
    id: 'r1',
    class: 'SUV',
    damage: 'front',
    seen: true,
    boughtOn: '2025-01-01',
    readyOn: '2025-03-01',
    listedOn: '2025-03-10',
    exit: sale('2025-04-01', 1_000_000),
    purchaseCents: 500_000,
    ownSeconds: 360_000,
    paidSeconds: 0,
    estimates: new Map([['parts', 250_000]]),
    ...frame,
  };
  return factsFromLines(whole, lines, 'paid labor');
}

/** A completed rebuild that was planned at `estimate` and cost `actual` cents, for what looks at overruns only. */
export function buildOutcome(
  id: string,
  actual: number,
  estimate: number,
  frame: Partial<RebuildFrame> = {},
): RebuildFacts {
  const line = buildLine({ cents: actual });
  return buildRebuild({ id, estimates: new Map([['parts', estimate]]), ...frame }, [line]);
}
