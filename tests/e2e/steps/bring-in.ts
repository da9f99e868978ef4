import { expect, type Locator, type Page } from '@playwright/test';
import { toTheCent } from '../support/as-shown.ts';
import { answerOn, book, readFile, rowOf } from '../support/books.ts';
import { newPerson } from '../support/visitor.ts';
import { sum } from '../support/worked-out.ts';
import { list, sheet, sheetCars } from './facts.ts';
import { readYear } from './read-answers.ts';

/** Starts a shop at the form and goes where its first page leads; resolves to the shop’s address. */
export async function startShop(page: Page): Promise<string> {
  const person = newPerson();
  await page.goto('/');
  await page.getByRole('link', { name: 'Start a shop' }).click();
  await page.getByLabel('Your name').fill(person.name);
  await page.getByLabel("Your shop's name").fill(person.shopName);
  await page.getByLabel('Email').fill(person.email);
  await page.getByLabel('Password', { exact: true }).fill(person.password);
  await page.getByRole('button', { name: 'Start the shop' }).click();
  // Wherever a new shop opens, one press leads to the import.
  await page
    .locator('main')
    .getByRole('link', { name: /spreadsheet/ })
    .or(page.getByRole('button', { name: 'Choose files' }))
    .first()
    .waitFor();
  if (!page.url().endsWith('/import'))
    await page
      .locator('main')
      .getByRole('link', { name: /spreadsheet/ })
      .click();
  await expect(page.getByRole('button', { name: 'Choose files' })).toBeVisible();
  return new URL(page.url()).pathname.replace(/\/import$/, '');
}

/** One car per row, held against the control totals of its truth. */
export async function importSheet(page: Page, shop: string): Promise<void> {
  const { control } = sheet.truth;
  await readFile(page, shop, sheet.file);
  await expect(answerOn(page)).toHaveText(
    /Ready to come in: 10 of 10 rows about 10 rebuilds; it agrees with every total/,
  );
  await expect(page.getByLabel('What Stock holds')).toHaveValue('stock number');
  for (const [category, cents] of Object.entries(control.totalCentsByCategory)) {
    await expect(comesIn(page, category)).toHaveText(toTheCent(cents));
  }
  await expect(comesIn(page, 'Costs together')).toHaveText(toTheCent(control.costsCents));
  await expect(comesIn(page, 'Sales')).toHaveText(toTheCent(control.totalSaleCents));
  await expect(comesIn(page, 'Planned')).toHaveText(toTheCent(control.estimateCents));
  await expect(comesIn(page, 'Hours')).toHaveText(`${control.rebuildHoursTotal}`);
  await book(page);
}

/** The figure that the import's page gives for a sum of the file; found by how its name begins, in any case. */
function comesIn(page: Page, name: string): Locator {
  const panel = page.locator('section').filter({ has: page.getByRole('heading', { name: 'What comes in' }) });
  const start = new RegExp(`^${name.replace(/[()]/g, '\\$&')}`, 'i');
  const row = panel.getByRole('row').filter({ has: page.locator('th, td').first().filter({ hasText: start }) });
  return row.first().locator('th, td').last();
}

/** One cost per row: a question that only a person can answer, and three rows put aside. */
export async function importList(page: Page, shop: string): Promise<void> {
  const { control } = list.truth;
  await readFile(page, shop, list.file);
  // The sheet holds a 2005 Altima that was sold in 2018; the list has another one, bought in 2020.
  await page.getByLabel('Is “05 Altima” a rebuild that you have already?').selectOption('a new rebuild');
  await page.getByRole('button', { name: 'Read again with 1 change' }).click();
  // The truth's rows, less those that nobody can read: no such day, no car named, no amount.
  await expect(answerOn(page)).toHaveText(
    `Ready to come in: ${control.dataRows} of ${control.dataRows + 3} rows about 5 rebuilds; the file states no totals to hold it against.`,
  );
  const aside = rowOf(page.getByRole('table', { name: 'Rows and cells put aside' }), '11');
  await expect(aside.getByRole('textbox')).toHaveValue('2/30/2020');
  await expect(comesIn(page, 'purchase')).toHaveText(toTheCent(control.totalCentsByCategory['purchase'] ?? 0));
  await expect(comesIn(page, 'Costs together')).toHaveText(toTheCent(control.totalCents));
  await expect(comesIn(page, 'Sales')).toHaveText(toTheCent(control.totalSaleCents));
  await book(page);
}

/** Takes the second file out again; the first one stays, since something was added to it. */
export async function takeOut(page: Page, shop: string): Promise<void> {
  const undo = async (file: RegExp) => {
    await page.goto(`${shop}/import`);
    await page.getByRole('link', { name: file }).click();
    await page.getByRole('button', { name: 'Take it out again' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Take it out' }).click();
  };
  await undo(/^p02/);
  await expect(answerOn(page)).toContainText('the books are as they were before it');
  await readYear(page, shop, sheetCars);
  await page.goto(`${shop}/ledger`);
  await expect(answerOn(page)).toContainText(`come to ${toTheCent(sum(sheetCars.map((car) => car.costsCents)))}.`);
  // Something was added to a car of the first file: it stays, and the page says why.
  await undo(/^p01/);
  await expect(page.getByRole('alert').filter({ hasText: /./ })).toBeVisible();
  await page.goto(`${shop}/rebuilds`);
  await expect(page.getByRole('table', { name: 'Rebuilds' }).getByRole('row')).toHaveCount(1 + sheetCars.length);
}
