import type { Knex } from 'knex';

/**
 * Says of each rebuild's sums which version of the books they were refreshed for, so that answers kept in memory
 * read again only what a write touched.
 */
export async function up(db: Knex): Promise<void> {
  await db.raw('ALTER TABLE rollup_rebuilds ADD COLUMN refreshed_version INTEGER NOT NULL DEFAULT 0');
}
