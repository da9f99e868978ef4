import type { Page } from '@playwright/test';
import { figure } from './support/books.ts';
import { demoTest as test, expect } from './support/test.ts';
import { signInToDemo } from './support/visitor.ts';

/**
 * What the demo shop holds for whoever looks: each lesson is read off a page that is at most two clicks from signing in.
 * The figures come from the demo's seed; a lesson is tested by what it says, its figures by their order.
 */

/** Signs in, which lands on the year, and goes where the rail says: one click. */
async function open(page: Page, place: string): Promise<void> {
  await page.goto(await signInToDemo(page));
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Did the work pay this year?');
  await page.getByRole('navigation').getByRole('link', { name: place, exact: true }).click();
}

const amount = (text: string) => Number(text.replace('−', '-').replaceAll(/[^\d.-]/g, ''));

test('it is not the front hit, it is the unseen bid', async ({ page }) => {
  await open(page, 'Overruns');
  const split = page.getByRole('heading', { name: 'Is it the damage, or the bid without a look?' });
  await expect(split).toBeVisible();
  await expect(page.getByText(/^Front damage ran \+\d+%/)).toContainText(
    'In both the unseen bid runs further over; that front damage differs from the rest could be luck.',
  );
  for (const row of ['Front damage', 'All other damage']) {
    const seen = await figure(page, 'Damage split by seen', row, 'Overrun, seen');
    const unseen = await figure(page, 'Damage split by seen', row, 'Overrun, unseen');
    expect(Number.parseInt(unseen, 10)).toBeGreaterThan(Number.parseInt(seen, 10));
  }
  await expect(page.getByText(/^Cars seen before|Cars seen before buying ran/)).toContainText(/points\): hardly luck/);
});

test('flood is only good in the old sheet', async ({ page }) => {
  await open(page, 'What pays');
  const flood = (column: string) => figure(page, 'What the old sheet would have said', 'Flood damage', column);
  expect(await flood('Old rank')).toBe('1');
  expect(amount(await flood('Old sheet, a rebuild'))).toBeGreaterThan(4 * amount(await flood('Kept, a rebuild')));
  expect(Number(await flood('Rank, kept'))).toBeGreaterThanOrEqual(4);
  expect(Number(await flood('Rank here'))).toBeGreaterThanOrEqual(4);
  expect(await flood('Still unsold')).toBe('1');
});

test('by the hour the league turns over', async ({ page }) => {
  await open(page, 'What pays');
  const hail = (column: string) => figure(page, 'What the old sheet would have said', 'Hail damage', column);
  expect(await hail('Old rank')).toBe('4');
  expect(await hail('Rank here')).toBe('1');
  await expect(page.locator('main .answer').first()).toHaveText(/^Hail damage pays best, at \$\d+ an hour/);
});

test('am I getting better? The hours are not, and the money could be luck', async ({ page }) => {
  await open(page, 'Overruns');
  const verdict = (row: string) => figure(page, 'Is it getting better?', row, 'So');
  expect(await verdict('Overrun of the hours')).not.toBe('getting better');
  expect(await verdict('Overrun of the money')).toBe('could be luck');
  await page.getByRole('navigation').getByRole('link', { name: 'Year', exact: true }).click();
  expect(await verdict('Kept a rebuild')).toBe('could be luck');
});

test('paint took a step in 2024, so a figure over all years is stale', async ({ page }) => {
  await open(page, 'Overruns');
  await page.getByText('Each category, year by year', { exact: true }).click();
  const paint = async (year: string) =>
    Number.parseInt(await figure(page, 'Overrun of each category by year', /^Outside labor/, year), 10);
  const [before, step, after] = [await paint('2023'), await paint('2024'), await paint('2025')];
  expect(step).toBeGreaterThan(2 * before);
  expect(step).toBeGreaterThan(after);
});

test('the headline: an old sheet, the whole books, and after a wage for own hours', async ({ page }) => {
  await open(page, 'What pays');
  const line = page.getByText(/^An old sheet, with sold ones only/);
  await expect(line).toHaveText(/would have said \$3,\d{3} a rebuild/);
  await expect(line).toContainText(/Every bill and every way out leave \$1,\d{3}/);
  await expect(line).toContainText(/after \$25 for each own hour, −\u2060?\$\d{3}\./);
  await page.getByRole('link', { name: 'Count this page so' }).click();
  await expect(page.getByRole('status').filter({ hasText: 'Counted as an old sheet would' })).toBeVisible();
  await expect(page).toHaveURL(/[?&]exits=sold/);
});
