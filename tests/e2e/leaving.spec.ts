import { demoTest as test, expect } from './support/test.ts';
import { signInToDemo } from './support/visitor.ts';

test('what is typed and not saved survives a link, the way back and a wrong press', async ({ page }) => {
  const shop = await signInToDemo(page);
  await page.goto(`${shop}/rebuilds`);
  await page.getByRole('table', { name: 'Rebuilds', exact: true }).getByRole('link').first().click();
  const lessons = page.getByLabel('Lessons for the next one');
  await lessons.fill('Mind the sills.');
  const here = page.url();
  const stay = page.getByRole('button', { name: 'Stay here' });

  await page.getByRole('link', { name: 'Ledger' }).first().click();
  await stay.click();
  await page.evaluate(() => history.back());
  await stay.click();
  expect(page.url()).toBe(here);
  await expect(lessons).toHaveValue('Mind the sills.');

  await page.evaluate(() => history.back());
  await page.getByRole('dialog').getByRole('button', { name: 'Leave', exact: true }).click();
  await expect(page).toHaveURL(/\/rebuilds$/);
  await page.goForward();
  await expect(page).toHaveURL(here);
  await expect(lessons).not.toHaveValue('Mind the sills.');
});
