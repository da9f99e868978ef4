import { writeFileSync } from 'node:fs';
import { demoBook } from '../demo/generate.ts';
import { oldBooks } from '../demo/old-books.ts';
import { OLD_BOOK_FILES } from '../demo/old-book-files.ts';

/** `npx tsx seeds/tools/write-old-books.ts` writes the old spreadsheets anew, after the generator has changed. */
const { cars, receipts } = oldBooks(demoBook());
writeFileSync(OLD_BOOK_FILES.cars, cars);
writeFileSync(OLD_BOOK_FILES.receipts, receipts);
