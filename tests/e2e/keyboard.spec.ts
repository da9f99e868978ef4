import { tabTo } from './support/keyboard.ts';
import { demoTest as test, expect } from './support/test.ts';
import { signInToDemo } from './support/visitor.ts';

test('the first Tab leads past the rail to the page', async ({ page }) => {
  await page.goto(`${await signInToDemo(page)}/ledger`);
  await expect(page.getByRole('form', { name: 'Add an entry' })).toBeVisible();
  await page.keyboard.press('Tab');
  const skip = page.getByRole('link', { name: 'To the page' });
  await expect(skip).toBeFocused();
  await expect(skip).toBeInViewport();
  await page.keyboard.press('Enter');
  await expect(page.locator('#main')).toBeFocused();
  await page.keyboard.press('Tab');
  expect(await page.evaluate(() => document.activeElement?.closest('main') !== null)).toBe(true);
});

test('Ctrl-K finds a rebuild by a piece of its name and opens it', async ({ page }) => {
  await page.goto(`${await signInToDemo(page)}/year`);
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  await page.keyboard.press('Control+k');
  const find = page.getByRole('combobox', { name: 'Find a rebuild, a page or an action' });
  await expect(find).toBeFocused();
  await page.keyboard.type('B-058');
  await expect(page.getByRole('option')).toHaveCount(1);
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL(/\/rebuilds\/[\w-]{22}$/);
  await expect(page.locator('main')).toContainText('B-058');
});

test('`?` lists the keys, those of the page first, but stays a letter where someone types', async ({ page }) => {
  await page.goto(`${await signInToDemo(page)}/ledger`);
  const what = page.getByRole('form', { name: 'Add an entry' }).getByLabel('What');
  await what.focus();
  await page.keyboard.type('?');
  await expect(what).toHaveValue('?');
  const keys = page.getByRole('dialog', { name: 'Keys' });
  await expect(keys).toBeHidden();
  await page.getByRole('heading', { level: 1 }).click();
  await page.keyboard.press('Shift+?');
  await expect(keys).toBeVisible();
  await expect(keys.getByRole('heading')).toHaveText(['Keys', 'On this page', 'Everywhere']);
  await page.keyboard.press('Escape');
  await expect(keys).toBeHidden();
});

test('whatever Tab reaches shows that it has the focus', async ({ page }) => {
  const shop = await signInToDemo(page);
  for (const path of ['year', 'ledger', 'shop']) {
    await page.goto(`${shop}/${path}`);
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    await expect(page.locator('[aria-busy="true"]')).toHaveCount(0);
    for (let presses = 0; presses < 40; presses++) {
      await page.keyboard.press('Tab');
      expect(await page.evaluate(unmarkedFocus), `on ${path}, after ${presses + 1} tabs`).toBeNull();
    }
  }
});

test('a picture is one stop: arrows go from rebuild to rebuild, Enter opens one', async ({ page }) => {
  await page.goto(`${await signInToDemo(page)}/year`);
  const points = page.getByRole('group', { name: /arrow keys move/ }).locator('.chart-point');
  await tabTo(page, points.first());
  await page.keyboard.press('End');
  await expect(points.last()).toBeFocused();
  await expect(page.locator('.chart-tip')).toBeVisible();
  for (let back = 0; back < 12 && !(await page.evaluate(() => document.activeElement?.matches('a'))); back++) {
    await page.keyboard.press('ArrowLeft');
  }
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL(/\/rebuilds\/[\w-]{22}$/);
});

/** The focused element, if neither it, a part of it nor the frame around it looks any different for the focus. */
function unmarkedFocus(): string | null {
  const element = document.activeElement;
  if (!element || element === document.body) return null;
  const isMarked = (one: Element) => {
    const { outlineStyle, outlineWidth, boxShadow } = getComputedStyle(one);
    return (outlineStyle !== 'none' && Number.parseFloat(outlineWidth) > 0) || boxShadow !== 'none';
  };
  const candidates = [element, element.parentElement, ...element.querySelectorAll('*')];
  const isRinged =
    element.matches('.chart-point') &&
    getComputedStyle(element.querySelector('.chart-ring') ?? element).opacity !== '0';
  return isRinged || candidates.some((one) => one && isMarked(one)) ? null : element.outerHTML.slice(0, 200);
}
