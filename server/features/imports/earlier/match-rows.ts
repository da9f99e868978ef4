import { fold } from '../cells/fold.ts';
import { sha256 } from '../../../platform/ids.ts';
import type { ExistingRebuild } from '../books.ts';
import type { Heading } from '../read/plan.ts';
import type { SurveyedTable } from '../understand/file-plan.ts';
import { vehicleName } from '../understand/vehicle-columns.ts';
import { isAlike, pairRows } from './pair-rows.ts';
import type { PastRow, PastSheet } from './past.ts';

/** A row of today that stands in the books. */
export interface Twin {
  /** The row that it was then, newest first: a vehicle's row may have come in piece by piece. */
  readonly from: readonly PastRow[];
  /** What it held then, by today's columns; null = the same to the letter. */
  readonly old: readonly string[] | null;
  /** Today's column → its column then. */
  readonly oldCol: (col: number) => number | null;
  readonly rebuildId: string | null;
  readonly match: SheetMatch;
}

/** What today's sheets share with one sheet of an earlier import. */
export interface SheetMatch {
  readonly past: PastSheet;
  readonly rows: number;
  sameRows: number;
}

export interface Matched {
  /** Sheet → line → what it was. */
  readonly twins: ReadonlyMap<number, ReadonlyMap<number, Twin>>;
  readonly matches: readonly SheetMatch[];
}

const FEWEST = 3;
const MOST_HEADINGS = 0.6;

/**
 * How vehicles were spelled in the files that today's carry on, and the rebuilds that they are: nobody is asked twice. Only
 * where half of the rows are the same: in other files the same words may be another car.
 */
export function spelledBefore(
  { matches, twins }: Matched,
  rebuilds: readonly ExistingRebuild[],
): ReadonlyMap<string, ExistingRebuild> {
  const byId = new Map(rebuilds.map((rebuild) => [rebuild.id, rebuild]));
  const spelled = new Map<string, ExistingRebuild>();
  for (const match of matches) {
    const own = match.past.shape === 'vehicles' ? countTwins(twins, match) : match.sameRows;
    if (own * 2 < match.rows || own === 0) continue;
    for (const [spelling, id] of match.past.vehicles()) {
      const rebuild = byId.get(id);
      if (rebuild) spelled.set(fold(spelling), rebuild);
    }
  }
  return spelled;
}

function countTwins(twins: Matched['twins'], match: SheetMatch): number {
  let count = 0;
  for (const lines of twins.values()) for (const twin of lines.values()) if (twin.match === match) count++;
  return count;
}

/** What tells sheets of one kind: the words of their headings. null = there are none. */
export const headingPrint = ({ line, cells }: Heading): string | null =>
  line === 0 ? null : sha256(cells.map(fold).join('|').replace(/\|+$/, ''));

/** Today's sheet while its rows find their equals. */
function sideOf({ guess, found }: SurveyedTable) {
  const waiting = new Map<number, number[]>();
  const { hashes, lines: all } = found.rows.prints;
  hashes.forEach((hash, i) => {
    const lines = waiting.get(hash);
    if (lines) lines.push(all[i] as number);
    else waiting.set(hash, [all[i] as number]);
  });
  const rests: { match: SheetMatch; rows: number[]; same: Map<number, number> }[] = [];
  return { guess, waiting, rests, count: all.length, twins: new Map<number, Twin>() };
}
type Side = ReturnType<typeof sideOf>;

/**
 * Finds the rows of today's files that came in before: equal rows one to one, so that honest repeats stay honest, and then
 * those that were changed since.
 */
export function matchEarlier(tables: readonly SurveyedTable[], past: readonly PastSheet[]): Matched {
  if (past.length === 0) return { twins: new Map(), matches: [] };
  const sides = tables.filter(({ guess }) => guess.shape !== null).map(sideOf);
  const matches: SheetMatch[] = [];
  for (const sheet of past) {
    const prints = sheet.prints();
    const fits = sides
      .map((side) => ({ side, common: commonRows(side, prints) }))
      .filter(({ side, common }) => isContinued(side, sheet, common, prints.length))
      .sort((a, b) => b.common - a.common);
    const [best] = fits;
    if (!best) continue;
    const match: SheetMatch = { past: sheet, rows: prints.length, sameRows: 0 };
    matches.push(match);
    let rest = prints;
    for (const { side } of fits) rest = takeEqual(side, match, rest, side === best.side);
  }
  for (const side of sides) pairChanged(side);
  return { twins: new Map(sides.map(({ guess, twins }) => [guess.sheet.number, twins])), matches };
}

function commonRows({ waiting }: Side, prints: ReturnType<PastSheet['prints']>): number {
  const used = new Map<number, number>();
  let common = 0;
  for (const [, hash] of prints) {
    const times = used.get(hash) ?? 0;
    if (times >= (waiting.get(hash)?.length ?? 0)) continue;
    used.set(hash, times + 1);
    common++;
  }
  return common;
}

