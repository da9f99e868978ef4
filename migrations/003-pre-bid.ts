import type { Knex } from 'knex';
import { dayCheck } from '../server/platform/ddl.ts';

/** Pre-bid sheets: what a bid costs in this shop, and the sheets that were kept. */
export async function up(db: Knex): Promise<void> {
  for (const sql of [FEE_TABLES, BID_SHEETS, SHEETS_BY_TIME, SURPRISES]) await db.raw(sql);
}

const MOST = 1_000_000_000_000;
const cents = (column: string) => `${column} INTEGER CHECK (${column} BETWEEN 0 AND ${MOST})`;
const usual = (column: string) => `${column} INTEGER NOT NULL DEFAULT 0 CHECK (${column} BETWEEN 0 AND ${MOST})`;

/** One per shop. `fee_steps` = [[from, fee], …] in cents, rising in `from`; they are only ever read together. */
const FEE_TABLES = `CREATE TABLE fee_tables (
  shop_id TEXT PRIMARY KEY REFERENCES shops (id), fee_steps TEXT NOT NULL DEFAULT '[]' CHECK (json_valid(fee_steps)),
  ${usual('fee_flat_cents')}, bid_step_cents INTEGER NOT NULL DEFAULT 5000 CHECK (bid_step_cents BETWEEN 1 AND ${MOST}),
  tax_p INTEGER NOT NULL DEFAULT 0 CHECK (tax_p >= 0), tax_q INTEGER NOT NULL DEFAULT 1 CHECK (tax_q >= 1),
  ${usual('transport_cents')}, ${usual('title_cents')}, ${usual('selling_cents')}, ${usual('holding_cents_per_day')},
  ${usual('wanted_profit_cents')}, version INTEGER NOT NULL DEFAULT 1) STRICT`;

/** `fields` = everything else typed on the sheet; `figures` = what it came to on the books of `books_version`. */
const BID_SHEETS = `CREATE TABLE bid_sheets (
  id TEXT NOT NULL, shop_id TEXT NOT NULL REFERENCES shops (id), name TEXT NOT NULL, class_id TEXT, damage_id TEXT,
  second_damage_id TEXT, is_seen INTEGER CHECK (is_seen IN (0, 1)), ${cents('expected_sale_cents')},
  fields TEXT NOT NULL CHECK (json_valid(fields)), figures TEXT NOT NULL CHECK (json_valid(figures)),
  books_version INTEGER NOT NULL,
  state TEXT NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'bought', 'not bought')),
  reason TEXT, ${cents('bid_made_cents')}, ${cents('hammer_cents')}, rebuild_id TEXT,
  ${dayCheck('made_on')}, made_by TEXT NOT NULL REFERENCES users (id), version INTEGER NOT NULL DEFAULT 1,
  created_at TEXT NOT NULL, PRIMARY KEY (shop_id, id),
  CHECK ((state = 'bought') = (rebuild_id IS NOT NULL)),
  CHECK (state <> 'not bought' OR reason IS NOT NULL),
  FOREIGN KEY (shop_id, class_id) REFERENCES vehicle_classes (shop_id, id),
  FOREIGN KEY (shop_id, damage_id) REFERENCES damage_types (shop_id, id),
  FOREIGN KEY (shop_id, second_damage_id) REFERENCES damage_types (shop_id, id),
  FOREIGN KEY (shop_id, rebuild_id) REFERENCES rebuilds (shop_id, id)) STRICT`;
const SHEETS_BY_TIME = `CREATE INDEX bid_sheets_by_time ON bid_sheets (shop_id, created_at, id)`;

/** What surprised on such cars is asked of all entries at once; few of them are surprises. */
const SURPRISES = `CREATE INDEX entries_surprises ON entries (shop_id, rebuild_id)
  WHERE foreseen = 'surprise' AND voided_at IS NULL`;
