import { useInfiniteQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { Outcome } from '#shared/contracts/import-words.ts';
import type { Import } from '#shared/contracts/imports.ts';
import type { Place } from '../place.ts';
import { rowsOf, rowsQuery, type Start } from '../queries.ts';

export type RowFilter = Outcome | 'all' | 'guesses';

/** So many rows before a wanted one are fetched with it. */
const BEFORE = 30;
const startFor = ({ sheet, row }: Pick<Place, 'sheet' | 'row'>): Start => ({ sheet, row: Math.max(1, row - BEFORE) });

/**
 * Rows of one sheet, a page at a time, beginning a little before the place that was asked for. `seek` begins anew where a
 * place is not among those that were fetched.
 */
export function useRows(file: Import, at: Place, filter: RowFilter) {
  const [start, setStart] = useState<Start>(() => startFor(at));
  const outcome = filter === 'all' ? null : filter === 'guesses' ? 'taken' : filter;
  const query = useInfiniteQuery(rowsQuery(file, start, outcome));
  const { data } = query;
  const rows = useMemo(() => {
    const found = rowsOf(data?.pages ?? [], start.sheet);
    return filter === 'guesses' ? found.filter((row) => row.lines.some((line) => line.isGuess)) : found;
  }, [data, start.sheet, filter]);
  return {
    rows,
    query,
    sheet: start.sheet,
    seek(place: Pick<Place, 'sheet' | 'row'>) {
      const first = rows[0]?.row ?? 1;
      const last = query.hasNextPage ? (rows.at(-1)?.row ?? 0) : Number.POSITIVE_INFINITY;
      const isHere = place.sheet === start.sheet && place.row >= first && place.row <= last;
      if (!isHere) setStart(startFor(place));
    },
  };
}
