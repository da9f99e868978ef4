import type { Page } from '@playwright/test';
import type { Role } from '#shared/vocabulary.ts';
import { answerOn } from './support/books.ts';
import { demoTest as test, expect } from './support/test.ts';
import { signInToDemo } from './support/visitor.ts';

const ANSWERS = [
  { path: 'year', question: 'Did the work pay this year?', table: 'All years' },
  { path: 'what-pays', question: 'Which wrecks pay?', table: 'All finished rebuilds together' },
  { path: 'overruns', question: 'Where does the money run over?', table: 'Overrun by category' },
  { path: 'time-to-sell', question: 'How long until the money is back?', table: 'Unsold rebuilds' },
  {
    path: 'contingency',
    question: "How much cushion should next year's budgets carry?",
    table: 'Rules on the same rebuilds',
  },
] as const;

for (const { path, question, table } of ANSWERS) {
  test(`${path}: question, answer, picture, rows, and how it is worked out down to a rebuild`, async ({ page }) => {
    const shop = await signInToDemo(page);
    await page.goto(`${shop}/${path}`);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(question);
    await expect(answerOn(page).locator('mark').first()).toHaveText(/\d/);
    await expect(answerOn(page)).toHaveText(/\.$/);
    if (path === 'what-pays') {
      // Drawn as a grid of fields, which is a table by itself.
      await expect(page.getByText('Class by damage', { exact: true })).toBeAttached();
    } else {
      await expect(page.getByRole('figure').first().locator('svg').first()).toBeVisible();
      await expect(page.getByRole('figure').first().locator('figcaption')).toHaveText(/\d/);
    }
    await expect(page.getByRole('table', { name: table, exact: true })).toBeVisible();
    const how = page.locator('details', { hasText: 'How this is worked out' });
    await how.locator('summary').click();
    await expect(how.locator('summary + *')).toHaveText(/\d/);
    await expect(how.getByRole('link').first()).toHaveAttribute('href', /#rows$|\/rebuilds|\/ledger/);
    // Down to one rebuild by the keyboard, straight from the picture or a row, or through a list.
    await page.locator('main figure a, main table a').and(page.locator('[href*="/rebuilds"]:visible')).first().focus();
    await page.keyboard.press('Enter');
    await expect(page).toHaveURL(/\/rebuilds[?/]/);
    const list = page.getByRole('table', { name: 'Rebuilds', exact: true });
    if (page.url().includes('/rebuilds?')) await list.getByRole('link').first().click();
    await expect(page).toHaveURL(/\/rebuilds\/[\w-]{22}$/);
    await expect(page.getByRole('heading', { name: 'Plan against actual' })).toBeVisible();
  });
}

test('filters stand in the address: a sent link and a reload show the same', async ({ page }) => {
  await page.goto(`${await signInToDemo(page)}/overruns`);
  const all = await settledAnswer(page);
  await page.getByRole('button', { name: /^Filter/ }).click();
  const choices = page.getByRole('dialog', { name: 'Which rebuilds' });
  const answered = page.waitForResponse((reply) => reply.url().includes('damage=') && reply.url().includes('seen=yes'));
  await choices.getByLabel('Damage').selectOption({ index: 1 });
  await expect(page).toHaveURL(/[?&]damage=[\w-]{22}/);
  await choices.getByText(/^seen \(/).click();
  await expect(page).toHaveURL(/[?&]seen=yes/);
  await answered;
  await page.keyboard.press('Escape');
  const some = await settledAnswer(page);
  expect(some).not.toBe(all);
  await page.reload();
  await expect(answerOn(page)).toHaveText(some);
  await page.getByRole('button', { name: 'Show all' }).click();
  await expect(answerOn(page)).toHaveText(all);
  expect(new URL(page.url()).search).toBe('');
});

test('year and level stand in the address too', async ({ page }) => {
  const shop = await signInToDemo(page);
  await page.goto(`${shop}/year`);
  await page.getByLabel('Year', { exact: true }).selectOption('2024');
  await expect(page).toHaveURL(/[?&]year=2024/);
  await page.reload();
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Did the work pay in 2024?');
  await page.goto(`${shop}/contingency`);
  const four = await settledAnswer(page);
  await page.getByText('9 in 10', { exact: true }).click();
  await expect(page).toHaveURL(/[?&]level=9-10/);
  await expect(answerOn(page)).not.toHaveText(four);
  const nine = await settledAnswer(page);
  await page.reload();
  await expect(answerOn(page)).toHaveText(nine);
  // A cushion that holds more often is never smaller.
  expect(percentIn(nine)).toBeGreaterThanOrEqual(percentIn(four));
});

test('a rule is adopted for next year, with what it rested on', async ({ page }) => {
  await page.goto(`${await signInToDemo(page)}/contingency`);
  const percent = percentIn(await settledAnswer(page));
  const adopt = page.getByRole('button', { name: `Adopt ${percent}% for 2027`, exact: true });
  await adopt.click();
  const dialog = page.getByRole('dialog', { name: 'Adopt a rule' });
  await dialog.getByLabel('Note (optional)').fill('Agreed at the kitchen table');
  await dialog.getByRole('button', { name: `Adopt ${percent}% for 2027`, exact: true }).click();
  await expect(dialog).toBeHidden();
  await page.getByRole('link', { name: 'Did the last rule hold?' }).click();
  const history = page.getByRole('table', { name: 'Rules adopted' });
  await expect(history.getByRole('row', { name: /2027/ }).first()).toContainText(`${percent}%`);
  await expect(history.getByRole('row', { name: /2027/ }).first()).toContainText('Wren Hollis');
});

const PLACES: Readonly<Record<Role, string[]>> = {
  owner: [
    'Year',
    'What pays',
    'Overruns',
    'Time to sell',
    'Contingency',
    'Pre-bid sheet',
    'Kept sheets',
    'Rebuilds',
    'Ledger',
    'Hours',
    'Import',
    'Data check',
    'People',
    'Shop',
  ],
  bookkeeper: [
    'Year',
    'What pays',
    'Overruns',
    'Time to sell',
    'Contingency',
    'Pre-bid sheet',
    'Kept sheets',
    'Rebuilds',
    'Ledger',
    'Hours',
    'Import',
    'Data check',
    'Shop',
  ],
  accountant: [
    'Year',
    'What pays',
    'Overruns',
    'Time to sell',
    'Contingency',
    'Pre-bid sheet',
    'Kept sheets',
    'Rebuilds',
    'Ledger',
    'Hours',
    'Data check',
    'Shop',
  ],
  mechanic: ['Rebuilds', 'Hours'],
  partner: ['Rebuilds'],
};

for (const role of Object.keys(PLACES) as Role[]) {
  test(`the ${role} sees these places and no more`, async ({ page }) => {
    const shop = await signInToDemo(page, role);
    await page.goto('/');
    await expect(page.getByRole('navigation', { name: 'Places' }).getByRole('link')).toHaveText(PLACES[role]);
    const isReader = PLACES[role].includes('Ledger');
    await page.goto(`${shop}/ledger`);
    if (isReader) await expect(answerOn(page)).toContainText('entries come to');
    else await expect(page.getByRole('alert')).toContainText('Your role in this shop does not allow this');
    const mayAdd = ['owner', 'bookkeeper'].includes(role);
    await expect(page.getByRole('form', { name: 'Add an entry' })).toHaveCount(mayAdd ? 1 : 0);
    await page.goto(`${shop}/people`);
    const refusal = page.getByRole('heading', { name: 'Only owners invite people and change roles' });
    await expect(role === 'owner' ? page.getByRole('button', { name: 'Invite someone' }) : refusal).toBeVisible();
  });
}

test('what a mechanic is sent holds no money', async ({ page }) => {
  const shop = await signInToDemo(page, 'mechanic');
  const replies: Promise<string>[] = [];
  page.on('response', (reply) => {
    if (new URL(reply.url()).pathname.startsWith('/api/')) replies.push(reply.text());
  });
  await page.goto(`${shop}/rebuilds`);
  await page.locator('main a[href*="rebuild="]').first().click();
  await expect(page.getByRole('heading', { name: /^B-\d+/ })).toBeVisible();
  await page.waitForLoadState('networkidle');
  const sent = (await Promise.all(replies)).join('\n');
  expect(sent).toContain('loggedSeconds');
  expect(sent).not.toMatch(/cents/i);
  await expect(page.locator('main')).not.toContainText('$');
});

/** The answer's text once nothing is loading any more. */
async function settledAnswer(page: Page): Promise<string> {
  await expect(answerOn(page)).toHaveText(/\d/);
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0);
  return (await answerOn(page).innerText()).replace(/\s+/g, ' ');
}

const percentIn = (text: string) => Number(/(\d+)%/.exec(text)?.[1]);
