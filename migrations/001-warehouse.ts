import type { Knex } from 'knex';
import { appendOnly, dayCheck } from '../server/platform/ddl.ts';

/**
 * The warehouse of rebuilds: shops and people, the books, imports, adopted rules and the trail.
 * Every table below a shop carries `shop_id` in its keys, so the database itself refuses a child of another shop.
 */
export async function up(db: Knex): Promise<void> {
  for (const sql of [...SHOPS_AND_PEOPLE, ...LISTS, ...BOOKS, ...IMPORTS, ...RULES, ...TRAIL]) await db.raw(sql);
}

const ROLE = `('owner', 'bookkeeper', 'mechanic', 'partner', 'accountant')`;
const EXIT = `('parted out', 'scrapped', 'own use', 'resold as it stood', 'swapped', 'stolen')`;
const cents = (column: string) => `${column} INTEGER CHECK (${column} BETWEEN -1000000000000 AND 1000000000000)`;

const SHOPS_AND_PEOPLE = [
  `CREATE TABLE shops (
    id TEXT PRIMARY KEY, name TEXT NOT NULL, currency TEXT NOT NULL, locale TEXT NOT NULL, time_zone TEXT NOT NULL,
    year_start_month INTEGER NOT NULL DEFAULT 1 CHECK (year_start_month BETWEEN 1 AND 12),
    wanted_cents_per_hour INTEGER CHECK (wanted_cents_per_hour >= 0),
    is_demo INTEGER NOT NULL DEFAULT 0, ${dayCheck('fixed_today')},
    books_version INTEGER NOT NULL DEFAULT 0, version INTEGER NOT NULL DEFAULT 1, created_at TEXT NOT NULL) STRICT`,
  `CREATE TABLE users (
    id TEXT PRIMARY KEY, email TEXT NOT NULL UNIQUE, name TEXT NOT NULL, password_hash TEXT NOT NULL,
    created_at TEXT NOT NULL) STRICT`,
  `CREATE TABLE memberships (
    shop_id TEXT NOT NULL REFERENCES shops (id), user_id TEXT NOT NULL REFERENCES users (id),
    role TEXT NOT NULL CHECK (role IN ${ROLE}), version INTEGER NOT NULL DEFAULT 1, joined_at TEXT NOT NULL,
    PRIMARY KEY (shop_id, user_id)) STRICT`,
  `CREATE INDEX memberships_by_user ON memberships (user_id)`,
  `CREATE TABLE invitations (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), token_hash TEXT NOT NULL UNIQUE,
    email TEXT NOT NULL, role TEXT NOT NULL CHECK (role IN ${ROLE}), invited_by TEXT NOT NULL REFERENCES users (id),
    created_at TEXT NOT NULL, expires_at TEXT NOT NULL, used_at TEXT, used_by TEXT REFERENCES users (id),
    withdrawn_at TEXT, PRIMARY KEY (shop_id, id)) STRICT`,
  `CREATE TABLE sessions (
    id TEXT PRIMARY KEY, user_id TEXT NOT NULL REFERENCES users (id), shop_id TEXT REFERENCES shops (id),
    expires_at INTEGER NOT NULL, created_at INTEGER NOT NULL, user_agent TEXT) STRICT`,
  `CREATE INDEX sessions_by_user ON sessions (user_id)`,
  `CREATE TABLE sign_in_failures (subject TEXT NOT NULL, failed_at INTEGER NOT NULL) STRICT`,
  `CREATE INDEX sign_in_failures_by_subject ON sign_in_failures (subject, failed_at)`,
];

const list = (table: string, extra = '') =>
  `CREATE TABLE ${table} (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), name TEXT NOT NULL, position INTEGER NOT NULL,
    is_retired INTEGER NOT NULL DEFAULT 0, ${extra} version INTEGER NOT NULL DEFAULT 1,
    PRIMARY KEY (shop_id, id)) STRICT`;

const LISTS = [
  list('vehicle_classes'),
  list('damage_types'),
  list('categories', 'is_paid_labor INTEGER NOT NULL DEFAULT 0,'),
  ...['vehicle_classes', 'damage_types', 'categories'].map(
    (table) => `CREATE UNIQUE INDEX ${table}_by_name ON ${table} (shop_id, name COLLATE NOCASE)`,
  ),
  `CREATE TABLE workers (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), name TEXT NOT NULL,
    is_paid INTEGER NOT NULL, user_id TEXT REFERENCES users (id), is_retired INTEGER NOT NULL DEFAULT 0,
    version INTEGER NOT NULL DEFAULT 1, PRIMARY KEY (shop_id, id)) STRICT`,
  `CREATE UNIQUE INDEX workers_by_name ON workers (shop_id, name COLLATE NOCASE)`,
];

