import { findingsOn } from './support/axe.ts';
import { readFile } from './support/books.ts';
import { expect, test } from './support/test.ts';
import { newShop } from './support/visitor.ts';
import { sample } from './support/worked-out.ts';

test.describe.configure({ mode: 'parallel', timeout: 120_000 });

for (const name of ['p02_expense_ledger_us.csv', 'p05_hours_log.tsv', 'p04_workbook_2021.xlsx']) {
  test(`axe finds nothing on ${name} before it is booked`, async ({ page }) => {
    const { shop } = await newShop(page);
    await readFile(page, shop, sample(name).file);
    const path = new URL(page.url()).pathname;
    expect(await findingsOn(page, shop, [{ name, path: `${path}?row=11&col=1` }])).toEqual([]);
  });
}
