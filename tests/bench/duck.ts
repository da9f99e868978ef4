import { DuckDBInstance } from '@duckdb/node-api';
import { DUCK_QUESTIONS } from './duck-questions.ts';
import type { InventedLine, InventedRebuild } from './invent.ts';

const TABLES = [
  `CREATE TABLE rebuilds (id INTEGER, class INTEGER, damage INTEGER, seen BOOLEAN, bought DATE, started DATE, ready DATE,
     listed DATE, sold DATE, purchase BIGINT, sale BIGINT, own BIGINT, paid BIGINT, planned BIGINT)`,
  `CREATE TABLE plans (rebuild INTEGER, category INTEGER, cents BIGINT)`,
  `CREATE TABLE lines (rebuild INTEGER, category INTEGER, day DATE, cents BIGINT, surprise BOOLEAN)`,
];

/** The same books in DuckDB, in memory, as raw lines; asked the same questions. */
export async function duckDb(rebuilds: readonly InventedRebuild[], lines: readonly InventedLine[]) {
  const instance = await DuckDBInstance.create(':memory:');
  const db = await instance.connect();
  for (const sql of TABLES) await db.run(sql);
  const fill = async (table: string, rows: readonly (string | number | boolean | null)[][]) => {
    const text = (value: string | number | boolean | null) =>
      value === null ? 'NULL' : typeof value === 'string' ? `'${value}'` : String(value);
    for (let i = 0; i < rows.length; i += 2000) {
      const part = rows.slice(i, i + 2000).map((row) => `(${row.map(text).join(',')})`);
      await db.run(`INSERT INTO ${table} VALUES ${part.join(',')}`);
    }
  };
  await fill(
    'rebuilds',
    rebuilds.map((one, id) => [
      id,
      one.class,
      one.damage,
      one.isSeen,
      one.boughtOn,
      one.startedOn,
      one.readyOn,
      one.listedOn,
      one.soldOn,
      one.purchaseCents,
      one.saleCents,
      one.ownSeconds,
      one.paidSeconds,
      one.plannedSeconds,
    ]),
  );
  await fill(
    'plans',
    rebuilds.flatMap(({ plan }, id) => plan.flatMap((cents, category) => (cents > 0 ? [[id, category, cents]] : []))),
  );
  await fill(
    'lines',
    lines.map((line) => [line.rebuild, line.category, line.on, line.cents, line.isSurprise]),
  );
  return {
    /** Runs every query of a question and fetches its rows. */
    async ask(question: keyof typeof DUCK_QUESTIONS): Promise<void> {
      for (const sql of DUCK_QUESTIONS[question]) (await db.runAndReadAll(sql)).getRows();
    },
    close(): void {
      db.closeSync();
      instance.closeSync();
    },
  };
}
