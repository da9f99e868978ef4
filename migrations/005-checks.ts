import type { Knex } from 'knex';

/** What people looked at on the data check and found right as it is. Only adds. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE settled_checks (
    shop_id TEXT NOT NULL REFERENCES shops (id), kind TEXT NOT NULL, item_key TEXT NOT NULL,
    settled_by TEXT NOT NULL REFERENCES users (id), settled_at TEXT NOT NULL,
    PRIMARY KEY (shop_id, kind, item_key)) STRICT, WITHOUT ROWID`);
}
