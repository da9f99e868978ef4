import type { HoursEntry, HoursFields } from '#shared/contracts/hours.ts';
import { newId } from '../platform/ids.ts';
import { impossible } from '../platform/problems.ts';
import type { Patch } from '../platform/rows.ts';
import type { ShopScope } from './scope.ts';
import type { Touched } from './touched.ts';

type NewHours = Patch<HoursFields> & Pick<HoursFields, 'rebuildId' | 'seconds' | 'isPaid'>;

/** The only writer of `hours`. */
export function hoursStore(scope: ShopScope, touched: Touched, userId: string | null) {
  return {
    get: (id: string) => scope.get<HoursEntry>('hours', id),
    async create(fields: NewHours): Promise<HoursEntry> {
      const id = newId();
      await scope.insert('hours', { ...fields, id, createdAt: new Date().toISOString(), createdBy: userId });
      touched.rebuild(fields.rebuildId);
      return this.get(id);
    },
    async update(id: string, version: number, change: Patch<HoursFields>): Promise<HoursEntry> {
      const before = await this.get(id);
      if (before.voidedAt) throw impossible('', 'These hours are void; they cannot change any more.');
      const after = await scope.update<HoursEntry>('hours', id, version, change);
      touched.rebuild(before.rebuildId);
      touched.rebuild(after.rebuildId);
      return after;
    },
    async void(id: string, version: number, reason: string): Promise<HoursEntry> {
      const before = await this.get(id);
      if (before.voidedAt) throw impossible('', 'These hours are void already.');
      touched.rebuild(before.rebuildId);
      return scope.update<HoursEntry>('hours', id, version, {
        voidedAt: new Date().toISOString(),
        voidedBy: userId,
        voidReason: reason,
      });
    },
  };
}
