import { existsSync, readFileSync } from 'node:fs';
import type { Browser } from 'playwright-core';

/** Lays the pictures of one folder (ends with a slash) out side by side, named, in one picture. */
export async function contactSheet(
  browser: Browser,
  folder: string,
  names: readonly string[],
  to: string,
): Promise<void> {
  const figures = names
    .filter((name) => existsSync(`${folder}${name}.png`))
    .map((name) => `<figure><figcaption>${name}</figcaption><img src="${asData(`${folder}${name}.png`)}"></figure>`);
  const page = await browser.newPage({ viewport: { width: 1800, height: 900 } });
  await page.setContent(`<style>${STYLE}</style>${figures.join('')}`);
  await page.screenshot({ path: to, fullPage: true });
  await page.close();
}

const STYLE = `
  body { margin: 16px; display: grid; grid-template-columns: repeat(4, 1fr); gap: 16px; background: #777; font: 16px sans-serif; }
  figure { margin: 0 } figcaption { color: #fff; margin-bottom: 4px } img { width: 100%; display: block }
`;

function asData(file: string): string {
  return `data:image/png;base64,${readFileSync(file, 'base64')}`;
}
