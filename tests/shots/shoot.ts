import type { Browser, BrowserContext, Page } from 'playwright-core';
import type { PageToShoot } from './pages.ts';

export const SCHEMES = ['light', 'dark'] as const;
export type Scheme = (typeof SCHEMES)[number];

export interface Setting {
  readonly origin: string;
  /** The shop's address, `/s/ID`. */
  readonly shop: string;
  /** Cookies of the person who is signed in. */
  readonly state: Awaited<ReturnType<BrowserContext['storageState']>>;
  readonly width: number;
  /** Where the pictures of a scheme go; ends with a slash. */
  readonly folder: (scheme: Scheme) => string;
  /** Gets every error and warning of the browser's console. */
  readonly onComplaint: (text: string) => void;
}

/** Photographs pages in full, one file for each and each scheme. */
export async function shoot(browser: Browser, setting: Setting, pages: readonly PageToShoot[]): Promise<void> {
  for (const isSignedOut of [true, false]) {
    const chosen = pages.filter((page) => (page.isSignedOut ?? false) === isSignedOut);
    if (chosen.length === 0) continue;
    const context = await browser.newContext({
      baseURL: setting.origin,
      viewport: { width: setting.width, height: setting.width < 600 ? 844 : 900 },
      reducedMotion: 'reduce',
      locale: 'en-US',
      ...(isSignedOut ? {} : { storageState: setting.state }),
    });
    const tab = await context.newPage();
    listen(tab, setting.onComplaint);
    for (const page of chosen) await shootPage(tab, setting, page);
    await context.close();
  }
}

async function shootPage(tab: Page, setting: Setting, page: PageToShoot): Promise<void> {
  await settle(tab, page.path.startsWith('/') ? page.path : `${setting.shop}/${page.path}`);
  if (page.follow) {
    const link = tab.locator(page.follow).first();
    if ((await link.count()) === 0) return;
    await settle(tab, (await link.getAttribute('href')) ?? '/');
  }
  const overflow = await tab.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  if (overflow > 0) setting.onComplaint(`${page.name}: ${overflow} px wider than the window of ${setting.width}`);
  for (const scheme of SCHEMES) {
    await tab.emulateMedia({ colorScheme: scheme });
    await tab.screenshot({ path: `${setting.folder(scheme)}${page.name}.png`, fullPage: true });
  }
}

async function settle(tab: Page, path: string): Promise<void> {
  await tab.goto(path);
  await tab.waitForLoadState('networkidle');
  await tab.evaluate(() => document.fonts.ready.then(() => undefined));
}

function listen(tab: Page, onComplaint: (text: string) => void): void {
  const where = () => new URL(tab.url()).pathname.replace(/^\/s\/[^/]+/, '');
  tab.on('pageerror', (error) => onComplaint(`${where()}: ${error.message}`));
  tab.on('console', (message) => {
    if (['error', 'warning'].includes(message.type())) onComplaint(`${where()}: ${message.text()}`);
  });
}
