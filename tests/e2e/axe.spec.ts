import { PAGES, type PageToShoot } from '../shots/pages.ts';
import { findingsOn } from './support/axe.ts';
import { demoTest, expect, test } from './support/test.ts';
import { newShop, signInToDemo } from './support/visitor.ts';

const OWN = PAGES.filter((page) => !page.isSignedOut);
const ANSWERS = OWN.slice(0, 5);
const BOOKS = OWN.slice(5);

// The parts go to different workers.
test.describe.configure({ mode: 'parallel', timeout: 90_000 });

demoTest('axe finds nothing on the answers of a full shop', async ({ page }) => {
  expect(await findingsOn(page, await signInToDemo(page), ANSWERS)).toEqual([]);
});

demoTest('axe finds nothing in the books of a full shop', async ({ page }) => {
  expect(await findingsOn(page, await signInToDemo(page), BOOKS)).toEqual([]);
});

demoTest('axe finds nothing on what a mechanic and a partner see', async ({ page }) => {
  const mechanic: PageToShoot[] = [
    { name: 'board', path: 'rebuilds' },
    { name: 'own hours', path: 'hours' },
    { name: 'log hours', path: 'rebuilds', follow: 'main a[href*="rebuild="]' },
  ];
  const found = await findingsOn(page, await signInToDemo(page, 'mechanic'), mechanic);
  found.push(...(await findingsOn(page, await signInToDemo(page, 'partner'), [{ name: 'own', path: 'rebuilds' }])));
  expect(found).toEqual([]);
});

test('axe finds nothing before sign-in', async ({ page }) => {
  const doors = PAGES.filter((one) => one.isSignedOut);
  const dead = ['/join/no-such-invitation', '/nowhere'].map((path) => ({ name: path, path }));
  expect(await findingsOn(page, '', [...doors, ...dead])).toEqual([]);
});

test('axe finds nothing in an empty shop', async ({ page }) => {
  const { shop } = await newShop(page);
  const pages = OWN.filter((one) => !one.follow);
  expect(await findingsOn(page, shop, [...pages, { name: 'nowhere', path: 'nowhere' }])).toEqual([]);
});
