import AxeBuilder from '@axe-core/playwright';
import type { Page } from '@playwright/test';
import { expect, test } from './support/test.ts';

const PASSWORD = 'seven bent fenders in a row';

async function signUp(page: Page, name: string, shopName: string): Promise<void> {
  await page.goto('/');
  await page.getByRole('link', { name: 'Start a shop' }).click();
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel("Your shop's name").fill(shopName);
  await page.getByLabel('Email').fill(`${name.split(' ')[0]?.toLowerCase()}@people.example`);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Start the shop' }).click();
  await expect(page).toHaveURL(/\/s\/[\w-]{22}\/import$/);
}

async function invite(page: Page, email: string, role: string): Promise<string> {
  await page.getByRole('link', { name: 'People', exact: true }).click();
  await page.getByRole('button', { name: 'Invite someone' }).click();
  const dialog = page.getByRole('dialog', { name: 'Invite someone' });
  await dialog.getByLabel('Their email').fill(email);
  await dialog.getByLabel('Role').selectOption(role);
  await dialog.getByRole('button', { name: 'Make the link' }).click();
  const link = await page.getByLabel('Link', { exact: true }).inputValue();
  await page.getByRole('button', { name: 'Done' }).click();
  return link;
}

const places = (page: Page) => page.getByRole('navigation', { name: 'Places' }).getByRole('link');

test('a second person joins by a link; a change of role holds at their next step', async ({
  page,
  browser,
  baseURL,
}) => {
  await signUp(page, 'Olive Ames', 'Ames & Daughter');
  const link = await invite(page, 'mo@people.example', 'bookkeeper');
  expect(link).toMatch(new RegExp(`^${baseURL}/join/[\\w-]{43}$`));

  const context = await browser.newContext();
  const other = await context.newPage();
  await other.goto(link);
  await expect(other.getByRole('heading', { name: 'Join Ames & Daughter as bookkeeper' })).toBeVisible();
  await other.getByLabel('Your name').fill('Mo Reyes');
  await other.getByLabel('Password').fill(PASSWORD);
  await other.getByRole('button', { name: 'Join Ames & Daughter' }).click();
  await expect(places(other).filter({ hasText: 'Year' })).toBeVisible();

  await page.reload();
  await page.getByLabel('Role of Mo Reyes').selectOption('mechanic');
  await page.getByRole('button', { name: 'Make Mo Reyes mechanic' }).click();
  await expect(page.getByText('Mo Reyes is now mechanic')).toBeVisible();

  await places(other).filter({ hasText: 'Ledger' }).click();
  const ended = other.getByRole('dialog', { name: 'Your session ended' });
  await expect(ended.getByLabel('Email')).toHaveValue('mo@people.example');
  await ended.getByLabel('Password').fill(PASSWORD);
  await ended.getByRole('button', { name: 'Sign in' }).click();
  await expect(places(other)).toHaveText(['Rebuilds', 'Hours']);
  await context.close();
});

test('a link works once, and not at all when it is withdrawn', async ({ page, browser }) => {
  await signUp(page, 'Pia Lund', 'Lund Salvage');
  const link = await invite(page, 'ned@people.example', 'accountant');
  await page.getByRole('button', { name: 'Withdraw the invitation of ned@people.example' }).click();
  await expect(page.getByText('None. Who is invited and has not joined yet stands here.')).toBeVisible();

  const context = await browser.newContext();
  const other = await context.newPage();
  await other.goto(link);
  await expect(other.getByRole('heading', { name: 'This invitation no longer works' })).toBeVisible();
  await context.close();
});

for (const colorScheme of ['light', 'dark'] as const) {
  test(`axe finds nothing on people and shop, ${colorScheme}`, async ({ page }) => {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await signUp(page, colorScheme === 'light' ? 'Lia Dunn' : 'Dov Lentz', 'Two Bays');
    await invite(page, 'someone@people.example', 'partner');
    await expect(page.getByText('someone@people.example', { exact: true })).toBeVisible();
    expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);
    await page.getByRole('link', { name: 'Shop', exact: true }).click();
    await expect(page.getByRole('list', { name: 'Categories in use' })).toBeVisible();
    await expect(page.getByRole('button', { name: 'Save the shop' })).toBeVisible();
    expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);
  });
}