const DATES = [
  'bought_on',
  'paid_on',
  'picked_up_on',
  'started_on',
  'roadworthy_on',
  'inspected_on',
  'title_issued_on',
  'listed_on',
  'sold_on',
  'settled_on',
]
  .map(dayCheck)
  .join(', ');

const SOURCE = 'import_id TEXT, import_sheet INTEGER, import_row INTEGER, import_col INTEGER';
const FROM_IMPORT = 'FOREIGN KEY (shop_id, import_id) REFERENCES imports (shop_id, id)';
const OF_REBUILD = 'FOREIGN KEY (shop_id, rebuild_id) REFERENCES rebuilds (shop_id, id)';
const OF_CATEGORY = 'FOREIGN KEY (shop_id, category_id) REFERENCES categories (shop_id, id)';

const BOOKS = [
  `CREATE TABLE rebuilds (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), tag TEXT NOT NULL,
    year INTEGER CHECK (year BETWEEN 1886 AND 2100), make TEXT, model TEXT, trim TEXT, vin TEXT,
    class_id TEXT, damage_id TEXT, second_damage_id TEXT, is_seen INTEGER CHECK (is_seen IN (0, 1)),
    title_brand_bought TEXT, title_brand_sold TEXT, odometer INTEGER CHECK (odometer >= 0), bought_from TEXT,
    ${cents('purchase_cents')}, ${cents('asking_cents')}, ${cents('sale_cents')}, buyer_channel TEXT,
    ${DATES}, exit_kind TEXT CHECK (exit_kind IN ${EXIT}), ${dayCheck('exit_on')}, ${cents('exit_cents')},
    notes TEXT, lessons TEXT, ${SOURCE}, version INTEGER NOT NULL DEFAULT 1, created_at TEXT NOT NULL,
    PRIMARY KEY (shop_id, id),
    CHECK (sold_on IS NULL OR sale_cents IS NOT NULL),
    CHECK ((exit_kind IS NULL) = (exit_on IS NULL) AND (exit_kind IS NULL) = (exit_cents IS NULL)),
    CHECK (exit_kind IS NULL OR (sold_on IS NULL AND sale_cents IS NULL)),
    FOREIGN KEY (shop_id, class_id) REFERENCES vehicle_classes (shop_id, id),
    FOREIGN KEY (shop_id, damage_id) REFERENCES damage_types (shop_id, id),
    FOREIGN KEY (shop_id, second_damage_id) REFERENCES damage_types (shop_id, id), ${FROM_IMPORT}) STRICT`,
  `CREATE UNIQUE INDEX rebuilds_by_tag ON rebuilds (shop_id, tag COLLATE NOCASE)`,
  `CREATE TABLE estimates (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), rebuild_id TEXT NOT NULL,
    revision INTEGER NOT NULL CHECK (revision >= 0), is_baseline INTEGER NOT NULL DEFAULT 0, ${dayCheck('made_on')},
    planned_seconds INTEGER CHECK (planned_seconds >= 0), ${cents('expected_sale_cents')},
    expected_days INTEGER CHECK (expected_days >= 0), note TEXT, locked_at TEXT, import_id TEXT,
    version INTEGER NOT NULL DEFAULT 1, created_at TEXT NOT NULL,
    PRIMARY KEY (shop_id, id), UNIQUE (shop_id, rebuild_id, revision), ${OF_REBUILD}, ${FROM_IMPORT}) STRICT`,
  `CREATE UNIQUE INDEX estimates_one_baseline ON estimates (shop_id, rebuild_id) WHERE is_baseline = 1`,
  `CREATE TABLE estimate_lines (
    shop_id TEXT NOT NULL, estimate_id TEXT NOT NULL, category_id TEXT NOT NULL,
    cents INTEGER NOT NULL CHECK (cents BETWEEN 0 AND 1000000000000),
    PRIMARY KEY (shop_id, estimate_id, category_id),
    FOREIGN KEY (shop_id, estimate_id) REFERENCES estimates (shop_id, id), ${OF_CATEGORY}) STRICT, WITHOUT ROWID`,
  `CREATE TABLE splits (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), cents INTEGER NOT NULL, created_at TEXT NOT NULL,
    PRIMARY KEY (shop_id, id)) STRICT`,
  `CREATE TABLE entries (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), rebuild_id TEXT, category_id TEXT NOT NULL,
    ${dayCheck('dated_on')}, cents INTEGER NOT NULL CHECK (cents BETWEEN -1000000000000 AND 1000000000000),
    vendor TEXT, what TEXT, foreseen TEXT CHECK (foreseen IN ('foreseen', 'surprise')),
    is_extra INTEGER NOT NULL DEFAULT 0 CHECK (is_extra IN (0, 1)),
    free_value_cents INTEGER CHECK (free_value_cents BETWEEN 0 AND 1000000000000), receipt TEXT, split_id TEXT,
    is_guess INTEGER NOT NULL DEFAULT 0, ${SOURCE},
    voided_at TEXT, voided_by TEXT REFERENCES users (id), void_reason TEXT,
    version INTEGER NOT NULL DEFAULT 1, created_at TEXT NOT NULL, created_by TEXT REFERENCES users (id),
    PRIMARY KEY (shop_id, id),
    CHECK (free_value_cents IS NULL OR cents = 0),
    CHECK (rebuild_id IS NOT NULL OR dated_on IS NOT NULL),
    CHECK ((voided_at IS NULL) = (void_reason IS NULL)),
    ${OF_REBUILD}, ${OF_CATEGORY}, FOREIGN KEY (shop_id, split_id) REFERENCES splits (shop_id, id),
    ${FROM_IMPORT}) STRICT`,
  `CREATE INDEX entries_by_rebuild ON entries (shop_id, rebuild_id)`,
  `CREATE INDEX entries_by_day ON entries (shop_id, dated_on)`,
  `CREATE INDEX entries_by_split ON entries (shop_id, split_id) WHERE split_id IS NOT NULL`,
  `CREATE TABLE hours (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), rebuild_id TEXT NOT NULL, worker_id TEXT,
    ${dayCheck('worked_on')}, seconds INTEGER NOT NULL CHECK (seconds BETWEEN 0 AND 1000000000),
    is_paid INTEGER NOT NULL CHECK (is_paid IN (0, 1)), task TEXT, is_guess INTEGER NOT NULL DEFAULT 0, ${SOURCE},
    voided_at TEXT, voided_by TEXT REFERENCES users (id), void_reason TEXT,
    version INTEGER NOT NULL DEFAULT 1, created_at TEXT NOT NULL, created_by TEXT REFERENCES users (id),
    PRIMARY KEY (shop_id, id), CHECK ((voided_at IS NULL) = (void_reason IS NULL)),
    ${OF_REBUILD}, FOREIGN KEY (shop_id, worker_id) REFERENCES workers (shop_id, id), ${FROM_IMPORT}) STRICT`,
  `CREATE INDEX hours_by_rebuild ON hours (shop_id, rebuild_id)`,
  `CREATE INDEX hours_by_day ON hours (shop_id, worked_on)`,
  `CREATE TABLE rollup_categories (
    shop_id TEXT NOT NULL, rebuild_id TEXT NOT NULL, category_id TEXT NOT NULL, paid_cents INTEGER NOT NULL,
    planning_cents INTEGER NOT NULL, unforeseen_cents INTEGER NOT NULL, surprise_count INTEGER NOT NULL,
    surprise_planning_cents INTEGER NOT NULL, extra_cents INTEGER NOT NULL, free_cents INTEGER NOT NULL,
    entry_count INTEGER NOT NULL, PRIMARY KEY (shop_id, rebuild_id, category_id)) STRICT, WITHOUT ROWID`,
  `CREATE TABLE rollup_rebuilds (
    shop_id TEXT NOT NULL, rebuild_id TEXT NOT NULL, paid_cents INTEGER NOT NULL, entry_count INTEGER NOT NULL,
    undated_count INTEGER NOT NULL, unknown_foreseen_count INTEGER NOT NULL, late_count INTEGER NOT NULL,
    late_cents INTEGER NOT NULL, own_seconds INTEGER, paid_seconds INTEGER, planning_cents INTEGER NOT NULL,
    surprise_planning_cents INTEGER NOT NULL, paid_labor_cents INTEGER NOT NULL, estimate_cents INTEGER NOT NULL,
    -- A table with row numbers, since its rows are long: a lookup in the other kind reads whole rows on its way.
    -- The categories' sums and the locked estimate once more, each as one JSON text: answers read every rebuild.
    category_sums TEXT NOT NULL, baseline TEXT NOT NULL,
    -- The version of the books that these sums belong to: who has older facts reads again only what changed since.
    refreshed_version INTEGER NOT NULL, xirr REAL,
    -- Net cash flow per day as pairs of little-endian doubles (day number, cents); null while it has no exit.
    flows BLOB, PRIMARY KEY (shop_id, rebuild_id)) STRICT`,
  `CREATE TABLE rollup_months (
    shop_id TEXT NOT NULL, rebuild_id TEXT NOT NULL, month TEXT NOT NULL, paid_cents INTEGER NOT NULL,
    PRIMARY KEY (shop_id, rebuild_id, month)) STRICT, WITHOUT ROWID`,
  `CREATE TABLE rollup_overhead (
    shop_id TEXT NOT NULL, dated_on TEXT NOT NULL, category_id TEXT NOT NULL, paid_cents INTEGER NOT NULL,
    entry_count INTEGER NOT NULL, PRIMARY KEY (shop_id, dated_on, category_id)) STRICT, WITHOUT ROWID`,
];

