import { describe, expect, it } from 'vitest';
import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import type { TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import type { WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import { openSmallShop, outOf } from '../support/small-shop.ts';

// Source of the figures: worked out by hand from the table in support/small-shop.ts.

describe('what pays by another view, and as an old sheet would have it', () => {
  it('compares by every hour, after the wage, and on cost', async () => {
    const { ask } = await openSmallShop();
    const suv = async (view: string) => {
      const { fits, ...answer } = await ask<WhatPaysAnswer>(`what-pays?view=${view}`);
      expect(answer.view).toBe(view);
      return fits.classes.groups.find(({ className }) => className === 'SUV');
    };
    // 3,000 over 50 hours and 1,000 over 100; nobody was paid. After 25 an hour: 1,750 and −1,500. Cost 7,000 and 6,000.
    expect((await suv('all-hours'))?.plain).toBeCloseTo(400_000 / 150, 9);
    expect((await suv('after-wage'))?.plain).toBeCloseTo((400_000 - 150 * 2500) / 2, 9);
    expect((await suv('on-cost'))?.plain).toBeCloseTo(4 / 13, 12);
  });

  it('says what sold ones and the big bills alone would claim', async () => {
    const { ask } = await openSmallShop();
    const { oldSheet, withoutOne } = await ask<WhatPaysAnswer>('what-pays');
    // Parts and transport are all the bills there are.
    expect(oldSheet.bills).toEqual(['parts', 'transport']);
    expect(oldSheet.old).toEqual({ n: 3, keptCents: 630_000 });
    expect(oldSheet.whole).toEqual({ n: 4, keptCents: 380_000 });
    expect(oldSheet.damages.map(({ name, old, whole }) => [name, old.n, whole.n])).toEqual([
      ['front', 1, 2],
      ['hail', 2, 2],
    ]);
    // Without S-4, 6,300 over 196 hours.
    expect(withoutOne?.rebuild.tag).toBe('S-4');
    expect(withoutOne?.value).toBeCloseTo(630_000 / 196, 9);
  });

  it('leaves every other way out aside when asked, names them, and keeps the old claim beside it', async () => {
    const { ask } = await openSmallShop();
    const answer = await ask<WhatPaysAnswer>('what-pays?exits=sold');
    expect(answer.totals).toMatchObject({ n: 3, profitCents: 630_000 });
    expect(outOf(answer)).toMatchObject({ 'left otherwise than by sale': ['S-4'] });
    expect(answer.oldSheet.whole).toEqual({ n: 4, keptCents: 380_000 });
    const overruns = await ask<OverrunsAnswer>('overruns?exits=sold');
    expect(overruns.total.n).toBe(3);
    const selling = await ask<TimeToSellAnswer>('time-to-sell?exits=sold');
    expect(selling.overall).toMatchObject({ n: 3, unsoldCount: 0 });
    expect(selling.unsold.total).toBe(1);
    expect(outOf(selling)).toMatchObject({ 'not sold yet': ['S-5'] });
  });
});
