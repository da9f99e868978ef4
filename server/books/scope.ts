import type { Knex } from 'knex';
import { ProblemError } from '../platform/problems.ts';
import { fromRow, toRow } from '../platform/rows.ts';

/**
 * The one place that binds queries to a shop: stores and read models reach tables only through this, so no
 * query can see another shop's rows.
 */
export function shopScope(db: Knex, shopId: string) {
  /** Rows of a table that belong to the shop. */
  const table = (name: string): Knex.QueryBuilder => db(name).where(`${name}.shop_id`, shopId);

  return {
    db,
    shopId,
    table,
    async insert(name: string, rows: object | readonly object[]): Promise<void> {
      const list = (Array.isArray(rows) ? rows : [rows]) as object[];
      for (let i = 0; i < list.length; i += 100) {
        await db(name).insert(list.slice(i, i + 100).map((row) => ({ ...toRow(row), shop_id: shopId })));
      }
    },
    /** The row with this id, or null. */
    async find<T>(name: string, id: string): Promise<T | null> {
      const row: object | undefined = await table(name).where(`${name}.id`, id).first();
      return row ? fromRow<T>(row) : null;
    },
    /** The row with this id; another shop's id and an unknown one answer the same 404. */
    async get<T>(name: string, id: string): Promise<T> {
      const found = await this.find<T>(name, id);
      if (!found) throw new ProblemError(404, { detail: 'There is no such thing in this shop.' });
      return found;
    },
    /** Changes a row only if it still has this version, and raises it; 412 if someone was quicker. */
    async update<T>(name: string, id: string, version: number, change: object): Promise<T> {
      const changed = await table(name)
        .where({ id, version })
        .update({ ...toRow(change), version: version + 1 });
      if (changed === 1) return this.get<T>(name, id);
      await this.get<T>(name, id);
      throw new ProblemError(412, {
        name: 'changed-meanwhile',
        detail: 'Someone changed this since you opened it. Look at the new version, then save again.',
      });
    },
  };
}

export type ShopScope = ReturnType<typeof shopScope>;
