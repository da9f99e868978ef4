import type { RawDatabase } from '../platform/database.ts';
import { bringBack, type Replaced } from './replaced.ts';
import { refreshOverhead, refreshRollup } from './rollup.ts';

/** Rebuild id → the columns that an import filled on it, with the values that it wrote. */
export type Filled = Readonly<Record<string, Readonly<Record<string, string | number>>>>;

/** What undoing an import needs to know beside the rows that carry its id. Imports of before 002 replaced nothing. */
export interface BroughtBooks {
  readonly filled: Filled;
  readonly workerIds: readonly string[];
  readonly replaced?: Replaced;
}

const COLUMN = /^[a-z_]+$/;
const NOTHING: Replaced = { entries: [], hours: [], facts: {} };
const CHANGED = 'version - undone_versions > 1';

/**
 * Why an import can no longer be taken out: a later one left rows out since they stand here, something that it brought
 * was changed, or books were added to it since. null = nothing stands in the way.
 */
export function undoObstacle(
  raw: RawDatabase,
  shopId: string,
  importId: string,
  { filled, replaced = NOTHING }: BroughtBooks,
): string | null {
  const later = raw.prepare(CARRIED_ON).pluck().get({ shop: shopId, import: importId }) as string | undefined;
  if (later !== undefined)
    return `“${later}” carries it on and left out the rows that stand here: take that one out first.`;
  const count = (sql: string) => raw.prepare(sql).pluck().get({ shop: shopId, import: importId }) as number;
  const mine = (table: string) => `FROM ${table} WHERE shop_id = @shop AND import_id = @import`;
  const changed = count(
    `SELECT (SELECT count(*) ${mine('entries')} AND ${CHANGED}) + (SELECT count(*) ${mine('hours')} AND ${CHANGED})
      + (SELECT count(*) ${mine('rebuilds')} AND ${CHANGED}) + (SELECT count(*) ${mine('estimates')} AND version > 1)`,
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
  for (const table of ['entries', 'hours'] as const) {
    const state = raw.prepare(`SELECT void_reason FROM ${table} WHERE shop_id = ? AND id = ?`).pluck();
    if (replaced[table].some((id) => typeof state.get(shopId, id) !== 'string'))
      return 'What it replaced was changed since.';
  }
  const written = new Map(Object.entries(filled));
  for (const [id, columns] of Object.entries(replaced.facts))
    written.set(id, {
      ...written.get(id),
      ...Object.fromEntries(Object.entries(columns).map(([name, [, value]]) => [name, value as string | number])),
    });
  for (const [id, columns] of written) {
    const now = raw.prepare('SELECT * FROM rebuilds WHERE shop_id = ? AND id = ?').get(shopId, id) as
      | Record<string, unknown>
      | undefined;
    if (Object.entries(columns).some(([name, value]) => now?.[name] !== value))
      return 'What it filled in on one of your rebuilds was changed since.';
  }
  return null;
}

// A later import that counted on rows of this one.
const CARRIED_ON = `
  SELECT i.file_name FROM imports i, json_each(i.reading, '$.earlier') e
  WHERE i.shop_id = @shop AND i.state = 'committed' AND json_extract(e.value, '$.importId') = @import
    AND json_extract(e.value, '$.sameRows') + json_extract(e.value, '$.changedRows') > 0 LIMIT 1`;

/** Takes everything out that an import brought, and empties again what it filled. The raw rows stay. */
export function removeImported(raw: RawDatabase, shopId: string, importId: string, brought: BroughtBooks): void {
  const scope = { shop: shopId, import: importId };
  const mine = 'shop_id = @shop AND import_id = @import';
  const touched = raw
    .prepare(
      `SELECT rebuild_id FROM entries WHERE ${mine} UNION SELECT rebuild_id FROM hours WHERE ${mine} UNION SELECT id FROM rebuilds WHERE ${mine}`,
    )
    .pluck()
    .all(scope)
    .filter((id) => id !== null) as string[];
  const replaced = brought.replaced ?? NOTHING;
  const made = new Set(raw.prepare(`SELECT id FROM rebuilds WHERE ${mine}`).pluck().all(scope) as string[]);
  const changed = new Set(
    [...Object.keys(brought.filled), ...Object.keys(replaced.facts)].filter((id) => !made.has(id)),
  );
  const ids = new Set([...touched, ...changed, ...rebuildsOf(raw, shopId, replaced)]);
  raw
    .prepare(
      `DELETE FROM estimate_lines WHERE shop_id = @shop AND estimate_id IN (SELECT id FROM estimates WHERE ${mine})`,
    )
    .run(scope);
  for (const table of ['import_facts', 'import_sheets', 'estimates', 'entries', 'hours'])
    raw.prepare(`DELETE FROM ${table} WHERE ${mine}`).run(scope);
  for (const [id, columns] of Object.entries(brought.filled)) {
    const names = Object.keys(columns).filter((name) => COLUMN.test(name));
    raw
      .prepare(`UPDATE rebuilds SET ${names.map((name) => `${name} = NULL`).join(', ')} WHERE shop_id = ? AND id = ?`)
      .run(shopId, id);
  }
  bringBack(raw, shopId, importId, replaced);
  const goOn = raw.prepare(
    'UPDATE rebuilds SET version = version + 1, undone_versions = undone_versions + 2 WHERE shop_id = ? AND id = ?',
  );
  for (const id of changed) goOn.run(shopId, id);
  raw.prepare(`DELETE FROM rebuilds WHERE ${mine}`).run(scope);
  const unused = raw.prepare(
    `DELETE FROM workers WHERE shop_id = @shop AND id = @id AND version = 1
     AND NOT EXISTS (SELECT 1 FROM hours WHERE shop_id = @shop AND worker_id = @id)`,
  );
  for (const id of brought.workerIds) unused.run({ shop: shopId, id });
  refreshRollup(raw, shopId, [...ids]);
  refreshOverhead(raw, shopId);
}

/** The rebuilds of the entries and hours that come back. */
function rebuildsOf(raw: RawDatabase, shopId: string, { entries, hours }: Replaced): string[] {
  return Object.entries({ entries, hours }).flatMap(([table, ids]) => {
    const rebuildOf = raw.prepare(`SELECT rebuild_id FROM ${table} WHERE shop_id = ? AND id = ?`).pluck();
    return ids.map((id) => rebuildOf.get(shopId, id)).filter((id) => typeof id === 'string');
  });
}
