import type { Knex } from 'knex';

/** A rule adopted after the one before it was looked at keeps what was seen then, as one JSON text. */
export async function up(db: Knex): Promise<void> {
  await db.raw('ALTER TABLE contingency_rules ADD COLUMN review TEXT');
}
