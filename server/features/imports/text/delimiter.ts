import Papa from 'papaparse';

const BESIDE_COMMA = [';', '\t', '|'] as const;
// Some programs quote this line, too, or fill it up with empty cells.
const NAMED = /^"?sep=([^\w\n"])"?[,;\t| ]*\n/i;
const NUMERIC_COMMA = /(\d),(?=\d)/g;
const HALF = 0.5;

export interface Delimiter {
  readonly delimiter: string;
  /** A `sep=` line stands above the table and says so. */
  readonly isNamed: boolean;
}

interface Cut {
  readonly delimiter: string;
  /** Share of the rows that it cuts into the same number of cells. */
  readonly share: number;
  readonly score: number;
}

/**
 * The character between the cells, voted for by the file's first rows: the one that cuts most rows into the same number
 * of cells, the more cells the better. Commas between digits speak for the comma only where no other character cuts
 * half of the rows alike: they may be decimal marks.
 */
export function findDelimiter(start: string): Delimiter {
  const named = NAMED.exec(start);
  if (named?.[1]) return { delimiter: named[1], isNamed: true };
  const rival = BESIDE_COMMA.map((delimiter) => cut(start, delimiter)).reduce((a, b) => (b.score > a.score ? b : a));
  const comma = cut(rival.share >= HALF ? start.replace(NUMERIC_COMMA, '$1') : start, ',');
  return { delimiter: comma.score >= rival.score ? ',' : rival.delimiter, isNamed: false };
}

function cut(start: string, delimiter: string): Cut {
  const { data } = Papa.parse<string[]>(start, { delimiter, newline: '\n', preview: 200, skipEmptyLines: 'greedy' });
  const counts = new Map<number, number>();
  for (const row of data) counts.set(row.length, (counts.get(row.length) ?? 0) + 1);
  let best: Cut = { delimiter, share: 0, score: 0 };
  for (const [cells, rows] of counts) {
    const share = rows / data.length;
    const score = (cells - 1) * share * share;
    if (score > best.score) best = { delimiter, share, score };
  }
  return best;
}
