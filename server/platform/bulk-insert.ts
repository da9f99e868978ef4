import type { RawDatabase } from './database.ts';

export type Cell = string | number | null | Buffer;

const ROWS = 50;

/**
 * Inserts many rows into a table, fifty to a statement: about twice as fast as one by one. Call `flush` at the end;
 * only then is the last row written. Runs in whatever transaction is open.
 */
export function bulkInsert(raw: RawDatabase, table: string, columns: readonly string[]) {
  const row = `(${columns.map(() => '?').join(', ')})`;
  const sql = (rows: number) =>
    `INSERT INTO ${table} (${columns.join(', ')}) VALUES ${Array(rows).fill(row).join(', ')}`;
  const full = raw.prepare(sql(ROWS));
  let waiting: Cell[] = [];

  /** Values in the order of the columns. */
  function add(...values: readonly Cell[]): void {
    for (const value of values) waiting.push(value);
    if (waiting.length < ROWS * columns.length) return;
    full.run(waiting);
    waiting = [];
  }

  function flush(): void {
    if (waiting.length === 0) return;
    raw.prepare(sql(waiting.length / columns.length)).run(waiting);
    waiting = [];
  }

  return { add, flush };
}
