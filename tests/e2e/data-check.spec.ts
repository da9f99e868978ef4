import { demoTest as test, expect } from './support/test.ts';
import { signInToDemo } from './support/visitor.ts';

test('the data check leads to a fault of the demo, and what is found right leaves the list', async ({ page }) => {
  const shop = await signInToDemo(page);
  await page.goto(`${shop}/data-check`);
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('What in the books would bend an answer?');
  const wrong = page.locator('section', { has: page.getByRole('heading', { name: 'Figures may be wrong' }) });
  await wrong.getByText('More than twelve hours in one day').click();
  const item = wrong.locator('details[open] li').first();
  await expect(item).toContainText('14 hours');
  await item.getByRole('link').click();
  await expect(page).toHaveURL(/\/hours\?rebuild=[\w-]{22}&from=/);
  await expect(page.getByRole('table').getByText('14').first()).toBeVisible();
  await page.goBack();

  const clock = page.locator('li', { has: page.getByText('More than twelve hours in one day') }).last();
  await clock.locator('summary').click();
  await clock.getByRole('button', { name: /is right as it is$/ }).click();
  const settled = page.locator('section', { has: page.getByRole('heading', { name: 'Said to be right' }) });
  await settled.getByText('More than twelve hours in one day').click();
  await settled.getByRole('button', { name: /^Look at .* again$/ }).click();
  await expect(wrong.getByText('More than twelve hours in one day')).toBeVisible();
});
