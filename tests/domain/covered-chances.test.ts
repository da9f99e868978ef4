import { describe, expect, it } from 'vitest';
import { coveredChances } from '../../server/domain/covered-chances.ts';

/** Every way in which n past and m new values can be ordered, each as likely as any other, counted by hand. */
function byCounting({ n, k, m }: { n: number; k: number; m: number }): number[] {
  const counts = Array.from({ length: m + 1 }, () => 0);
  for (let order = 0; order < 2 ** (n + m); order += 1) {
    const isNew = Array.from({ length: n + m }, (_, place) => (order >> place) % 2 === 1);
    if (isNew.filter(Boolean).length !== m) continue;
    const past = [...isNew.keys()].filter((place) => !isNew[place]);
    const within = isNew.filter((one, place) => one && place < (past[k - 1] ?? -1)).length;
    counts[within] = (counts[within] ?? 0) + 1;
  }
  const all = counts.reduce((a, b) => a + b);
  return counts.map((count) => count / all);
}

describe('chances of staying within a past value', () => {
  it.each([
    [1, 1, 1],
    [4, 4, 3],
    [5, 2, 4],
    [6, 5, 6],
    [9, 8, 2],
  ])('are those of all orders of %d (the %d. taken) and %d', (n, k, m) => {
    const expected = byCounting({ n, k, m });
    const chances = coveredChances({ n, k, m });
    expect(chances).toHaveLength(m + 1);
    for (const [j, chance] of chances.entries()) expect(chance).toBeCloseTo(expected[j] ?? -1, 12);
  });

  it('of one new value is the promise of the rule', () => {
    for (const [n, k] of [
      [4, 4],
      [35, 29],
      [20_000, 16_001],
    ] as const)
      expect(coveredChances({ n, k, m: 1 })[1]).toBeCloseTo(k / (n + 1), 12);
  });

  it('keeps its mean, m·k/(n + 1), and its sum for a large shop', () => {
    const [n, k, m] = [20_000, 16_001, 5_000];
    const chances = coveredChances({ n, k, m });
    expect(chances.reduce((a, b) => a + b)).toBeCloseTo(1, 12);
    const mean = chances.reduce((total, chance, j) => total + j * chance, 0);
    expect(mean / ((m * k) / (n + 1))).toBeCloseTo(1, 9);
  });

  it('says of none that all are within', () => expect(coveredChances({ n: 9, k: 8, m: 0 })).toEqual([1]));
});
