import type { Page } from '@playwright/test';
import { answerOn } from './support/books.ts';
import { demoTest as test, expect } from './support/test.ts';
import { signInToDemo } from './support/visitor.ts';

/** Pages of the PDF that a part of the page prints to. */
async function pagesPrinted(page: Page, part: 'card' | 'sheet'): Promise<number> {
  await page.evaluate((name) => {
    document.documentElement.dataset['print'] = name;
  }, part);
  const pdf = (await page.pdf({ format: 'Letter' })).toString('latin1');
  await page.evaluate(() => delete document.documentElement.dataset['print']);
  return pdf.match(/\/Type\s*\/Page\b/g)?.length ?? 0;
}

test('a rule through its year: adopt it, put it on paper, look back, keep the one before', async ({ page }) => {
  await page.goto(`${await signInToDemo(page)}/contingency`);
  await page.locator('label', { hasText: 'Percentage and sum' }).click();
  await expect(page).toHaveURL(/[?&]rule=two-part/);
  await expect(answerOn(page)).toContainText('for surprises');

  await page.getByRole('button', { name: /^Adopt \d+% and \$[\d,]+ for 2027$/ }).click();
  const dialog = page.getByRole('dialog', { name: 'Adopt a rule' });
  await dialog.getByLabel('Percent on top of the estimate').fill('30');
  await dialog.getByLabel('For surprises, on top of that').fill('1,500');
  await dialog.getByRole('button', { name: 'Adopt 30% and $1,500 for 2027' }).click();
  await expect(dialog).toBeHidden();
  await expect(page.getByText(/^In force for 2027: 30% and \$1,500/)).toBeVisible();

  expect(await pagesPrinted(page, 'card')).toBe(1);
  expect(await pagesPrinted(page, 'sheet')).toBe(1);
  await page.emulateMedia({ media: 'print' });
  await page.evaluate(() => {
    document.documentElement.dataset['print'] = 'card';
  });
  // A bank card's size, within a pixel: 85.6 by 54 mm at 96 dots an inch.
  const face = await page.locator('.print-card-face').first().boundingBox();
  expect(face?.width).toBeCloseTo((85.6 / 25.4) * 96, 0);
  expect(face?.height).toBeCloseTo((54 / 25.4) * 96, 0);
  await expect(page.locator('.print-card')).toContainText('+ 30% and $1,500');
  await page.emulateMedia({ media: 'screen' });
  await page.reload();

  await page.getByRole('link', { name: 'Did the last rule hold?' }).click();
  await expect(page).toHaveURL(/\/contingency\/review$/);
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Did the rule hold?');
  await expect(answerOn(page)).toHaveText(/The rule for 2026 held \d+ of \d+, where about \d+ were to be expected: /);
  await page.getByRole('button', { name: /^Keep \d+% for 2027$/ }).click();
  const rows = page.getByRole('table', { name: 'Rules adopted' }).getByRole('row', { name: /^2027/ });
  await expect(rows.first()).toContainText(/kept after 2026 held \d+ of \d+/);
  await expect(rows.nth(1)).toContainText('30% and $1,500');
  await expect(rows.nth(1)).toContainText('replaced');
  await expect(page.getByRole('figure').filter({ hasText: 'All rules together held' })).toBeVisible();
});

test('a car asks for its own rule, and says on which rebuilds that rests', async ({ page }) => {
  await page.goto(`${await signInToDemo(page)}/contingency`);
  const panel = page.locator('section.panel', { hasText: 'What does such a car ask for?' });
  await expect(panel).toContainText(/Based on \d+ rebuilds all together/);
  await panel.getByLabel('Seen before buying').selectOption('seen');
  await expect(panel).toContainText(/Based on \d+ rebuilds seen or unseen alike/);
  const seen = await panel.locator('li').first().innerText();
  await panel.getByLabel('Seen before buying').selectOption('unseen');
  await expect(panel.locator('li').first()).not.toHaveText(seen);
  await panel.getByText('Why these rebuilds').click();
  await expect(panel.getByRole('table', { name: 'Groups of past rebuilds tried' })).toContainText('taken:');
});
