import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { importFile } from '../../server/features/imports/import-file.ts';
import { importFiles } from '../../server/features/imports/import-files.ts';
import { shopScope } from '../../server/books/scope.ts';
import { sha256 } from '../../server/platform/ids.ts';
import type { Services } from '../../server/platform/http.ts';
import { OLD_BOOK_FILES } from './old-book-files.ts';
import type { DemoShop } from './open-demo-shop.ts';

/** Imports the old spreadsheets as a person would, with nothing said about them. What is in already stays as it is. */
export async function bringInSheets({ database, config, now }: Services, shop: DemoShop): Promise<void> {
  const { shopId, ownerId, requestId } = shop;
  for (const file of [OLD_BOOK_FILES.cars, OLD_BOOK_FILES.receipts]) {
    const bytes = await readFile(file);
    if (await importFiles(shopScope(database.reader, shopId)).findCommitted(sha256(bytes))) continue;
    const fileName = path.basename(file);
    await importFile({ database, config, shopId, userId: ownerId, requestId, fileName, bytes, now: now() });
  }
}
