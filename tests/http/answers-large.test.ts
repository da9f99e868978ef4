import { describe, expect, it } from 'vitest';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import type { TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import { fillShop } from '../bench/fill.ts';
import { inventLines, inventRebuilds } from '../bench/invent.ts';
import { testApi } from '../support/api.ts';

/** A shop too large to draw each rebuild, so that replies must stay bounded. */
async function openLargeShop() {
  const api = await testApi();
  const ada = await api.owner();
  const rebuilds = inventRebuilds(700);
  await fillShop(api.services.database, ada.shopId, rebuilds, inventLines(rebuilds, 3));
  const ask = async <T>(question: string) => {
    const { body, text } = await ada.get(`/api/answers/${question}`);
    return { answer: body as T, size: text.length };
  };
  return { ask, soldCount: rebuilds.filter(({ soldOn }) => soldOn !== null).length };
}

describe('the answers of a large shop', () => {
  it('count rebuilds in bins in place of dots', async () => {
    const { ask, soldCount } = await openLargeShop();
    const { answer, size } = await ask<OverrunsAnswer>('overruns');
    expect(answer.marks).toBe('binned');
    for (const part of [answer.total, answer.hours, ...answer.categories]) {
      expect(part.dots).toEqual([]);
      expect(part.bins.reduce((total, { count }) => total + count, 0)).toBe(part.n);
    }
    expect(answer.total.n).toBe(soldCount);
    expect(size).toBeLessThan(150_000);
  });

  it('show the latest 300 of the trail and of the year, and how many there are in all', async () => {
    const { ask, soldCount } = await openLargeShop();
    const { answer: contingency } = await ask<ContingencyAnswer>('contingency');
    expect([contingency.trail.length, contingency.trailTotal]).toEqual([300, soldCount]);
    const [score] = contingency.backTest.scores;
    expect((score?.n ?? 0) + contingency.backTest.skippedCount).toBe(soldCount);
    const { answer: year, size } = await ask<YearAnswer>('year?year=2025');
    expect(year.rebuilds.length).toBe(Math.min(300, year.rebuildTotal));
    expect(year.steps.now.at(-1)?.totalCents).toBe(year.keptCents);
    expect(size).toBeLessThan(250_000);
  });

  it('leave no rebuild out of the selling times', async () => {
    const { ask } = await openLargeShop();
    const { answer } = await ask<TimeToSellAnswer>('time-to-sell');
    const { overall, classes } = answer;
    expect(overall.soldCount + overall.unsoldCount + overall.otherExitCount).toBe(overall.n);
    expect(classes.reduce((total, { n }) => total + n, 0)).toBe(overall.n);
    expect(overall.steps.length).toBeLessThanOrEqual(301);
  });
});
