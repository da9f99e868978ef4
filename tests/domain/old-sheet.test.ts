import { describe, expect, it } from 'vitest';
import { oldSheet } from '../../server/domain/old-sheet.ts';
import { buildLine, buildRebuild, sale } from '../support/facts.ts';

const isWage = (name: string) => name === 'paid labor';
const line = (category: string, dollars: number) => buildLine({ category, cents: dollars * 100 });

// Source of the figures: added up by hand.
describe('what the old sheet would have said', () => {
  const lines = [line('parts', 1000), line('paint', 800), line('fees', 700), line('tow', 300), line('paid labor', 900)];
  const sold = buildRebuild({ id: 'a', damage: 'flood', exit: sale('2025-04-01', 1_000_000) }, lines);
  const parted = buildRebuild(
    { id: 'b', damage: 'flood', exit: { kind: 'parted out', on: '2025-05-01', proceedsCents: 200_000 } },
    [line('tow', 100)],
  );
  const waiting = buildRebuild({ id: 'c', damage: 'flood', exit: null });

  it('counts sold ones, the purchase and the three largest kinds of bill that are no wages', () => {
    const found = oldSheet([sold, parted, waiting], isWage);
    expect(found.bills).toEqual(['parts', 'paint', 'fees']);
    expect(found.old).toEqual({ n: 1, keptCents: 250_000 });
    expect(found.soldOnly).toEqual({ n: 1, keptCents: 130_000 });
    expect(found.whole).toEqual({ n: 2, keptCents: 130_000 - 310_000 });
    expect(found.damages).toEqual([
      { name: 'flood', old: found.old, whole: found.whole, unsoldCount: 1, oldRank: null, wholeRank: null },
    ]);
  });

  it('ranks from five on, each by what a rebuild kept', () => {
    const five = (damage: string, sale$: number, tow: number) =>
      [1, 2, 3, 4, 5].map((i) =>
        buildRebuild({ id: `${damage}${i}`, damage, exit: sale('2025-04-01', sale$ * 100) }, [
          line('tow', tow),
          line('parts', 5000),
          line('paint', 4000),
          line('fees', 3000),
        ]),
      );
    const { damages } = oldSheet([...five('hail', 9000, 100), ...five('flood', 9500, 2000)], isWage);
    const ranks = damages.map(({ name, oldRank, wholeRank }) => [name, oldRank, wholeRank]);
    expect(ranks).toEqual([
      ['flood', 1, 2],
      ['hail', 2, 1],
    ]);
  });

  it('says nothing of nothing', () => {
    const nothing = { n: 0, keptCents: 0 };
    expect(oldSheet([], isWage)).toMatchObject({ bills: [], old: nothing, whole: nothing, damages: [] });
  });
});
