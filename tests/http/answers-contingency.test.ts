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
    expect(answer.trail.map(({ tag, asked, place }) => [tag, asked, place])).toEqual([
      ['S-1', null, 2],
      ['S-2', null, 4],
      ['S-3', null, 3],
      ['S-4', null, 1],
    ]);
    // Creep 0: what is left over of each is its overrun in dollars.
    expect(answer.trail.map(({ twoPart }) => [twoPart?.leftCents, twoPart?.place])).toEqual([
      [0, 2],
      [100_000, 4],
      [40_000, 3],
      [-50_000, 1],
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
      asked: { reserveCents: 10_000, isCovered: false, shortCents: 20_000 },
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

  it('says what the level may come to with so few, and what one rebuild moves', async () => {
    const { ask } = await openSmallShop();
    const half = await ask<ContingencyAnswer>('contingency?level=1/2');
    // Without one of −50, 0, 50 and 100 %: of three the second, so 0 or 50 %.
    expect(half.percent.without).toEqual({
      uplift: { lowest: 0, highest: 0.5 },
      percent: { lowest: 0, highest: 50 },
    });
    // Without S-4, all of it a surprise, known work came to 900 beyond 3,800: 23.7, raised. Without another it stays 0.
    expect(half.twoPart.without).toEqual({
      creepPercent: { lowest: 0, highest: 24 },
      flatCents: { lowest: 0, highest: 40_000 },
    });
    // Beta(3, 2): where 4x³ − 3x⁴ is a tenth and nine tenths.
    expect(half.percent.band?.lower).toBeCloseTo(0.32046, 4);
    expect(half.percent.band?.upper).toBeCloseTo(0.85744, 4);
    const four = await ask<ContingencyAnswer>('contingency?level=4/5');
    expect([four.percent.without, four.twoPart.without]).toEqual([null, null]);
    const most = await ask<ContingencyAnswer>('contingency?level=9/10');
    expect(most.percent.band).toBeNull();
  });

  it('sets the last 24 months beside the years before, and says nothing of too few', async () => {
    const { ask } = await openSmallShop();
    const { drift } = await ask<ContingencyAnswer>('contingency');
    expect(drift).toMatchObject({ after: '2024-06-15', verdict: null, withinCount: null, expectedCount: null });
    expect([drift.all.n, drift.recent.n, drift.before.n]).toEqual([4, 4, 0]);
    expect([drift.all.percent, drift.before.percent]).toEqual([100, null]);
  });
});

describe('past bids', () => {
  /** Five at +10 % known, then one for which the rule asks 100 of an estimate of 1,000. */
  async function shopWithBid(purchaseCents: number, locked: object) {
    const shop = await openSmallShop();
    const { books } = shop;
    for (const i of [0, 1, 2, 3, 4, 5]) {
      const days = i < 5 ? ['2023-01-01', '2023-02-01'] : ['2023-03-01', '2023-04-01'];
      const { id } = await books.rebuild({ boughtOn: days[0], soldOn: days[1], saleCents: 300_000, purchaseCents });
      await books.lock(await books.plan(id, { parts: 100_000 }, locked));
      await books.entry({ rebuildId: id, datedOn: days[0], cents: 110_000, foreseen: 'foreseen' });
    }
    return (await shop.ask<ContingencyAnswer>('contingency?to=2023')).pastBids.percent;
  }
  const LOCKED = { expectedSaleCents: 250_000, plannedSeconds: 10 * 3600 };

  // 2,500 expected − 1,000 − 10 hours at 25 leaves 1,250; 1,150 with the cushion of 100.
  it('are skipped where more was paid than the sheet of the day allowed with its cushion', async () => {
    const found = await shopWithBid(120_000, LOCKED);
    expect(found).toMatchObject({ n: 1, reserveCents: 10_000, aboveAnyway: { count: 0 }, leftOut: [] });
    expect(found.skipped).toMatchObject({ count: 1, lostCount: 0, gainedCount: 1, gainedCents: 70_000 });
    expect(found.skipped.rebuilds).toMatchObject([{ paidCents: 120_000, limitCents: 115_000, reserveCents: 10_000 }]);
  });

  it('stay where they were within it, and are no matter of the rule where they were above it anyway', async () => {
    expect(await shopWithBid(115_000, LOCKED)).toMatchObject({ skipped: { count: 0 }, aboveAnyway: { count: 0 } });
    expect(await shopWithBid(125_001, LOCKED)).toMatchObject({ skipped: { count: 0 }, aboveAnyway: { count: 1 } });
  });

  it('are left out and counted where nothing was locked to judge them by', async () => {
    const found = await shopWithBid(120_000, { expectedSaleCents: 250_000 });
    expect(found).toMatchObject({ n: 0, reserveCents: 0, skipped: { count: 0 } });
    expect(Object.keys(outOf(found))).toEqual(['no hours planned']);
    const other = await shopWithBid(120_000, { plannedSeconds: 3600 });
    expect(Object.keys(outOf(other))).toEqual(['no sale expected in its estimate']);
  });
});
