import { answerOn, book, readFile, rowOf, sendFile } from './support/books.ts';
import { expect, test } from './support/test.ts';
import { newShop } from './support/visitor.ts';
import { sample } from './support/worked-out.ts';

test.describe.configure({ mode: 'parallel', timeout: 120_000 });

const list = sample('p02_expense_ledger_us.csv');
const text = (name: string, lines: readonly string[]) => ({
  name,
  mimeType: 'text/csv',
  buffer: Buffer.from(lines.join('\n')),
});
const HEAD = 'Date,Car,What for,Paid';

test('a row put aside is put right in place, booked, found from its entry, and all of it taken out again', async ({
  page,
}) => {
  const { shop } = await newShop(page);
  await readFile(page, shop, list.file);
  const asides = page.getByRole('table', { name: 'Rows and cells put aside' });
  await rowOf(asides, '11').getByRole('textbox').fill('2/29/2020');
  await expect(rowOf(asides, '11')).toContainText('was: 2/30/2020');
  await rowOf(asides, '25').getByRole('button', { name: 'Leave out row 25' }).click();
  await page.getByRole('button', { name: 'Read again with 2 corrections' }).click();
  await expect(answerOn(page)).toContainText('81 of 82 rows');
  await expect(rowOf(asides, '11')).toHaveCount(0);
  await book(page);

  await expect(page.getByRole('link', { name: 'Did the work pay this year?' })).toBeVisible();
  await page.goto(`${page.url()}?sheet=1&row=11`);
  const beside = page.getByRole('group', { name: 'What was understood' });
  await expect(beside).toContainText('Row 11');
  await expect(beside).toContainText('was: 2/30/2020');
  await beside.getByRole('link', { name: 'its entry' }).click();
  const entry = page.getByRole('dialog');
  await expect(entry.getByLabel('Amount')).toHaveValue('31.40');
  await entry.getByRole('link', { name: /p02_expense_ledger_us\.csv, row 11/ }).click();
  await expect(beside).toContainText('Row 11');
  await expect(page.locator('[role="gridcell"][data-hot]')).toBeInViewport();

  await page.getByRole('button', { name: 'Take it out again' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Take it out' }).click();
  await expect(answerOn(page)).toContainText('the books are as they were before it');
  await page.goto(`${shop}/ledger`);
  await expect(page.getByText('Every cost and credit will stand here')).toBeVisible();
});

test('several files come in as one, and cells pasted from a spreadsheet too', async ({ page }) => {
  const { shop } = await newShop(page);
  await sendFile(page, shop, [
    text('2019.csv', [HEAD, '2019-03-01,13 F-150,Parts,10.00', '2019-03-02,13 F-150,Towing,20.00']),
    text('2020.csv', [HEAD, '2020-03-01,13 F-150,Parts,30.00']),
  ]);
  await expect(answerOn(page)).toContainText('3 of 3 rows about 1 rebuild');
  await page.getByLabel('Sheet', { exact: true }).selectOption({ index: 1 });
  await expect(page.getByRole('gridcell', { name: '30.00' })).toBeVisible();

  await page.goto(`${shop}/import`);
  await expect(page.getByRole('table', { name: 'Files that are not booked yet' })).toContainText('2019.csv');
  await page.evaluate(() => {
    const clipboardData = new DataTransfer();
    clipboardData.setData('text/plain', 'Date\tCar\tWhat for\tPaid\n2021-03-01\t13 F-150\tParts\t40.00\n');
    document.body.dispatchEvent(new ClipboardEvent('paste', { clipboardData, bubbles: true }));
  });
  await expect(page.getByText('2 rows of up to 4 cells.')).toBeVisible();
  await page.getByRole('button', { name: 'Bring these cells in' }).click();
  await expect(page).toHaveTitle(/Pasted cells\.tsv/);
  await expect(answerOn(page)).toContainText('1 of 1 rows');
});

test('a question that only a person can answer holds up the booking until it is answered', async ({ page }) => {
  const { shop } = await newShop(page);
  await readFile(page, shop, sample('p05_hours_log.tsv').file);
  await expect(page.getByRole('button', { name: /^Book/ })).toBeDisabled();
  await page.getByRole('link', { name: 'Go to the question' }).click();
  const question = page.getByLabel(/does the month or the day stand first/);
  await expect(question).toBeFocused();
  await question.selectOption('The month');
  await page.getByRole('button', { name: 'Read again with 1 change' }).click();
  await book(page);
});

test('the file is gone through by keyboard, and what is typed survives a wrong press', async ({ page }) => {
  const { shop } = await newShop(page);
  await readFile(
    page,
    shop,
    text('one.csv', [HEAD, '2019-03-01,13 F-150,Parts,10.00', '2019-02-30,13 F-150,Parts,5.00']),
  );
  await page.getByRole('grid', { name: 'Rows of the file' }).focus();
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  const beside = page.getByRole('group', { name: 'What was understood' });
  await expect(beside.getByLabel('Date')).toBeFocused();
  await page.keyboard.press('Control+a');
  await page.keyboard.type('2019-02-28');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('gridcell', { name: '2019-02-28' })).toBeVisible();
  await page.getByRole('link', { name: 'All imports' }).click();
  await page.getByRole('button', { name: 'Stay here' }).click();
  await page.getByRole('button', { name: 'Read again with 1 correction' }).click();
  await expect(answerOn(page)).toContainText('2 of 2 rows');
});
