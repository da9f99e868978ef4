import { expect, it } from 'vitest';
import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { openSmallShop } from '../support/small-shop.ts';

// Source of the figures: worked out by hand from the table in support/small-shop.ts. Parts, planned and actual:
// 2025: 2,000 + 1,000 and 2,000 + 2,000; 2026: 800 + 1,000 and 1,000 + 500. Hours: 140 and 150; 60 and 56.

it('says of each category and of the hours how they ran in each year, fewer than five marked', async () => {
  const { ask } = await openSmallShop();
  const { categories, hours } = await ask<OverrunsAnswer>('overruns');
  const parts = categories.find(({ name }) => name === 'parts');
  expect(parts?.years.map(({ year, n, isThin }) => [year, n, isThin])).toEqual([
    [2025, 2, true],
    [2026, 2, true],
  ]);
  expect(parts?.years[0]?.pooled).toBeCloseTo(1 / 3, 12);
  expect(parts?.years[1]?.pooled).toBeCloseTo(-1 / 6, 12);
  expect(hours.years.map(({ year, n }) => [year, n])).toEqual([
    [2025, 2],
    [2026, 2],
  ]);
  expect(hours.years[0]?.pooled).toBeCloseTo(10 / 140, 12);
  expect(hours.years[1]?.pooled).toBeCloseTo(-4 / 60, 12);
});

it('a category that nobody planned for has no years', async () => {
  const { ask } = await openSmallShop();
  const { categories } = await ask<OverrunsAnswer>('overruns');
  expect(categories.find(({ name }) => name === 'transport')?.years).toEqual([]);
});
