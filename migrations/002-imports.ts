import type { Knex } from 'knex';

/**
 * Several files in one import, and what a later, longer file is held against: the headings and rows of each sheet that
 * was booked, and the facts of rebuilds that stand in no entry.
 */
export async function up(knex: Knex): Promise<void> {
  for (const statement of STATEMENTS) await knex.raw(statement);
}

const OF_IMPORT = 'FOREIGN KEY (shop_id, import_id) REFERENCES imports (shop_id, id)';

const STATEMENTS = [
  `CREATE TABLE import_files (
    shop_id TEXT NOT NULL, import_id TEXT NOT NULL, number INTEGER NOT NULL, name TEXT NOT NULL, sha256 TEXT NOT NULL,
    byte_size INTEGER NOT NULL, PRIMARY KEY (shop_id, import_id, number), ${OF_IMPORT}) STRICT, WITHOUT ROWID`,
  `CREATE INDEX import_files_by_content ON import_files (shop_id, sha256)`,
  `INSERT INTO import_files (shop_id, import_id, number, name, sha256, byte_size)
    SELECT shop_id, id, 1, file_name, file_sha256, byte_size FROM imports`,
  `CREATE TABLE import_sheets (
    shop_id TEXT NOT NULL, import_id TEXT NOT NULL, sheet INTEGER NOT NULL, name TEXT, shape TEXT NOT NULL,
    -- The heading cells as JSON, and a hash of them: sheets with the same headings are of one kind. Null = no headings.
    headings TEXT, heading_print TEXT,
    -- Of each row that came in, as pairs of little-endian doubles: its row and the hash of its cells as they were.
    prints BLOB NOT NULL, PRIMARY KEY (shop_id, import_id, sheet), ${OF_IMPORT}) STRICT`,
  `CREATE INDEX import_sheets_by_headings ON import_sheets (shop_id, heading_print)`,
  `CREATE TABLE import_facts (
    shop_id TEXT NOT NULL, import_id TEXT NOT NULL, sheet INTEGER NOT NULL, row INTEGER NOT NULL, col INTEGER NOT NULL,
    kind TEXT NOT NULL, rebuild_id TEXT NOT NULL, category_id TEXT, dated_on TEXT, cents INTEGER NOT NULL,
    seconds INTEGER NOT NULL,
    -- The later import that took another figure in its place.
    replaced_by TEXT, FOREIGN KEY (shop_id, rebuild_id) REFERENCES rebuilds (shop_id, id), ${OF_IMPORT}) STRICT`,
  `CREATE INDEX import_facts_by_row ON import_facts (shop_id, import_id, sheet, row)`,
  `CREATE INDEX import_facts_by_rebuild ON import_facts (shop_id, rebuild_id)`,
  // Versions that an undo gave back: what a person changed is told from what an import changed and took back.
  ...['rebuilds', 'entries', 'hours'].map(
    (table) => `ALTER TABLE ${table} ADD COLUMN undone_versions INTEGER NOT NULL DEFAULT 0`,
  ),
  `CREATE INDEX entries_by_import ON entries (import_id, import_sheet, import_row) WHERE import_id IS NOT NULL`,
  `CREATE INDEX hours_by_import ON hours (import_id, import_sheet, import_row) WHERE import_id IS NOT NULL`,
];
