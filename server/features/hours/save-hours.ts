import type { z } from 'zod';
import type { HoursEntry, HoursFields, newHoursSchema } from '#shared/contracts/hours.ts';
import type { Worker } from '#shared/contracts/shop.ts';
import type { Books } from '../../books/books.ts';
import { refuseStrangers } from '../../books/references.ts';
import type { Patch } from '../../platform/rows.ts';

/** Adds hours; unless it is said, they are paid if the worker is. */
export async function addHours(books: Books, fields: z.output<typeof newHoursSchema>): Promise<HoursEntry> {
  await refuseUnknown(books, fields);
  const worker = fields.workerId ? await books.scope.find<Worker>('workers', fields.workerId) : null;
  return books.hours.create({ ...fields, isPaid: fields.isPaid ?? worker?.isPaid ?? false });
}

export async function changeHours(
  books: Books,
  id: string,
  version: number,
  change: Patch<HoursFields>,
): Promise<HoursEntry> {
  await refuseUnknown(books, change);
  return books.hours.update(id, version, change);
}

const refuseUnknown = (books: Books, fields: Patch<Pick<HoursFields, 'rebuildId' | 'workerId'>>) =>
  refuseStrangers(books.scope, [
    { pointer: '/rebuildId', table: 'rebuilds', id: fields.rebuildId },
    { pointer: '/workerId', table: 'workers', id: fields.workerId },
  ]);
