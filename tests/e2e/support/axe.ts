import { createRequire } from 'node:module';
import { expect, type Page } from '@playwright/test';
import type axeCore from 'axe-core';
import type { PageToShoot } from '../../shots/pages.ts';

declare const axe: typeof axeCore;

const SCRIPT = createRequire(import.meta.url).resolve('axe-core/axe.min.js');
const WIDTHS = [1280, 390];
const SCHEMES = ['light', 'dark'] as const;

/** What axe finds on pages at both widths and in both schemes, one line each. Every page is loaded once. */
export async function findingsOn(page: Page, shop: string, pages: readonly PageToShoot[]): Promise<string[]> {
  const found: string[] = [];
  // Loaded with each page, outside its content policy: putting the script in for every look would cost more than the looks.
  await page.addInitScript({ path: SCRIPT });
  for (const one of pages) {
    await page.setViewportSize({ width: WIDTHS[0] ?? 0, height: 900 });
    await open(page, shop, one);
    found.push(...(await findings(page)));
  }
  return found;
}

/** What axe finds on the page as it stands. */
async function findings(page: Page): Promise<string[]> {
  const found: string[] = [];
  for (const width of WIDTHS) {
    await page.setViewportSize({ width, height: 900 });
    for (const scheme of SCHEMES) {
      await page.emulateMedia({ colorScheme: scheme, reducedMotion: 'reduce' });
      const lines = await page.evaluate(look, scheme === 'dark');
      found.push(...lines.map((line) => `${new URL(page.url()).pathname} ${width} ${scheme} ${line}`));
    }
  }
  return found;
}

/** Runs in the browser. The schemes differ in nothing but colors, so in the second one only colors are looked at again. */
async function look(onlyColors: boolean): Promise<string[]> {
  const rules = { type: 'rule', values: ['color-contrast', 'link-in-text-block'] } as const;
  const { violations } = await axe.run(document, {
    resultTypes: ['violations'],
    ...(onlyColors ? { runOnly: { type: rules.type, values: [...rules.values] } } : {}),
  });
  return violations.flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.html.slice(0, 200)}`));
}

async function open(page: Page, shop: string, { path, follow }: PageToShoot): Promise<void> {
  await page.goto(path.startsWith('/') ? path : `${shop}/${path}`);
  if (follow) await page.goto((await page.locator(follow).first().getAttribute('href')) ?? '');
  await expect(page.locator('main h1').first()).toBeAttached();
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0);
  // A chart paints once it knows its width; until then its frame is empty.
  await expect(page.locator('figure > div:empty')).toHaveCount(0);
}
