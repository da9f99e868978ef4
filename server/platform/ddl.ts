/** Pieces of SQLite's own SQL that migrations are made of. */

/** A nullable column that takes only days that exist, as `YYYY-MM-DD` within 1950–2100. */
export function dayCheck(column: string): string {
  return `${column} TEXT CHECK (${column} BETWEEN '1950-01-01' AND '2100-12-31' AND date(${column}) = ${column})`;
}

/** Triggers that refuse to change or remove a row of `table`. */
export function appendOnly(table: string): string[] {
  return ['UPDATE', 'DELETE'].map(
    (verb) =>
      `CREATE TRIGGER ${table}_no_${verb.toLowerCase()} BEFORE ${verb} ON ${table}
       BEGIN SELECT RAISE(ABORT, '${table} is append-only'); END`,
  );
}
