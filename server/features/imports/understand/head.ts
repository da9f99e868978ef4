import { looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import type { Sheet } from '../sheets/sheet.ts';
import { tradeMeaning } from '../words/categories.ts';
import { headingMeanings, plannedPart } from '../words/headings.ts';

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
  readonly below: readonly HeadRow[];
}

class Enough extends Error {}

/** Reads the first rows of a sheet and finds its heading row among them. */
export function readHead(sheet: Sheet): Head {
  const rows: HeadRow[] = [];
  try {
    sheet.forEachRow((cells, line) => {
      rows.push({ cells, line });
      if (rows.length === LOOKED_AT) throw new Enough();
    });
  } catch (error) {
    if (!(error instanceof Enough)) throw error;
  }
  return cutAtHeading(rows);
}

/** The heading row is the one with most known words and no figures; a table needs at least three cells of it filled. */
export function cutAtHeading(rows: readonly HeadRow[]): Head {
  let best = -1;
  let most = 1.5;
  for (let i = 0; i < Math.min(rows.length, DEEPEST_HEADING); i++) {
    const found = headingScore(rows[i]?.cells ?? []);
    if (found > most) [best, most] = [i, found];
  }
  if (best < 0) return { above: [], heading: null, below: rows };
  return { above: rows.slice(0, best), heading: rows[best] ?? null, below: rows.slice(best + 1) };
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
