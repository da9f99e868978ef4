import { PAGES, type PageToShoot } from '../shots/pages.ts';
import { findingsOn } from './support/axe.ts';
import { demoTest, expect, test } from './support/test.ts';
import { newShop, signInToDemo } from './support/visitor.ts';

const OWN = PAGES.filter((page) => !page.isSignedOut);

// The parts go to different workers.
test.describe.configure({ mode: 'parallel', timeout: 120_000 });

/** Pages a few at a time, and what they are called together. */
function parts(pages: readonly PageToShoot[], size: number): { names: string; part: readonly PageToShoot[] }[] {
  const starts = Array.from({ length: Math.ceil(pages.length / size) }, (_, at) => at * size);
  return starts.map((start) => {
    const part = pages.slice(start, start + size);
    return { names: part.map(({ name }) => name).join(', '), part };
  });
}

for (const { names, part } of parts(OWN, 4)) {
  demoTest(`axe finds nothing in a full shop: ${names}`, async ({ page }) => {
    expect(await findingsOn(page, await signInToDemo(page), part)).toEqual([]);
  });
}

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

const FOR_EMPTY = [...OWN.filter((one) => !one.follow), { name: 'nowhere', path: 'nowhere' }];
for (const { names, part } of parts(FOR_EMPTY, 6)) {
  test(`axe finds nothing in an empty shop: ${names}`, async ({ page }) => {
    expect(await findingsOn(page, (await newShop(page)).shop, part)).toEqual([]);
  });
}
