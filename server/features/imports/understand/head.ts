import { looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import type { Sheet } from '../sheets/sheet.ts';
import { tradeMeaning } from '../words/categories.ts';
import { headingMeanings, plannedPart } from '../words/headings.ts';
import { madeHeadings } from './made-headings.ts';
import { overQualifiers, underGroups, withUnits } from './two-row-headings.ts';

const LOOKED_AT = 500;
const DEEPEST_HEADING = 40;

export interface HeadRow {
  readonly cells: readonly string[];
  readonly line: number;
}

/** The start of a file, cut at its heading row. */
export interface Head {
  readonly above: readonly HeadRow[];
  /** null = no row reads like headings. */
  readonly heading: HeadRow | null;
  /** The line of its last row, when the headings take two. */
  readonly last: number;
  readonly below: readonly HeadRow[];
}

class Enough extends Error {}

/** Reads the first rows of a sheet and finds its heading row among them. */
export function readHead(sheet: Sheet, thisYear: number): Head {
  const rows: HeadRow[] = [];
  try {
    sheet.forEachRow((cells, line) => {
      rows.push({ cells, line });
      if (rows.length === LOOKED_AT) throw new Enough();
    });
  } catch (error) {
    if (!(error instanceof Enough)) throw error;
  }
  return cutAtHeading(rows, thisYear);
}

/** The heading row is the one with most known words and no figures; a table needs at least three cells of it filled. */
export function cutAtHeading(rows: readonly HeadRow[], thisYear: number): Head {
  let best = -1;
  let most = 1.5;
  for (let i = 0; i < Math.min(rows.length, DEEPEST_HEADING); i++) {
    const found = headingScore(rows[i]?.cells ?? []);
    if (found > most) [best, most] = [i, found];
  }
  const made = best < 0 ? madeHeadings(rows, thisYear) : null;
  const at = best >= 0 || made ? best : unknownHeadings(rows);
  const row = rows[at];
  if (!row) return { above: [], heading: made && { cells: made, line: 0 }, last: 0, below: rows };
  return cutAt(rows, row, at);
}

function cutAt(rows: readonly HeadRow[], row: HeadRow, best: number): Head {
  const upper = rows[best - 1];
  const grouped = upper ? underGroups(upper.cells, row.cells) : null;
  const lower = rows[best + 1];
  const measured = lower
    ? (withUnits(grouped ?? row.cells, lower.cells) ?? overQualifiers(grouped ?? row.cells, lower.cells))
    : null;
  return {
    above: rows.slice(0, grouped ? best - 1 : best),
    heading: { cells: measured ?? grouped ?? row.cells, line: (grouped ? upper : row)?.line ?? row.line },
    last: (measured ? lower : row)?.line ?? row.line,
    below: rows.slice(measured ? best + 2 : best + 1),
  };
}

/** A row of at least three words above rows with figures holds headings, if in words that nobody knows; −1 = there is none. */
function unknownHeadings(rows: readonly HeadRow[]): number {
  const isFigure = (cell: string) => looksLikeMoney(cell) || looksLikeDay(cell);
  const filledOf = ({ cells }: HeadRow) => cells.filter((cell) => cell.trim() !== '');
  return rows.slice(0, DEEPEST_HEADING).findIndex((row, at) => {
    const words = filledOf(row);
    const below = rows.slice(at + 1, at + 4).map(filledOf);
    const isTable = below.length > 1 && below.every((cells) => cells.length > 2 && cells.some(isFigure));
    return words.length >= 3 && new Set(words).size === words.length && !words.some(isFigure) && isTable;
  });
}

function headingScore(cells: readonly string[]): number {
  let score = 0;
  let filled = 0;
  for (const cell of cells) {
    if (cell.trim() === '') continue;
    filled++;
    if (looksLikeMoney(cell) || looksLikeDay(cell)) score -= 2;
    else if (isKnown(cell)) score += 1;
    else score -= 0.25;
  }
  return filled < 3 ? 0 : score;
}

const isKnown = (cell: string) =>
  headingMeanings(cell).length > 0 || plannedPart(cell) !== null || (tradeMeaning(cell)?.isExact ?? false);
