import type { z } from 'zod';
import {
  type Entry,
  type EntryFields,
  entryFaults,
  type newSplitSchema,
  type receiptSchema,
} from '#shared/contracts/ledger.ts';
import type { Rebuild } from '#shared/contracts/rebuilds.ts';
import type { Day } from '#shared/day.ts';
import type { Books } from '../../books/books.ts';
import { refuseFaults, refuseStrangers } from '../../books/references.ts';
import { impossible } from '../../platform/problems.ts';
import { type Patch, patched } from '../../platform/rows.ts';

type NewEntry = Patch<EntryFields> & Pick<EntryFields, 'categoryId' | 'cents'>;

export async function addEntry(books: Books, fields: NewEntry): Promise<Entry> {
  await refuseUnknown(books, fields);
  return books.entries.create(fields);
}

/** Changes an entry; what must hold is asked of the entry as it would become. */
export async function changeEntry(
  books: Books,
  before: Entry,
  version: number,
  change: Patch<EntryFields>,
): Promise<Entry> {
  await refuseUnknown(books, change);
  if (before.version === version) refuseFaults(entryFaults(patched<EntryFields>(before, change)));
  return books.entries.update(before.id, version, change);
}

export async function splitBill(books: Books, bill: z.output<typeof newSplitSchema>): Promise<Entry[]> {
  const { shares, ...fields } = bill;
  await refuseStrangers(books.scope, [
    { pointer: '/categoryId', table: 'categories', id: fields.categoryId },
    ...shares.map(({ rebuildId: id }, i) => ({ pointer: `/shares/${i}/rebuildId`, table: 'rebuilds' as const, id })),
  ]);
  return books.entries.createSplit(fields, shares);
}

/** A receipt or surprise of today, on a rebuild that is still in the shop. */
export async function noteReceipt(books: Books, receipt: z.output<typeof receiptSchema>, today: Day): Promise<Entry> {
  await refuseUnknown(books, receipt);
  const rebuild = await books.rebuilds.get(receipt.rebuildId);
  if (hasLeft(rebuild)) throw impossible('/rebuildId', 'This one has left the shop. Tell whoever keeps the books.');
  const { isSurprise, ...fields } = receipt;
  return books.entries.create({ ...fields, datedOn: today, foreseen: isSurprise ? 'surprise' : 'foreseen' });
}

const hasLeft = (rebuild: Rebuild) => rebuild.soldOn !== null || rebuild.exitKind !== null;

const refuseUnknown = (books: Books, fields: Patch<Pick<EntryFields, 'rebuildId' | 'categoryId'>>) =>
  refuseStrangers(books.scope, [
    { pointer: '/rebuildId', table: 'rebuilds', id: fields.rebuildId },
    { pointer: '/categoryId', table: 'categories', id: fields.categoryId },
  ]);