function isContinued({ guess, count }: Side, past: PastSheet, common: number, rows: number): boolean {
  if (guess.shape !== past.shape) return false;
  const print = headingPrint(guess.heading);
  if (print !== null && print === past.headingPrint) return true;
  if (guess.shape === 'vehicles' && haveLikeHeadings(guess.heading, past)) return true;
  return common >= FEWEST && common * 2 >= Math.min(rows, count);
}

function haveLikeHeadings(heading: Heading, { headings }: PastSheet): boolean {
  const now = new Set(heading.cells.map(fold));
  const then = (headings ?? []).map(fold).filter((word) => word !== '');
  return then.length > 0 && then.filter((word) => now.has(word)).length >= then.length * MOST_HEADINGS;
}

/** Gives every row of then that is left an equal of today, in order; the rest stays for other sheets. */
function takeEqual(side: Side, match: SheetMatch, prints: ReturnType<PastSheet['prints']>, isBest: boolean) {
  const { importId, sheet } = match.past;
  const rebuilds = side.guess.shape === 'vehicles' ? match.past.rebuilds() : null;
  const same = new Map<number, number>();
  const rest = prints.filter(([row, hash]) => {
    const line = side.waiting.get(hash)?.shift();
    if (line === undefined) return true;
    same.set(row, line);
    const rebuildId = rebuilds?.get(row) ?? null;
    side.twins.set(line, { from: [{ importId, sheet, row }], old: null, oldCol: (col) => col, rebuildId, match });
    return false;
  });
  match.sameRows += same.size;
  if (isBest) side.rests.unshift({ match, rows: rest.map(([row]) => row), same });
  return rest;
}

/** Pairs what is left of today with what is left of then, newest import first. */
function pairChanged(side: Side): void {
  if (side.rests.every(({ rows }) => rows.length === 0)) return;
  const lines = new Set([...side.waiting.values()].flat());
  const now = new Map<number, readonly string[]>();
  side.guess.sheet.forEachRow((cells, line) => {
    if (lines.has(line)) now.set(line, cells);
  });
  for (const { match, rows, same } of side.rests) {
    const oldCol = columnsThen(side.guess.heading, match.past);
    const width = side.guess.heading.cells.length;
    const then = new Map(
      [...match.past.cellsOf(rows)].map(([row, cells]) => [row, byToday(cells, oldCol, width)] as const),
    );
    if (side.guess.shape === 'vehicles') pairVehicles(side, match, { past: then, now, oldCol });
    else
      for (const [line, row] of pairRows(then, now, same)) {
        keepPair(side, match, { line, row, old: then.get(row) ?? [], oldCol, rebuildId: null });
        now.delete(line);
      }
  }
}

function pairVehicles(
  side: Side,
  match: SheetMatch,
  {
    past: then,
    now,
    oldCol,
  }: { past: ReadonlyMap<number, readonly string[]>; now: ReadonlyMap<number, readonly string[]> } & Pick<
    Twin,
    'oldCol'
  >,
): void {
  const nameOf = vehicleName(side.guess.columns);
  const rebuilds = match.past.rebuilds();
  const waiting = new Map<string, number[]>();
  for (const [row, cells] of then) {
    const name = fold(nameOf(cells));
    if (name !== '') waiting.set(name, [...(waiting.get(name) ?? []), row]);
  }
  for (const [line, cells] of now) {
    const rows = waiting.get(fold(nameOf(cells))) ?? [];
    const at = rows.findIndex((row) => isAlike(then.get(row) ?? [], cells));
    if (at < 0) continue;
    const [row] = rows.splice(at, 1) as [number];
    keepPair(side, match, { line, row, old: then.get(row) ?? [], oldCol, rebuildId: rebuilds.get(row) ?? null });
  }
}

function keepPair(
  { twins }: Side,
  match: SheetMatch,
  { line, row, ...pair }: Omit<Twin, 'from' | 'match'> & { line: number; row: number },
): void {
  const from = { importId: match.past.importId, sheet: match.past.sheet, row };
  const newer = twins.get(line);
  twins.set(line, newer ? { ...newer, from: [...newer.from, from] } : { ...pair, from: [from], match });
}

/** Where a column of today stood then, by its heading. */
function columnsThen(heading: Heading, past: PastSheet): Twin['oldCol'] {
  if (past.headings === null || headingPrint(heading) === past.headingPrint) return (col) => col;
  const then = past.headings.map(fold);
  const cols = new Map(heading.cells.map((cell, at) => [at + 1, then.indexOf(fold(cell)) + 1 || null]));
  return (col) => cols.get(col) ?? null;
}

function byToday(cells: readonly string[], oldCol: Twin['oldCol'], width: number): string[] {
  return Array.from({ length: Math.max(width, cells.length) }, (_, at) => {
    const col = oldCol(at + 1);
    return col === null ? '' : (cells[col - 1] ?? '');
  });
}
