/** Turns database rows (snake_case, 0/1) into objects (camelCase, booleans) and back. */

const camel = (name: string) => name.replace(/_([a-z0-9])/g, (_, letter: string) => letter.toUpperCase());
const snake = (name: string) => name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);

/** Some fields of a T: a field left out (or undefined) stays as it is. */
export type Patch<T> = { readonly [K in keyof T]?: T[K] | undefined };

/** What `before` becomes by a change: fields left out stay, null clears. */
export function patched<T extends object>(before: T, change: Patch<T>): T {
  const given = Object.entries(change).filter(([, value]) => value !== undefined);
  return { ...before, ...Object.fromEntries(given) };
}

/** A row as an object of type T. Columns that start with `is_` become booleans; null stays null. */
export function fromRow<T>(row: object): T {
  const result: Record<string, unknown> = {};
  for (const [column, value] of Object.entries(row)) {
    result[camel(column)] = column.startsWith('is_') && value !== null ? value === 1 : value;
  }
  return result as T;
}

/** An object as a row; fields that are undefined are left out, so that "left out" means "leave". */
export function toRow(object: object): Record<string, string | number | null> {
  const row: Record<string, string | number | null> = {};
  for (const [field, value] of Object.entries(object)) {
    if (value !== undefined) row[snake(field)] = typeof value === 'boolean' ? Number(value) : value;
  }
  return row;
}
