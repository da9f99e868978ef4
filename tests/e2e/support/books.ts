import { expect, type Locator, type Page } from '@playwright/test';

/** A figure in a table: the cell of a column in the row of a name. Both as they are headed. */
export async function figure(page: Page, caption: string, row: string | RegExp, column: string): Promise<string> {
  const table = page.getByRole('table', { name: caption, exact: true });
  const cells = rowOf(table, row).locator('th, td');
  await cells.first().waitFor();
  const columns = (await table.getByRole('columnheader').allInnerTexts()).map((text) => text.trim());
  if (!columns.includes(column)) throw new Error(`No column ${column} in ${columns.join(', ')}`);
  return (await cells.nth(columns.indexOf(column)).innerText()).trim();
}

/** The row of a table that is headed so: the whole head for a text, a part of it for a pattern. */
export function rowOf(table: Locator, head: string | RegExp): Locator {
  const header = table.page().getByRole('rowheader', { name: head, exact: typeof head === 'string' });
  return table.getByRole('row').filter({ has: header });
}

/** The answer that stands under a page's question. */
export const answerOn = (page: Page) => page.locator('main .answer').first();

type File = Parameters<Locator['setInputFiles']>[0];

/** Chooses a file on the import page. */
export async function sendFile(page: Page, shop: string, file: File): Promise<void> {
  await page.goto(`${shop}/import`);
  await page.getByLabel('File to bring in').setInputFiles(file);
}

/** Brings a file to the point where it was read and nothing is booked. */
export async function readFile(page: Page, shop: string, file: File): Promise<void> {
  await sendFile(page, shop, file);
  await expect(page.getByRole('button', { name: 'Drop this file' })).toBeVisible();
}

/** Books a file that was read. */
export async function book(page: Page): Promise<void> {
  await page.getByRole('button', { name: /^Book \d+ rows$/ }).click();
  await expect(page.getByRole('button', { name: 'Take it out again' })).toBeVisible();
}