const IMPORTS = [
  `CREATE TABLE imports (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), file_name TEXT NOT NULL, file_sha256 TEXT NOT NULL,
    byte_size INTEGER NOT NULL,
    state TEXT NOT NULL CHECK (state IN ('reading', 'ready', 'committing', 'committed', 'undone', 'refused', 'discarded')),
    shape TEXT, mapping TEXT, reading TEXT, refusal TEXT, created_by TEXT NOT NULL REFERENCES users (id),
    created_at TEXT NOT NULL, committed_at TEXT, committed_version INTEGER, undone_at TEXT,
    version INTEGER NOT NULL DEFAULT 1, PRIMARY KEY (shop_id, id)) STRICT`,
  `CREATE INDEX imports_by_file ON imports (shop_id, file_sha256)`,
  `CREATE TABLE import_rows (
    shop_id TEXT NOT NULL, import_id TEXT NOT NULL, sheet INTEGER NOT NULL, row INTEGER NOT NULL, cells TEXT NOT NULL,
    outcome TEXT NOT NULL CHECK (outcome IN ('taken', 'put aside', 'not data')), reason TEXT,
    PRIMARY KEY (shop_id, import_id, sheet, row),
    FOREIGN KEY (shop_id, import_id) REFERENCES imports (shop_id, id)) STRICT, WITHOUT ROWID`,
];

