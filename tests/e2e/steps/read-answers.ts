import { expect, type Page } from '@playwright/test';
import { dollars, percent } from '../support/as-shown.ts';
import { answerOn, figure, rowOf } from '../support/books.ts';
import {
  type Car,
  keptOf,
  middleDaysHeld,
  overruns,
  plannedOf,
  sold,
  soldIn,
  sum,
  tiedUp,
} from '../support/worked-out.ts';
import { cars } from './facts.ts';

/** What was kept, by the hour and year by year. */
export async function readYear(page: Page, shop: string, all: readonly Car[]): Promise<void> {
  await page.goto(`${shop}/year?year=2019`);
  const own = soldIn(all, 2019);
  const hours = sum(own.map((car) => car.hours ?? 0));
  const kept = sum(own.map(keptOf));
  await expect(answerOn(page)).toHaveText(
    `Two sold rebuilds kept ${dollars(kept)}: ${dollars(Math.round(kept / hours))} for each of your ${hours} hours.`,
  );
  for (const year of [2018, 2019, 2020]) {
    const left = soldIn(all, year);
    const row = rowOf(page.getByRole('table', { name: 'All years' }), `${year}`);
    await expect(row.getByRole('cell').nth(0)).toHaveText(`${left.length}`);
    expect(await figure(page, 'All years', `${year}`, 'Kept')).toBe(
      left.length ? dollars(sum(left.map(keptOf))) : '$0',
    );
  }
}

/** All finished cars together, and by own hour. */
export async function readWhatPays(page: Page, shop: string): Promise<void> {
  await page.goto(`${shop}/what-pays`);
  const all = sold(cars);
  const kept = sum(all.map(keptOf));
  const shown = (what: string) => figure(page, 'All finished rebuilds together', what, 'Figure');
  await expect(answerOn(page)).toContainText(`all together kept ${dollars(kept)} so far.`);
  expect(await shown('Sold for, or brought otherwise')).toBe(dollars(sum(all.map((car) => car.saleCents))));
  expect(await shown('Purchase')).toBe(dollars(sum(all.map((car) => car.purchaseCents))));
  expect(await shown('Work: every entry on them')).toBe(dollars(sum(all.map((car) => car.costsCents))));
  expect(await shown('Kept, before overhead')).toBe(dollars(kept));
  expect(await shown('Lost money')).toBe(`${all.filter((car) => keptOf(car) < 0).length} of ${all.length}`);
  const known = all.filter((car) => car.hours !== null);
  const perHour = sum(known.map(keptOf)) / sum(known.map((car) => car.hours ?? 0));
  expect(await figure(page, 'Profit per hour in three views', /^By own hour/, 'Figure')).toBe(
    `${dollars(Math.round(perHour))}/h`,
  );
}

/** Against the plans, all together and for parts. */
export async function readOverruns(page: Page, shop: string): Promise<void> {
  await page.goto(`${shop}/overruns`);
  const all = sold(cars).filter((car) => plannedOf(car) > 0);
  const planned = sum(all.map(plannedOf));
  const actual = sum(all.map((car) => car.costsCents));
  await expect(answerOn(page)).toContainText(
    `All together the work comes in ${percent((actual - planned) / planned)} over the locked estimates`,
  );
  expect(await figure(page, 'Overrun by category', /^All together/, 'Planned')).toBe(dollars(planned));
  expect(await figure(page, 'Overrun by category', /^All together/, 'Actual')).toBe(dollars(actual));
  const parts = all.filter((car) => (car.planned['parts'] ?? 0) > 0);
  expect(await figure(page, 'Overrun by category', /^parts$/i, 'Planned')).toBe(
    dollars(sum(parts.map((car) => car.planned['parts'] ?? 0))),
  );
  expect(await figure(page, 'Overrun by category', /^parts$/i, 'Actual')).toBe(
    dollars(sum(parts.map((car) => car.spent['parts'] ?? 0))),
  );
}

/** One car is given a day of listing first. */
export async function readTimeToSell(page: Page, shop: string): Promise<void> {
  // The sheets know no day of listing, so one is added: TC-08, sold on 28 February 2019, 59 days later.
  await page.goto(`${shop}/rebuilds`);
  await page.getByRole('table', { name: 'Rebuilds' }).getByRole('link', { name: /TC-08/ }).click();
  await page.getByLabel('Listed', { exact: true }).fill('2018-12-31');
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await expect(page.getByRole('button', { name: 'Save', exact: true })).toBeHidden();
  await page.goto(`${shop}/time-to-sell`);
  await expect(answerOn(page)).toHaveText(/with one sale so far, half were gone within 59 days of being listed/);
  await expect(page.locator('main')).toContainText(`in hand hold ${dollars(tiedUp(cars))}`);
  expect(await figure(page, 'Days in each stage', /^Held, all in all/, 'Typical')).toBe(`${middleDaysHeld(cars)} days`);
}

/** The percentage at two levels; that of four in five is adopted. */
export async function adoptRule(page: Page, shop: string): Promise<void> {
  // Of n known overruns the k-th smallest holds p times in q: k = ceil((n + 1) · p/q), raised to the next whole percent.
  const known = overruns(cars);
  const asked = (p: number, q: number) =>
    `${Math.ceil(100 * (known[Math.ceil(((known.length + 1) * p) / q) - 1] ?? 0))}%`;
  await page.goto(`${shop}/contingency?level=2-3`);
  await expect(answerOn(page)).toContainText(`Add ${asked(2, 3)} to the repair estimate`);
  await page.goto(`${shop}/contingency`);
  await expect(answerOn(page)).toContainText(`Add ${asked(4, 5)} to the repair estimate`);
  const adopt = { name: new RegExp(`^Adopt ${asked(4, 5)} for \\d{4}$`) };
  await page.getByRole('button', adopt).click();
  const dialog = page.getByRole('dialog', { name: 'Adopt a rule' });
  await dialog.getByRole('button', adopt).click();
  await expect(dialog).toBeHidden();
  await expect(page.getByText(new RegExp(`^In force for \\d{4}: ${asked(4, 5)}`))).toBeVisible();
  await page.goto(`${shop}/contingency/review`);
  await expect(page.getByRole('table', { name: 'Rules adopted' })).toContainText(asked(4, 5));
}
