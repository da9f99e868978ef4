import { mkdirSync } from 'node:fs';
import path from 'node:path';
import type BetterSqlite3 from 'better-sqlite3';
import createKnex, { type Knex } from 'knex';
import { migrationSource } from './migration-source.ts';
import { type WriteLock, writeLock } from './write-lock.ts';

/** The handle underneath Knex, for SQL that is run often or in bulk. Synchronous. */
export type RawDatabase = BetterSqlite3.Database;

export interface Database {
  readonly file: string;
  /** The one writing connection. Only inside `lock`. */
  readonly writer: Knex;
  /** Reads have connections of their own: they see the last commit and never wait for a writer. */
  readonly reader: Knex;
  readonly lock: WriteLock;
  close(): Promise<void>;
}

const PRAGMAS = [
  ['journal_mode', 'wal'],
  ['synchronous', 2],
  ['foreign_keys', 1],
  ['busy_timeout', 5000],
  ['trusted_schema', 0],
] as const;

/** Sets the pragmas that the books rest on and reads each back; throws if one did not take. */
export function preparePragmas(raw: RawDatabase): void {
  for (const [name, value] of PRAGMAS) {
    raw.pragma(`${name} = ${value}`);
    const actual = raw.pragma(name, { simple: true });
    if (actual !== value) throw new Error(`PRAGMA ${name} is ${String(actual)}, not ${value}`);
  }
}

function connect(file: string, connections: number): Knex {
  return createKnex({
    client: 'better-sqlite3',
    connection: { filename: file },
    useNullAsDefault: true,
    acquireConnectionTimeout: 5000,
    pool: {
      min: 1,
      max: connections,
      afterCreate(raw: RawDatabase, done: (error: Error | null, raw: RawDatabase) => void) {
        preparePragmas(raw);
        done(null, raw);
      },
    },
  });
}

/** The raw handle that a Knex instance or transaction runs on; inside a transaction it is that transaction's own. */
export async function rawHandle(db: Knex): Promise<RawDatabase> {
  const client = db.client as {
    acquireConnection(): Promise<RawDatabase>;
    releaseConnection(raw: RawDatabase): Promise<void>;
  };
  const raw = await client.acquireConnection();
  await client.releaseConnection(raw);
  return raw;
}

/**
 * Brings the file's tables up to date. Foreign keys are off meanwhile, since a migration that rebuilds a table
 * would empty its children otherwise; every key is checked before they count again.
 */
export async function migrate(file: string): Promise<void> {
  const db = connect(file, 1);
  try {
    const raw = await rawHandle(db);
    raw.pragma('foreign_keys = OFF');
    await db.migrate.latest({ migrationSource });
    const broken = raw.pragma('foreign_key_check') as unknown[];
    if (broken.length > 0) throw new Error(`${broken.length} rows point at nothing after the migration`);
  } finally {
    await db.destroy();
  }
}

/** Opens (and makes, if need be) the warehouse under `dataDir`, with its tables up to date. */
export async function openDatabase(dataDir: string): Promise<Database> {
  mkdirSync(dataDir, { recursive: true });
  const file = path.join(dataDir, 'panelgap.sqlite');
  await migrate(file);
  const writer = connect(file, 1);
  const reader = connect(file, 2);
  return {
    file,
    writer,
    reader,
    lock: writeLock(),
    async close() {
      await reader.destroy();
      await writer.destroy();
    },
  };
}
