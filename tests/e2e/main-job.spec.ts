import { addEntries, addHours } from './steps/keep-books.ts';
import { importList, importSheet, startShop, takeOut } from './steps/bring-in.ts';
import { cars } from './steps/facts.ts';
import { adoptRule, readOverruns, readTimeToSell, readWhatPays, readYear } from './steps/read-answers.ts';
import { test } from './support/test.ts';

test('from an empty shop to the five answers, and a file taken out again', async ({ page }) => {
  test.setTimeout(120_000);
  const shop = await test.step('sign up; the empty shop leads to its first import', () => startShop(page));
  await test.step('import one car per row', () => importSheet(page, shop));
  await test.step('import one cost per row', () => importList(page, shop));
  await test.step('add three entries by keyboard and void one', () => addEntries(page, shop));
  await test.step('add hours by keyboard', () => addHours(page, shop));
  await test.step('Year', () => readYear(page, shop, cars));
  await test.step('What pays', () => readWhatPays(page, shop));
  await test.step('Overruns', () => readOverruns(page, shop));
  await test.step('Time to sell', () => readTimeToSell(page, shop));
  await test.step('Contingency, and adopt a rule', () => adoptRule(page, shop));
  await test.step('take the second file out: the books are as before it', () => takeOut(page, shop));
});
