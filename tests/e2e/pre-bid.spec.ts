import type { Page } from '@playwright/test';
import { answerOn } from './support/books.ts';
import { demoTest, expect, test } from './support/test.ts';
import { newShop, signInToDemo } from './support/visitor.ts';

const READY = /^Works without signal from here on/;

/** Fills a sheet whose bid can be worked out by hand: 11,600 − 2,100 − 40 h × 25 = 8,500. */
async function fill(page: Page, name: string): Promise<void> {
  await page.getByLabel('What you call it').fill(name);
  await page.getByLabel('Sale expected').fill('11,600');
  await page.getByLabel('Parts', { exact: true }).fill('2100');
  await page.getByLabel('Own hours').fill('40');
  await page.getByLabel('Wanted pay per hour').fill('25');
  await page.getByRole('radio', { name: 'None' }).check();
}

test('a sheet opened once works without signal: it is filled in, opened anew, kept, and sent when there is signal', async ({
  page,
  context,
}) => {
  const { shop } = await newShop(page);
  await page.goto(`${shop}/pre-bid`);
  await expect(page.getByText(READY)).toBeVisible();

  await context.setOffline(true);
  await expect(page.getByText('No signal.')).toBeVisible();
  await fill(page, 'Lot 14, blue');
  await expect(answerOn(page)).toHaveText('Walk away above $8,500.');
  await page.getByLabel('Sale expected').fill('11,100');
  await expect(answerOn(page)).toHaveText('Walk away above $8,000.');

  await page.reload();
  await expect(answerOn(page)).toHaveText('Walk away above $8,000.');
  await expect(page.getByLabel('What you call it')).toHaveValue('Lot 14, blue');
  await expect(page.getByText('No signal.')).toBeVisible();

  await page.getByRole('button', { name: 'Keep it' }).click();
  const waiting = page.getByRole('region', { name: 'Waiting for a signal' });
  await expect(waiting).toContainText('Lot 14, blue: walk away above $8,000');
  await page.reload();
  await expect(waiting).toContainText('Lot 14, blue');

  await context.setOffline(false);
  const row = page.getByRole('table', { name: 'Kept sheets' }).getByRole('row', { name: /Lot 14, blue/ });
  await expect(row).toHaveCount(1);
  await expect(row).toContainText('$8,000');
  await expect(waiting).toHaveCount(0);
});

test('what was typed waits in the browser, and goes when its person signs out', async ({ page }) => {
  const { shop } = await newShop(page);
  await page.goto(`${shop}/pre-bid`);
  await fill(page, 'Lot 3');
  await page.goto(`${shop}/year`);
  await page.goto(`${shop}/pre-bid`);
  await expect(page.getByLabel('What you call it')).toHaveValue('Lot 3');
  const ours = () =>
    page.evaluate(() => Object.keys(localStorage).filter((name) => name.startsWith('panelgap.')).length);
  expect(await ours()).toBeGreaterThan(1);
  await page.getByRole('button', { name: 'Sign out' }).click();
  await expect(page.getByLabel('Password')).toBeVisible();
  expect(await ours()).toBe(0);
});

test('a sheet is kept, changed and bought: it becomes a rebuild with its plan locked', async ({ page }) => {
  const { shop } = await newShop(page);
  await page.goto(`${shop}/pre-bid`);
  await fill(page, 'Lot 21');
  await page.getByRole('button', { name: 'Keep it' }).click();
  await expect(page).toHaveURL(/\/pre-bid\/[\w-]{22}$/);
  await expect(page.getByRole('button', { name: 'Bought it' })).toBeEnabled();
  await page.getByLabel('Sale expected').fill('12000');
  await expect(answerOn(page)).toHaveText('Walk away above $8,900.');
  await page.getByRole('button', { name: 'Keep changes' }).click();
  await page.getByRole('button', { name: 'Bought it' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Tag').fill('B-1');
  await dialog.getByLabel('The hammer fell at').fill('3,900');
  await dialog.getByRole('button', { name: 'Make it a rebuild' }).click();
  await expect(page).toHaveURL(/\/rebuilds\/[\w-]{22}$/);
  await expect(page.getByText('$2,100').first()).toBeVisible();
  await page.goto(`${shop}/pre-bids`);
  await expect(answerOn(page)).toHaveText('Of 1 sheet you bought 1 and let 0 go; 0 open.');
  await page.getByRole('link', { name: 'Lot 21' }).click();
  await expect(page.getByText('Bought: it is rebuild B-1 now.')).toBeVisible();
  await expect(page.getByLabel('Sale expected')).toBeDisabled();
});

test('a sheet let go keeps its reason', async ({ page }) => {
  const { shop } = await newShop(page);
  await page.goto(`${shop}/pre-bid`);
  await fill(page, 'Lot 22');
  await page.getByRole('button', { name: 'Keep it' }).click();
  await page.getByRole('button', { name: 'Not bought' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByText('Looked worse up close').click();
  await dialog.getByLabel('In words').fill('rust in the sills');
  await dialog.getByRole('button', { name: 'Keep that' }).click();
  await expect(page.getByText('Not bought: looked worse up close: rust in the sills.')).toBeVisible();
});

demoTest('the demo shop starts a plan from its past, and says what tends to surprise', async ({ page }) => {
  const shop = await signInToDemo(page);
  await page.setViewportSize({ width: 390, height: 780 });
  await page.goto(`${shop}/pre-bid`);
  await page.getByLabel('Class').selectOption('Small SUV');
  await page.getByLabel('Damage', { exact: true }).selectOption('Front');
  await page.getByText('No, from pictures').click();
  await page.getByRole('button', { name: /^Start from \d+ rebuilds$/ }).click();
  await page.getByLabel('Sale expected').fill('11600');
  await expect(answerOn(page)).toHaveText(/^Walk away above \$[\d,]+\.$/);
  await expect(page.getByText(/You usually end \d+% over, on \d+: \$/).first()).toBeVisible();
  await expect(page.getByRole('table', { name: 'The nearest past rebuilds' }).getByRole('link')).toHaveCount(3);
  await page.getByLabel('Notes').or(page.getByLabel('What you saw and were told')).first().scrollIntoViewIfNeeded();
  await expect(answerOn(page)).toBeInViewport();
  await expect(page.getByText('Your own surprises')).toBeVisible();
  await page.getByRole('checkbox', { name: /Radiator, condenser or fan/ }).check();
  const overflow = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
  expect(overflow).toBeLessThanOrEqual(0);
});
