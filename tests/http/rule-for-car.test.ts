import { describe, expect, it } from 'vitest';
import type { RuleForCar } from '#shared/contracts/answers-rule-for-car.ts';
import { openSmallShop } from '../support/small-shop.ts';

/** Nine small cars hit at the front, seen, 10 % over their plans; beside them the four of the small shop. */
async function shopWithFronts() {
  const shop = await openSmallShop();
  const { books } = shop;
  const ids = { class: books.classId('small car'), damage: books.damageId('front') };
  for (let i = 0; i < 9; i += 1) {
    const place = { classId: ids.class, damageId: ids.damage, isSeen: true };
    const { id } = await books.rebuild({ ...place, boughtOn: '2025-01-01', soldOn: '2025-06-01', saleCents: 500_000 });
    await books.lock(await books.plan(id, { parts: 100_000 }));
    await books.entry({ rebuildId: id, datedOn: '2025-02-01', cents: 110_000, foreseen: 'foreseen' });
  }
  return { ...shop, ids };
}

describe('the rule for a car', () => {
  it('comes from the finest rung that carries it, with every rung tried beside it', async () => {
    const { ask, ids } = await shopWithFronts();
    const found = await ask<RuleForCar>(`rule-for-car?class=${ids.class}&damage=${ids.damage}&seen=yes`);
    expect(found.percent).toMatchObject({ rung: 'class+damage+seen', n: 9, k: 8, percent: 10, guarantee: 0.8 });
    expect(found.percent.tried).toEqual([
      { rung: 'class+damage+seen', n: 9, k: 8, carries: true },
      // S-3, a pickup, was hit at the front and seen too; S-1 was seen.
      { rung: 'damage+seen', n: 10, k: 9, carries: true },
      { rung: 'seen', n: 11, k: 10, carries: true },
      { rung: 'all', n: 13, k: 12, carries: true },
    ]);
    expect(found.twoPart).toMatchObject({ rung: 'class+damage+seen', creepPercent: 10, flatCents: 0 });
  });

  it('takes what is not said as like nothing, and an id of nobody as not said', async () => {
    const { ask, ids } = await shopWithFronts();
    expect((await ask<RuleForCar>(`rule-for-car?class=${ids.class}&damage=${ids.damage}`)).percent.rung).toBe('all');
    expect((await ask<RuleForCar>(`rule-for-car?seen=yes&damage=${'A'.repeat(22)}`)).percent.rung).toBe('seen');
  });

  it('says too few yet with how many there are of all', async () => {
    const { ask } = await openSmallShop();
    const { percent, twoPart } = await ask<RuleForCar>('rule-for-car?seen=no');
    expect(percent).toMatchObject({ rung: null, n: 4, k: 4, uplift: null, percent: null, band: null });
    expect(twoPart).toMatchObject({ rung: null, n: 4, creepPercent: null, flatCents: null, adoptFlatCents: null });
  });
});
