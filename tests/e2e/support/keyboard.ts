import { expect, type Locator, type Page } from '@playwright/test';

const FURTHEST = 60;

/** Presses Tab until the focus is on what is looked for; fails when it is not reached. */
export async function tabTo(page: Page, target: Locator): Promise<void> {
  for (let presses = 0; presses < FURTHEST; presses++) {
    if (await isFocused(target)) return;
    await page.keyboard.press('Tab');
  }
  await expect(target, 'reached by Tab').toBeFocused({ timeout: 100 });
}

/** Types a day into the day field that has the focus: month, day, year, as the browser's own field takes them. */
export async function typeDay(page: Page, day: string): Promise<void> {
  const [year, month, date] = day.split('-');
  await page.keyboard.type(`${month}${date}${year}`);
}

/** Picks in the field that has the focus by typing a piece of the name. */
export async function pick(page: Page, piece: string): Promise<void> {
  await page.keyboard.type(piece);
  await expect(page.getByRole('option').first()).toContainText(piece, { ignoreCase: true });
  await page.keyboard.press('Enter');
}

const isFocused = (target: Locator) => target.evaluate((element) => element === document.activeElement);
