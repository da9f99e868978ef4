import { describe, expect, it } from 'vitest';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { openSmallShop, outOf } from '../support/small-shop.ts';

// Source of the figures: worked out by hand from the table in support/small-shop.ts.

describe('contingency', () => {
  it('takes one of the overruns, or says that there are too few yet', async () => {
    const { ask } = await openSmallShop();
    const answer = await ask<ContingencyAnswer>('contingency');
    expect(answer).toMatchObject({ level: '4/5', estimateCents: 480_000, overrunCents: 90_000 });
    expect(answer.percent).toMatchObject({ n: 4, k: 4, isAttainable: true, guarantee: 0.8, uplift: 1, percent: 100 });
    expect(answer.percent.taken?.tag).toBe('S-2');
    expect(answer.twoPart).toMatchObject({ n: 4, k: 4, creepPercent: 0, creepCents: -10_000, flatCents: 100_000 });
    const half = await ask<ContingencyAnswer>('contingency?level=1/2');
    expect(half.percent).toMatchObject({ k: 3, uplift: 0.5, percent: 50 });
    const most = await ask<ContingencyAnswer>('contingency?level=9/10');
    expect(most.percent).toMatchObject({ k: 5, isAttainable: false, uplift: null, percent: null, taken: null });
    expect(most.twoPart).toMatchObject({ isAttainable: false, flatCents: null, adoptFlatCents: null });
  });

  it('judges no rule on a rebuild before five are known', async () => {
    const { ask } = await openSmallShop();
    const answer = await ask<ContingencyAnswer>('contingency');
    expect(answer.backTest).toMatchObject({ skippedCount: 4, tooFewCount: 0 });
    expect(answer.backTest.scores.map(({ rule, n, rate }) => [rule, n, rate])).toEqual([
      ['percent', 0, null],
      ['flat 10', 0, null],
      ['flat 15', 0, null],
      ['flat 20', 0, null],
      ['flat 25', 0, null],
    ]);
    expect(answer.trail.map(({ tag, isCovered }) => [tag, isCovered])).toEqual([
      ['S-1', null],
      ['S-2', null],
      ['S-3', null],
      ['S-4', null],
    ]);
    expect(answer.damages.map(({ name, n, percent }) => [name, n, percent])).toEqual([
      ['front', 2, null],
      ['hail', 2, null],
    ]);
  });

  it('scores a rule made from what was known when each was bought', async () => {
    const { books, ask } = await openSmallShop();
    // Five known at +10 %, then one bought after they had all left: at 4/5 of five the fifth of five is asked.
    for (const [i, over] of [10, 10, 10, 10, 10, 30].entries()) {
      const dates = i < 5 ? ['2023-01-01', '2023-02-01'] : ['2023-03-01', '2023-04-01'];
      const place = { damageId: books.damageId('fire'), purchaseCents: 100_000, saleCents: 300_000 };
      const { id } = await books.rebuild({ ...place, boughtOn: dates[0], soldOn: dates[1] });
      await books.lock(await books.plan(id, { parts: 100_000 }));
      await books.entry({ rebuildId: id, datedOn: dates[0], cents: 1000 * (100 + over), foreseen: 'foreseen' });
    }
    const answer = await ask<ContingencyAnswer>(`contingency?to=2023`);
    const last = answer.trail.at(-1);
    expect(last).toMatchObject({
      knownCount: 5,
      uplift: 0.1,
      reserveCents: 10_000,
      isCovered: false,
      shortCents: 20_000,
    });
    expect(answer.backTest.scores[0]).toMatchObject({
      rule: 'percent',
      x: 0,
      n: 1,
      shortCents: 20_000,
      unusedCents: 0,
    });
    expect(answer.backTest.scores.at(-1)).toMatchObject({ rule: 'flat 25', x: 0, n: 1, shortCents: 5_000 });
    expect(outOf(answer)['fewer than five known when it was bought']).toHaveLength(5);
  });
});
