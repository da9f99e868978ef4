// npm run shots [-- page …]: photographs every page into .shots/, the demo's and an empty shop's, on contact sheets too.
import { mkdirSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { type Browser, type BrowserContext, chromium } from 'playwright-core';
import { browser as launchOptions } from '../e2e/support/browser.ts';
import { startServer } from '../e2e/support/server.ts';
import { newShop, signInToDemo } from '../e2e/support/visitor.ts';
import { contactSheet } from './contact-sheet.ts';
import { PAGES } from './pages.ts';
import { SCHEMES, type Scheme, shoot } from './shoot.ts';

/** Whose shop is photographed: `enter` signs somebody in and resolves to the shop's address. */
const SETS: readonly { name: string; demo: boolean; enter: (context: BrowserContext) => Promise<string> }[] = [
  { name: 'demo', demo: true, enter: (context) => signInToDemo(context) },
  { name: 'empty', demo: false, enter: async (context) => (await newShop(context)).shop },
];
const WIDTHS = [1280, 768, 390];

const shots = fileURLToPath(new URL('../../.shots/', import.meta.url));
const wanted = process.argv.slice(2);
const pages = PAGES.filter(({ name }) => wanted.length === 0 || wanted.includes(name));
const names = pages.map(({ name }) => name);
const complaints = new Set<string>();

const browser = await chromium.launch(launchOptions());
try {
  for (const set of SETS) await shootSet(browser, set);
} finally {
  await browser.close();
}
for (const complaint of complaints) process.stdout.write(`! ${complaint}\n`);
process.stdout.write(`Pictures and contact sheets lie in .shots/; ${complaints.size} complaints.\n`);

async function shootSet(camera: Browser, set: (typeof SETS)[number]): Promise<void> {
  const server = await startServer({ demo: set.demo });
  try {
    const entrance = await camera.newContext({ baseURL: server.origin });
    const shop = await set.enter(entrance);
    const state = await entrance.storageState();
    await entrance.close();
    for (const width of WIDTHS) {
      const folder = (scheme: Scheme) => `${shots}${set.name}-${width}-${scheme}/`;
      for (const scheme of SCHEMES) {
        rmSync(folder(scheme), { recursive: true, force: true });
        mkdirSync(folder(scheme), { recursive: true });
      }
      const onComplaint = (text: string) => complaints.add(`${set.name} ${width} ${text}`);
      await shoot(camera, { origin: server.origin, shop, state, width, folder, onComplaint }, pages);
      for (const scheme of SCHEMES) {
        await contactSheet(camera, folder(scheme), names, `${shots}${set.name}-${width}-${scheme}.png`);
      }
      process.stdout.write(`${set.name} ${width}\n`);
    }
  } finally {
    await server.stop();
  }
}
