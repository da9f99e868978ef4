import Papa from 'papaparse';

const CANDIDATES = [',', ';', '\t', '|'] as const;
const NAMED = /^sep=(.)\n/i;

export interface Delimiter {
  readonly delimiter: string;
  /** A `sep=` line stands above the table and says so. */
  readonly isNamed: boolean;
}

/**
 * The character between the cells, voted for by the file's first rows: the one that cuts most rows into the
 * same number of cells, the more cells the better.
 */
export function findDelimiter(start: string): Delimiter {
  const named = NAMED.exec(start);
  if (named?.[1]) return { delimiter: named[1], isNamed: true };
  const scored = CANDIDATES.map((delimiter) => ({ delimiter, score: score(start, delimiter) }));
  const best = scored.reduce((a, b) => (b.score > a.score ? b : a));
  return { delimiter: best.delimiter, isNamed: false };
}

function score(start: string, delimiter: string): number {
  const { data } = Papa.parse<string[]>(start, { delimiter, newline: '\n', preview: 200, skipEmptyLines: 'greedy' });
  const counts = new Map<number, number>();
  for (const row of data) counts.set(row.length, (counts.get(row.length) ?? 0) + 1);
  let best = 0;
  for (const [cells, rows] of counts) best = Math.max(best, ((cells - 1) * rows) / data.length);
  return best;
}
