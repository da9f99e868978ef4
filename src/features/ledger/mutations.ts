import { useMutation } from '@tanstack/react-query';
import type { z } from 'zod';
import { type EntryRow, type entryChangeSchema, ledgerApi, type newEntrySchema } from '#shared/contracts/ledger.ts';
import { call } from '../../lib/api.ts';
import { useBooksChanged } from '../../lib/books-changed.ts';
import { notify } from '../../ui/toast.tsx';
import { tryUndo } from '../../ui/undo.ts';

export type NewEntry = z.input<typeof newEntrySchema>;
export type EntryChange = z.input<typeof entryChangeSchema>;
type Named = Pick<EntryRow, 'id' | 'version'>;

/** Writes to the ledger; each makes everything that was read of the books be read again. */
export function useLedgerWrites() {
  const changed = useBooksChanged();

  async function voidEntry({ id, version }: Named, reason: string): Promise<EntryRow> {
    const entry = await call(ledgerApi.void, { params: { entryId: id }, version, body: { reason } });
    await changed();
    return entry;
  }

  async function change({ id, version }: Named, body: EntryChange): Promise<EntryRow> {
    const entry = await call(ledgerApi.update, { params: { entryId: id }, version, body });
    await changed();
    return entry;
  }

  /** Saves a new entry and offers to take it back. */
  async function add(body: NewEntry, idempotencyKey: string): Promise<EntryRow> {
    const entry = await call(ledgerApi.create, { body, idempotencyKey });
    notify('Entry saved', { undo: () => void tryUndo(voidEntry(entry, 'Undone right after it was added')) });
    await changed();
    return entry;
  }

  return { add, change, voidEntry };
}

/** One bill over several rebuilds. */
export function useSplitBill() {
  const changed = useBooksChanged();
  return useMutation({
    mutationFn: (input: Parameters<typeof call<typeof ledgerApi.split>>[1]) => call(ledgerApi.split, input),
    onSuccess: changed,
  });
}
