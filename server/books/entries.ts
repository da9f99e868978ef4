import type { Entry, EntryFields } from '#shared/contracts/ledger.ts';
import { splitCents } from '#shared/money.ts';
import { newId } from '../platform/ids.ts';
import { impossible } from '../platform/problems.ts';
import type { Patch } from '../platform/rows.ts';
import type { ShopScope } from './scope.ts';
import type { Touched } from './touched.ts';

type NewEntry = Patch<EntryFields> & Pick<EntryFields, 'categoryId' | 'cents'>;

/** The only writer of `entries` and `splits`. Entries are never deleted: they are voided with a reason. */
export function entryStore(scope: ShopScope, touched: Touched, userId: string | null) {
  async function insert(fields: NewEntry & { splitId?: string }): Promise<Entry> {
    const id = newId();
    await scope.insert('entries', { ...fields, id, createdAt: new Date().toISOString(), createdBy: userId });
    touched.entryOf(fields.rebuildId ?? null);
    return scope.get<Entry>('entries', id);
  }

  return {
    get: (id: string) => scope.get<Entry>('entries', id),
    create: (fields: NewEntry) => insert(fields),
    /**
     * One bill over several rebuilds by whole-number weights (a donor car, a drum of paint). Each share is an
     * entry; together they are the bill to the cent.
     */
    async createSplit(
      fields: NewEntry,
      shares: readonly { rebuildId: string | null; weight: number }[],
    ): Promise<Entry[]> {
      const splitId = newId();
      await scope.insert('splits', { id: splitId, cents: fields.cents, createdAt: new Date().toISOString() });
      const parts = splitCents(
        fields.cents,
        shares.map((share) => share.weight),
      );
      const entries: Entry[] = [];
      for (const [i, share] of shares.entries()) {
        entries.push(await insert({ ...fields, rebuildId: share.rebuildId, cents: parts[i] ?? 0, splitId }));
      }
      return entries;
    },
    async update(id: string, version: number, change: Patch<EntryFields>): Promise<Entry> {
      const before = await this.get(id);
      if (before.voidedAt) throw impossible('', 'This entry is void; it cannot change any more.');
      if (before.splitId && change.cents !== undefined && change.cents !== before.cents) {
        throw impossible('/cents', 'This is a share of a split bill. Void the bill and enter it anew.');
      }
      touched.entryOf(before.rebuildId);
      const after = await scope.update<Entry>('entries', id, version, change);
      touched.entryOf(after.rebuildId);
      return after;
    },
    /** Voids an entry, and with it every share of the same bill. */
    async void(id: string, version: number, reason: string): Promise<Entry> {
      const entry = await this.get(id);
      if (entry.voidedAt) throw impossible('', 'This entry is void already.');
      const stamp = { voidedAt: new Date().toISOString(), voidedBy: userId, voidReason: reason };
      const voided = await scope.update<Entry>('entries', id, version, stamp);
      touched.entryOf(entry.rebuildId);
      if (entry.splitId) {
        const others: { id: string; version: number; rebuild_id: string | null }[] = await scope
          .table('entries')
          .where({ split_id: entry.splitId })
          .whereNull('voided_at')
          .select('id', 'version', 'rebuild_id');
        for (const other of others) {
          await scope.update<Entry>('entries', other.id, other.version, stamp);
          touched.entryOf(other.rebuild_id);
        }
      }
      return voided;
    },
  };
}
