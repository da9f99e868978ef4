import { fileURLToPath } from 'node:url';

/** The old spreadsheets of the demo shop as they are kept, made once from its generator. */
export const OLD_BOOK_FILES = {
  cars: fileURLToPath(new URL('../old-books/2021-cars.csv', import.meta.url)),
  receipts: fileURLToPath(new URL('../old-books/2022-receipts.csv', import.meta.url)),
} as const;
