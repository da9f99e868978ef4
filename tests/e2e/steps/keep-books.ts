import { expect, type Page } from '@playwright/test';
import { toTheCent } from '../support/as-shown.ts';
import { answerOn } from '../support/books.ts';
import { pick, tabTo, typeDay } from '../support/keyboard.ts';
import { sum } from '../support/worked-out.ts';
import { cars, TYPED } from './facts.ts';

/** Three entries by keys alone; what can stay for the next line stays. The last is voided. */
export async function addEntries(page: Page, shop: string): Promise<void> {
  await page.goto(`${shop}/ledger`);
  const form = page.getByRole('form', { name: 'Add an entry' });
  const amount = form.getByLabel('Amount');
  await tabTo(page, form.getByLabel('Day'));
  await typeDay(page, TYPED.day);
  await tabTo(page, form.getByLabel('Rebuild'));
  await pick(page, TYPED.car);
  await tabTo(page, form.getByLabel('Category'));
  await pick(page, 'parts');
  await tabTo(page, amount);
  for (const cents of TYPED.entries) {
    await page.keyboard.type(cents);
    await page.keyboard.press('Tab');
    await page.keyboard.type(`seal for ${cents}`);
    await page.keyboard.press('Enter');
    await expect(page.getByText('Entry saved').first()).toBeVisible();
    await expect(amount).toBeFocused();
    await expect(amount).toHaveValue('');
    await expect(form.getByLabel('Day')).toHaveValue(TYPED.day);
    await expect(form.getByLabel('Rebuild')).toHaveValue(/^TC-07/);
    await expect(form.getByLabel('Category')).toHaveValue(/^parts$/i);
  }
  await page.getByLabel('Find', { exact: true }).fill('seal for 99.99');
  await expect(answerOn(page)).toHaveText('1 entry matches and comes to $99.99.');
  await page.getByRole('button', { name: `Void seal for 99.99, ${TYPED.day}` }).click();
  await page.getByRole('dialog').getByLabel('Why').fill('typed on the wrong car');
  await page.getByRole('dialog').getByRole('button', { name: 'Void it' }).click();
  await expect(answerOn(page)).toHaveText('No entry matches this.');
  await page.getByRole('search').getByLabel('Void').selectOption('Shown');
  await expect(page.getByRole('table', { name: 'Entries' })).toContainText('void: typed on the wrong car');
  await page.goto(`${shop}/ledger`);
  await expect(answerOn(page)).toContainText(`come to ${toTheCent(sum(cars.map((car) => car.costsCents)))}.`);
}

/** Two rows of hours by keys alone. */
export async function addHours(page: Page, shop: string): Promise<void> {
  await page.goto(`${shop}/hours`);
  const form = page.getByRole('form', { name: 'Add hours' });
  await tabTo(page, form.getByLabel('Day'));
  await typeDay(page, TYPED.day);
  await tabTo(page, form.getByLabel('Rebuild'));
  await pick(page, TYPED.car);
  await tabTo(page, form.getByLabel('Hours'));
  for (const length of TYPED.hours) {
    await page.keyboard.type(length);
    await page.keyboard.press('Enter');
    await expect(form.getByLabel('Hours')).toBeFocused();
    await expect(form.getByLabel('Hours')).toHaveValue('');
    await expect(form.getByLabel('Day')).toHaveValue(TYPED.day);
    await expect(form.getByLabel('Rebuild')).toHaveValue(/^TC-07/);
  }
  await expect(answerOn(page)).toContainText(`${sum(cars.map((car) => car.hours ?? 0))} hours are in the books`);
}
