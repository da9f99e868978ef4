import { expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const HEAD = 'Car,Bid,Parts est,Parts,Paint est,Paint,Tow est,Tow';

it('a plan that equals what it came to in three categories was written over, and is said to be', () => {
  const reading = read(`${HEAD}\n2011 Miata,900,300,300,150,150,75,75\n2012 Caravan,900,300,300,150,150,75,80`);
  expect(reading.rebuilds.map(({ isOverwritten }) => isOverwritten)).toEqual([true, false]);
  expect(reading.remarks).toHaveLength(1);
  expect(reading.remarks[0]).toContain('“2011 Miata”');
});

it('two categories may agree by chance', () => {
  const reading = read(`${HEAD}\n2011 Miata,900,300,300,150,150,,`);
  expect(reading.rebuilds[0]?.isOverwritten).toBe(false);
  expect(reading.remarks).toEqual([]);
});

it('money beside the day of a deal is its price, when nothing else is', () => {
  const text =
    'Car,Bought,$,Fees,Tow,Sold,$$,Profit\n07 Accord,2/11/15,1200,190,80,4/2/15,2850,1380\n10 Corolla,3/1/15,1900,240,,,,';
  expect(read(text).rebuilds[0]).toMatchObject({ purchaseCents: 120_000, saleCents: 285_000 });
});

it('an amount that can only be written with the other decimal mark comes in as a guess', () => {
  const text =
    'Date,Car,What,Amount\n2020-01-03,05 Camry,hood,"61,20"\n2020-01-04,05 Camry,bulb,"1,061.20"\n2020-01-05,05 Camry,tire,20.00';
  expect(linesOf(read(text)).map(({ cents, isGuess }) => [cents, isGuess])).toEqual([
    [6_120, true],
    [106_120, expect.anything()],
    [2_000, expect.anything()],
  ]);
});
