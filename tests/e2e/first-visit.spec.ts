import { gzipSync } from 'node:zlib';
import { expect, test } from './support/test.ts';

// The goal of the first issue: what a visitor who is not signed in must load before the form is there.
const BUDGET_BYTES = 115_000;

test('the first visit, signed out, loads at most 115 kB of JavaScript', async ({ page }) => {
  const scripts: Promise<[string, number]>[] = [];
  page.on('response', (response) => {
    const isScript = /javascript/.test(response.headers()['content-type'] ?? '');
    if (isScript) scripts.push(response.body().then((body) => [response.url(), gzipSync(body).length]));
  });
  await page.goto('/');
  await expect(page.getByLabel('Password')).toBeVisible();
  await page.waitForLoadState('networkidle');
  const sizes = await Promise.all(scripts);
  const total = sizes.reduce((sum, [, bytes]) => sum + bytes, 0);
  expect(total, 'scripts were seen').toBeGreaterThan(10_000);
  expect(total, sizes.map(([url, bytes]) => `${bytes} ${url}`).join('\n')).toBeLessThanOrEqual(BUDGET_BYTES);
});

test.describe('before any script', () => {
  test.use({ javaScriptEnabled: false });

  test('the shell is painted', async ({ page }) => {
    await page.goto('/');
    await expect(page.locator('#root').getByText('Panelgap', { exact: true })).toBeVisible();
  });
});

test('the page holds no inline script or style, which the content policy would refuse', async ({ request }) => {
  const html = await (await request.get('/')).text();
  expect(html).toContain('<script');
  expect(html).not.toMatch(/<script(?![^>]*\bsrc=)/);
  expect(html).not.toMatch(/<style|\sstyle=/);
});
