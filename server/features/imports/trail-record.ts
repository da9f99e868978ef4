import { chained, type TrailRecord } from '../../books/trail.ts';
import type { RawDatabase } from '../../platform/database.ts';

/** Adds one record to the trail on the raw handle, in the caller's transaction. */
export function chainedAfterLast(raw: RawDatabase, record: TrailRecord): void {
  const last = raw
    .prepare('SELECT hash FROM trail WHERE shop_id = ? ORDER BY number DESC LIMIT 1')
    .pluck()
    .get(record.shopId) as string | undefined;
  const row = chained(record, last ?? '', new Date().toISOString());
  const names = Object.keys(row);
  raw
    .prepare(`INSERT INTO trail (${names.join(', ')}) VALUES (${names.map((name) => `@${name}`).join(', ')})`)
    .run(row);
}
