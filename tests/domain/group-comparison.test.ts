import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { groupComparison } from '../../server/domain/group-comparison.ts';
import { overrunByCell, returnByCell, whatPays } from '../../server/domain/what-pays.ts';
import { buildLine, buildOutcome, buildRebuild, sale } from '../support/facts.ts';

const value = fc.record({ group: fc.constantFrom('a', 'b', 'c', 'd'), value: fc.integer({ min: -1e6, max: 1e6 }) });
const values = fc.array(value, { maxLength: 30 });
const of = (group: string, ...list: number[]) => list.map((one) => ({ group, value: one }));

// Published fits are checked in tests/reference.
describe('groups side by side', () => {
  it('each is pulled toward the average and never past it', () => {
    fc.assert(
      fc.property(values, (list) => {
        const { pooled, groups } = groupComparison(list);
        expect(pooled === null).toBe(groups.every((group) => group.shrunken === null));
        for (const { mean, shrunken } of pooled ? groups : []) {
          const [low, high] = [mean, pooled?.mean ?? mean].toSorted((a, b) => a - b);
          const slack = 1e-9 * Math.max(1, Math.abs(mean));
          expect(shrunken?.value).toBeGreaterThanOrEqual((low ?? 0) - slack);
          expect(shrunken?.value).toBeLessThanOrEqual((high ?? 0) + slack);
          expect(shrunken?.lower).toBeLessThanOrEqual(shrunken?.upper ?? 0);
        }
      }),
    );
  });

  it('moves with its values', () => {
    fc.assert(
      fc.property(values, fc.integer({ min: -1000, max: 1000 }), (list, shift) => {
        const before = groupComparison(list);
        const after = groupComparison(list.map((one) => ({ ...one, value: one.value + shift })));
        for (const [i, group] of after.groups.entries())
          expect(group.mean).toBeCloseTo((before.groups[i]?.mean ?? 0) + shift, 6);
        expect(after.withinVariance ?? 0).toBeCloseTo(before.withinVariance ?? 0, 1);
      }),
    );
  });

  it('shows no difference when the groups differ no more than their members do', () => {
    const { pooled, groups } = groupComparison([...of('a', 1, 3, 5), ...of('b', 2, 3, 4)]);
    expect(pooled?.betweenVariance).toBe(0);
    expect(groups.map((group) => group.shrunken?.value)).toEqual([3, 3]);
  });

  it('a group of one takes part but has no interval of its own', () => {
    const [, single] = groupComparison([...of('a', 1, 2, 9), ...of('b', 4)]).groups;
    expect(single).toMatchObject({ n: 1, deviation: null, interval: null, isThin: true });
    expect(single?.shrunken).not.toBeNull();
  });

  it('cannot be pooled: one group, one each, or no spread; means and intervals stay', () => {
    expect(groupComparison(of('a', 1, 2))).toMatchObject({
      pooled: null,
      groups: [{ mean: 1.5, shrunken: null, variance: null }],
    });
    expect(groupComparison([...of('a', 1), ...of('b', 2)])).toMatchObject({ pooled: null, withinVariance: null });
    const equal = groupComparison([...of('a', 0.1, 0.1, 0.1), ...of('b', 0.7, 0.7, 0.7)]);
    expect(equal).toMatchObject({ pooled: null, withinVariance: 0 });
    expect(equal.groups[0]?.deviation).toBe(0);
    expect(groupComparison([])).toEqual({ n: 0, withinVariance: null, pooled: null, groups: [] });
  });
});

describe('what pays', () => {
  const left = (id: string, kind: string | null, damage: string | null, kept: number, hours: number | null) =>
    buildRebuild({
      id,
      class: kind,
      damage,
      ownSeconds: hours && hours * 3600,
      exit: sale('2025-04-01', 500_000 + kept),
    });
  const facts = [
    left('1', 'SUV', 'front', 300_000, 100),
    left('2', 'SUV', 'front', 100_000, 25),
    left('3', 'SUV', 'hail', 50_000, 10),
    left('4', 'van', null, 80_000, 10),
    left('5', 'van', 'hail', 80_000, null),
  ];

  it('compares cells, classes and damages by profit per own hour, the plain quotient beside', () => {
    const { cells, classes, damages } = whatPays(facts, 'per-hour', null);
    expect(cells.groups.map(({ class: name, damage, n, mean, plain }) => [name, damage, n, mean, plain])).toEqual([
      ['SUV', 'front', 2, 3500, 3200],
      ['SUV', 'hail', 1, 5000, 5000],
    ]);
    expect(classes.groups.map(({ group, n }) => [group, n])).toEqual([
      ['SUV', 3],
      ['van', 1],
    ]);
    expect(damages.groups.map(({ group, n, sums }) => [group, n, sums.profitCents])).toEqual([
      ['front', 2, 400_000],
      ['hail', 1, 50_000],
    ]);
    expect([cells, classes, damages].map((one) => one.ungroupedCount)).toEqual([1, 0, 1]);
  });

  it('overrun and return by cell hold only the rebuilds that have one', () => {
    const cell = overrunByCell([
      buildOutcome('a', 110, 100),
      buildOutcome('b', 50, 0),
      buildOutcome('c', 1, 1, { class: null }),
    ]);
    expect(cell.groups.map(({ group, n, mean }) => [group, n, mean])).toEqual([['SUV|front', 1, 0.1]]);
    const roc = returnByCell([
      buildRebuild({}, [buildLine({ cents: 300_000 })]),
      buildRebuild({ purchaseCents: null }),
    ]);
    expect(roc.groups.map(({ group, n, mean }) => [group, n, mean])).toEqual([['SUV|front', 1, 0.25]]);
  });
});
