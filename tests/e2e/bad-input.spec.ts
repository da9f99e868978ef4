import { deflateSync } from 'node:zlib';
import type { Page } from '@playwright/test';
import { rebuildSchema } from '#shared/contracts/rebuilds.ts';
import { answerOn, sendFile } from './support/books.ts';
import { pick, tabTo, typeDay } from './support/keyboard.ts';
import { expect, test } from './support/test.ts';
import { newShop, PASSWORD } from './support/visitor.ts';

/** The start of a picture and something compressed, as a camera's file begins. */
const PICTURE = Buffer.concat([
  Buffer.from('\x89PNG\r\n\x1a\n\0\0\0\rIHDR', 'latin1'),
  deflateSync(Buffer.alloc(4000, 7)),
]);

const REFUSED = [
  {
    what: 'a picture named .csv',
    name: 'photo.csv',
    buffer: PICTURE,
    says: /picture|no spreadsheet|not a spreadsheet/i,
  },
  { what: 'an empty file', name: 'empty.csv', buffer: Buffer.alloc(0), says: /empty/i },
  {
    what: 'a file of nothing but headings',
    name: 'headings.csv',
    buffer: Buffer.from('Date,Car,What for,Paid\n'),
    says: /no rows|nothing below|holds no|heading/i,
  },
];

for (const { what, name, buffer, says } of REFUSED) {
  test(`${what} is refused with its reason, and nothing is booked`, async ({ page }) => {
    const { shop } = await newShop(page);
    await sendFile(page, shop, { name, mimeType: 'text/csv', buffer });
    await expect(page.locator('main').getByText(says).first()).toBeVisible();
    await expect(page.getByRole('button', { name: /^Book/ })).toHaveCount(0);
    await page.goto(`${shop}/rebuilds`);
    await expect(
      page.getByRole('heading', { name: 'Every vehicle from purchase to sale will stand here' }),
    ).toBeVisible();
  });
}

test('a day that does not exist and an amount that nobody can read are said at their fields; nothing typed is lost', async ({
  page,
}) => {
  const { shop } = await newShop(page);
  await page.goto(`${shop}/ledger`);
  const form = page.getByRole('form', { name: 'Add an entry' });
  const day = form.getByLabel('Day');
  const amount = form.getByLabel('Amount');
  await tabTo(page, day);
  await typeDay(page, '2026-02-30');
  await tabTo(page, form.getByLabel('Category'));
  await pick(page, 'parts');
  await tabTo(page, amount);
  await page.keyboard.type('12,34,56.7.8');
  await form.getByLabel('What').fill('door, left');
  await page.keyboard.press('Enter');
  await expect(day).toHaveAccessibleDescription('Give a day that exists, between 1950 and 2100.');
  await expect(day).toHaveAttribute('aria-invalid', 'true');
  await expect(amount).toHaveAccessibleDescription(/“12,34,56.7.8” cannot be read as an amount/);
  await expect(amount).toHaveValue('12,34,56.7.8');
  await expect(form.getByLabel('What')).toHaveValue('door, left');
  await expect(answerOn(page)).toHaveText('Nothing is in the ledger yet.');
  await day.fill('2026-02-28');
  await amount.fill('56.78');
  await page.keyboard.press('Enter');
  await expect(answerOn(page)).toHaveText('1 entry comes to $56.78.');
  await expect(page.getByRole('table', { name: 'Entries' })).toContainText('28 Feb 2026');
});

test('a session that ends in the middle of a form: sign in over the page, nothing typed is lost, saving works', async ({
  page,
}) => {
  const { shop } = await newShop(page);
  const id = await addRebuild(page, 'B-1');
  await page.goto(`${shop}/rebuilds/${id}`);
  const lessons = page.getByLabel('Lessons');
  await lessons.fill('Look under the carpet first.');
  await page.request.delete('/api/session');
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await signInOver(page);
  await expect(lessons).toHaveValue('Look under the carpet first.');
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await expect(page.getByRole('button', { name: 'Save', exact: true })).toBeHidden();
  await page.reload();
  await expect(lessons).toHaveValue('Look under the carpet first.');
});

test('a line of the ledger that meets an ended session waits, and is saved once after signing in', async ({ page }) => {
  const { shop } = await newShop(page);
  await page.goto(`${shop}/ledger`);
  const form = page.getByRole('form', { name: 'Add an entry' });
  await tabTo(page, form.getByLabel('Category'));
  await pick(page, 'supplies');
  await form.getByLabel('Amount').fill('21.40');
  await page.request.delete('/api/session');
  await page.keyboard.press('Enter');
  await signInOver(page);
  await page.getByRole('button', { name: /again/i }).click();
  await expect(answerOn(page)).toHaveText('1 entry comes to $21.40.');
});

test('an address of another shop shows nothing of it', async ({ page, browser, baseURL }) => {
  const { shop } = await newShop(page);
  const id = await addRebuild(page, 'SECRET-1');
  const other = await browser.newPage({ baseURL: baseURL ?? '' });
  const own = await newShop(other);
  for (const path of ['ledger', 'year', `rebuilds/${id}`]) {
    await other.goto(`${shop}/${path}`);
    await expect(other.getByRole('heading', { name: 'Nothing stands at this address' })).toBeVisible();
  }
  await other.goto(`${own.shop}/rebuilds/${id}`);
  await expect(other.getByRole('alert').filter({ hasText: /./ })).toBeVisible();
  await expect(other.locator('body')).not.toContainText('SECRET-1');
  await other.close();
});

async function addRebuild(page: Page, tag: string): Promise<string> {
  const reply = await page.request.post('/api/rebuilds', {
    data: { tag },
    headers: { 'Idempotency-Key': crypto.randomUUID() },
  });
  return rebuildSchema.parse(await reply.json()).id;
}

async function signInOver(page: Page): Promise<void> {
  const dialog = page.getByRole('dialog', { name: 'Your session ended' });
  await dialog.getByLabel('Password', { exact: true }).fill(PASSWORD);
  await dialog.getByRole('button', { name: 'Sign in' }).click();
  await expect(dialog).toBeHidden();
}
