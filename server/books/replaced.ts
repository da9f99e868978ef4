import type { RawDatabase } from '../platform/database.ts';
import type { Importing } from './imported.ts';

/** A row of an earlier import, or one cell of it. */
export interface BookedCell {
  readonly importId: string;
  readonly sheet: number;
  readonly row: number;
  readonly col: number | null;
}

/** What made way for an import: undoing it brings them back. */
export interface Replaced {
  readonly entries: readonly string[];
  readonly hours: readonly string[];
  /** Rebuild id → column → what it held before, and what the import wrote. */
  readonly facts: Readonly<Record<string, Readonly<Record<string, readonly [Value, Value]>>>>;
}
type Value = string | number | null;

const AT = 'shop_id = @shop AND import_id = @import';
const CELL = '(@col IS NULL OR import_col = @col)';

/** Voids what earlier imports booked from rows that a longer file holds anew, in the caller's transaction. */
export function replacedBooks(raw: RawDatabase, { shopId, importId, userId, at }: Importing) {
  const done = { entries: [] as string[], hours: [] as string[] };
  const touched = new Set<string>();
  let isOverhead = false;
  const voiding = (table: 'entries' | 'hours') =>
    raw.prepare(
      `UPDATE ${table} SET voided_at = @at, voided_by = @user, void_reason = @reason, version = version + 1
       WHERE ${AT} AND import_sheet = @sheet AND import_row = @row AND ${CELL} AND voided_at IS NULL RETURNING id, rebuild_id`,
    );
  const tables = { entries: voiding('entries'), hours: voiding('hours') };
  const facts = raw.prepare(
    `UPDATE import_facts SET replaced_by = @by WHERE ${AT} AND sheet = @sheet AND row = @row AND (@col IS NULL OR col = @col)
     AND replaced_by IS NULL`,
  );

  return {
    /** `reason` names the row that counts now. */
    replace({ importId: earlier, sheet, row, col }: BookedCell, reason: string): void {
      const place = { shop: shopId, import: earlier, sheet, row, col };
      for (const table of ['entries', 'hours'] as const) {
        const found = tables[table].all({ ...place, at, user: userId, reason }) as {
          id: string;
          rebuild_id: string | null;
        }[];
        for (const { id, rebuild_id } of found) {
          done[table].push(id);
          if (rebuild_id === null) isOverhead = true;
          else touched.add(rebuild_id);
        }
      }
      facts.run({ ...place, by: importId });
    },
    done,
    touched,
    hasOverhead: () => isOverhead,
  };
}

/** What imports said of a rebuild's purchase or sale, in cents, but for what was replaced and for this import. */
export function factCents(raw: RawDatabase, { shopId, importId }: Importing, rebuildId: string, kind: string): number {
  return raw
    .prepare(
      `SELECT coalesce(sum(cents), 0) FROM import_facts
       WHERE shop_id = ? AND rebuild_id = ? AND kind = ? AND replaced_by IS NULL AND import_id <> ?`,
    )
    .pluck()
    .get(shopId, rebuildId, kind, importId) as number;
}

/** Brings back what made way for an import. Versions go on; `undone_versions` tells that nobody changed anything. */
export function bringBack(
  raw: RawDatabase,
  shopId: string,
  importId: string,
  { entries, hours, facts }: Replaced,
): void {
  for (const [table, ids] of Object.entries({ entries, hours })) {
    const back = raw.prepare(
      `UPDATE ${table} SET voided_at = NULL, voided_by = NULL, void_reason = NULL, version = version + 1,
       undone_versions = undone_versions + 2 WHERE shop_id = ? AND id = ?`,
    );
    for (const id of ids) back.run(shopId, id);
  }
  for (const [id, columns] of Object.entries(facts)) {
    const before = Object.entries(columns).map(([name, [value]]) => [name, value] as const);
    raw
      .prepare(`UPDATE rebuilds SET ${before.map(([name]) => `${name} = ?`).join(', ')} WHERE shop_id = ? AND id = ?`)
      .run(...before.map(([, value]) => value), shopId, id);
  }
  raw.prepare('UPDATE import_facts SET replaced_by = NULL WHERE shop_id = ? AND replaced_by = ?').run(shopId, importId);
}
