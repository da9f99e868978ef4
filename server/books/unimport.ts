import type { RawDatabase } from '../platform/database.ts';
import { refreshOverhead, refreshRollup } from './rollup.ts';

/** Rebuild id → the columns that an import filled on it, with the values that it wrote. */
export type Filled = Readonly<Record<string, Readonly<Record<string, string | number>>>>;

const COLUMN = /^[a-z_]+$/;

/**
 * Why an import can no longer be taken out: something that it brought was changed, or books were added to it since.
 * null = nothing stands in the way.
 */
export function undoObstacle(raw: RawDatabase, shopId: string, importId: string, filled: Filled): string | null {
  const count = (sql: string) => raw.prepare(sql).pluck().get({ shop: shopId, import: importId }) as number;
  const mine = (table: string) => `FROM ${table} WHERE shop_id = @shop AND import_id = @import`;
  const changed = count(
    `SELECT (SELECT count(*) ${mine('entries')} AND version > 1) + (SELECT count(*) ${mine('hours')} AND version > 1)
      + (SELECT count(*) ${mine('rebuilds')} AND version > 1) + (SELECT count(*) ${mine('estimates')} AND version > 1)`,
  );
  if (changed > 0) return `${changed} of the things that it brought were changed since.`;
  const added = ['entries', 'hours', 'estimates']
    .map(
      (table) =>
        `(SELECT count(*) FROM ${table} WHERE shop_id = @shop AND import_id IS NOT @import AND rebuild_id IN (SELECT id ${mine('rebuilds')}))`,
    )
    .join(' + ');
  const since = count(`SELECT ${added}`);
  if (since > 0) return `${since} entries, hours or estimates were added to its rebuilds since.`;
  for (const [id, columns] of Object.entries(filled)) {
    const now = raw.prepare('SELECT * FROM rebuilds WHERE shop_id = ? AND id = ?').get(shopId, id) as
      | Record<string, unknown>
      | undefined;
    if (Object.entries(columns).some(([name, value]) => now?.[name] !== value))
      return 'What it filled in on one of your rebuilds was changed since.';
  }
  return null;
}

/** Takes everything out that an import brought, and empties again what it filled. The raw rows stay. */
export function removeImported(
  raw: RawDatabase,
  shopId: string,
  importId: string,
  brought: { filled: Filled; workerIds: readonly string[] },
): void {
  const scope = { shop: shopId, import: importId };
  const mine = 'shop_id = @shop AND import_id = @import';
  const touched = raw
    .prepare(
      `SELECT rebuild_id FROM entries WHERE ${mine} UNION SELECT rebuild_id FROM hours WHERE ${mine} UNION SELECT id FROM rebuilds WHERE ${mine}`,
    )
    .pluck()
    .all(scope)
    .filter((id) => id !== null) as string[];
  const ids = new Set([...touched, ...Object.keys(brought.filled)]);
  raw
    .prepare(
      `DELETE FROM estimate_lines WHERE shop_id = @shop AND estimate_id IN (SELECT id FROM estimates WHERE ${mine})`,
    )
    .run(scope);
  for (const table of ['estimates', 'entries', 'hours']) raw.prepare(`DELETE FROM ${table} WHERE ${mine}`).run(scope);
  for (const [id, columns] of Object.entries(brought.filled)) {
    const names = Object.keys(columns).filter((name) => COLUMN.test(name));
    raw
      .prepare(
        `UPDATE rebuilds SET ${names.map((name) => `${name} = NULL`).join(', ')}, version = version + 1 WHERE shop_id = ? AND id = ?`,
      )
      .run(shopId, id);
  }
  raw.prepare(`DELETE FROM rebuilds WHERE ${mine}`).run(scope);
  const unused = raw.prepare(
    `DELETE FROM workers WHERE shop_id = @shop AND id = @id AND version = 1
     AND NOT EXISTS (SELECT 1 FROM hours WHERE shop_id = @shop AND worker_id = @id)`,
  );
  for (const id of brought.workerIds) unused.run({ shop: shopId, id });
  refreshRollup(raw, shopId, [...ids]);
  refreshOverhead(raw, shopId);
}
