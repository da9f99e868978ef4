import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { demoBook } from '../../seeds/demo/generate.ts';
import { OLD_BOOK_FILES } from '../../seeds/demo/old-book-files.ts';
import { oldBooks } from '../../seeds/demo/old-books.ts';

test('the kept spreadsheets are those that the generator makes', () => {
  const { cars, receipts } = oldBooks(demoBook());
  expect(readFileSync(OLD_BOOK_FILES.cars, 'utf8')).toBe(cars);
  expect(readFileSync(OLD_BOOK_FILES.receipts, 'utf8')).toBe(receipts);
});