const RULES = [
  `CREATE TABLE contingency_rules (
    id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), year INTEGER NOT NULL, revision INTEGER NOT NULL,
    kind TEXT NOT NULL CHECK (kind IN ('percent', 'two-part')), level TEXT NOT NULL,
    percent INTEGER NOT NULL CHECK (percent BETWEEN 0 AND 1000), ${cents('flat_cents')},
    rebuild_count INTEGER NOT NULL, ${dayCheck('data_until')}, evidence TEXT NOT NULL, note TEXT,
    adopted_on TEXT NOT NULL, adopted_at TEXT NOT NULL, adopted_by TEXT NOT NULL REFERENCES users (id),
    PRIMARY KEY (shop_id, id), UNIQUE (shop_id, year, revision)) STRICT`,
];

const TRAIL = [
  `CREATE TABLE trail (
    number INTEGER PRIMARY KEY AUTOINCREMENT, shop_id TEXT NOT NULL REFERENCES shops (id), happened_at TEXT NOT NULL,
    actor_id TEXT REFERENCES users (id), request_id TEXT NOT NULL, action TEXT NOT NULL, subject TEXT NOT NULL,
    subject_id TEXT, before TEXT, after TEXT, previous_hash TEXT NOT NULL, hash TEXT NOT NULL) STRICT`,
  `CREATE INDEX trail_by_shop ON trail (shop_id, number)`,
  `CREATE INDEX trail_by_subject ON trail (shop_id, subject, subject_id)`,
  ...appendOnly('trail'),
  `CREATE TABLE idempotency_keys (
    shop_id TEXT NOT NULL REFERENCES shops (id), user_id TEXT NOT NULL REFERENCES users (id), key TEXT NOT NULL,
    fingerprint TEXT NOT NULL, status INTEGER NOT NULL, version INTEGER, body TEXT NOT NULL, created_at TEXT NOT NULL,
    PRIMARY KEY (shop_id, user_id, key)) STRICT`,
];
