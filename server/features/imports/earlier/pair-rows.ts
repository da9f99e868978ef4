import { rowHash } from '../understand/repeats.ts';

type Cells = readonly string[];
/** Rows that found no equal, in the order of their file. */
type Rows = ReadonlyMap<number, Cells>;

const FEWEST_EQUAL = 2;

/**
 * Pairs rows of today that look like a row of then with something changed: all cells but one are the same, or they stand
 * at the same place between rows that are the same, and half their cells are. `same`: row of then → row of today.
 */
export function pairRows(then: Rows, now: Rows, same: ReadonlyMap<number, number>): Map<number, number> {
  const pairs = byAllButOne(then, now);
  const known = new Map(same);
  for (const [line, row] of pairs) known.set(row, line);
  const places = placesOf([...then.keys(), ...same.keys()], (row) => known.get(row) ?? null);
  const lines = new Set(known.values());
  for (const [line, key] of placesOf([...now.keys(), ...same.values()], (at) => (lines.has(at) ? at : null)).byRow) {
    const row = places.byKey.get(key);
    if (row !== undefined && isAlike(then.get(row) ?? [], now.get(line) ?? [])) pairs.set(line, row);
  }
  return pairs;
}

function byAllButOne(then: Rows, now: Rows): Map<number, number> {
  const waiting = new Map<string, number[]>();
  let width = 0;
  for (const rows of [then, now]) for (const { length } of rows.values()) width = Math.max(width, length);
  const keysOf = (cells: Cells) => Array.from({ length: width }, (_, at) => `${at}:${rowHash(cells.with(at, ''))}`);
  const filledUp = (cells: Cells) => [...cells, ...Array<string>(width - cells.length).fill('')];
  for (const [row, cells] of then) {
    for (const key of keysOf(filledUp(cells))) {
      const rows = waiting.get(key);
      if (rows) rows.push(row);
      else waiting.set(key, [row]);
    }
  }
  const pairs = new Map<number, number>();
  const taken = new Set<number>();
  for (const [line, cells] of now) {
    const fits = keysOf(filledUp(cells)).flatMap((key) => waiting.get(key) ?? []);
    const row = fits.find((fit) => !taken.has(fit) && isAlike(then.get(fit) ?? [], cells));
    if (row === undefined) continue;
    taken.add(row);
    pairs.set(line, row);
  }
  return pairs;
}

/** Where rows without an equal stand: after which row that has one, as how many-th. */
function placesOf(rows: readonly number[], anchorOf: (row: number) => number | null) {
  const byKey = new Map<string, number>();
  const byRow = new Map<number, string>();
  let anchor = 0;
  let after = 0;
  for (const row of rows.toSorted((a, b) => a - b)) {
    const found = anchorOf(row);
    if (found !== null) {
      anchor = found;
      after = 0;
      continue;
    }
    const key = `${anchor}:${++after}`;
    byKey.set(key, row);
    byRow.set(row, key);
  }
  return { byKey, byRow };
}

/** Are at least half of their cells the same, and at least two? */
export function isAlike(a: Cells, b: Cells): boolean {
  const filled = (cells: Cells) => cells.filter((cell) => cell.trim() !== '').length;
  const equal = a.filter((cell, at) => cell.trim() !== '' && cell.trim() === (b[at] ?? '').trim()).length;
  return equal >= FEWEST_EQUAL && equal * 2 >= Math.max(filled(a), filled(b));
}
