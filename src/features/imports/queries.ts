import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { Outcome } from '#shared/contracts/import-words.ts';
import { type Import, type ImportRow, type ImportState, importsApi } from '#shared/contracts/imports.ts';
import { call } from '../../lib/api.ts';

/** Rows that a page of the file holds; so far before a wanted row is begun, too. */
export const ROWS_A_PAGE = 100;

/** Is the server still at work on it? */
export const isUnderWay = (state: ImportState) => state === 'reading' || state === 'committing';

/** Files brought in, newest first. */
export const importsQuery = () =>
  infiniteQueryOptions({
    queryKey: ['imports'],
    queryFn: ({ pageParam, signal }) =>
      call(importsApi.list, { query: pageParam ? { cursor: pageParam } : {}, signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
    refetchInterval: (query) =>
      query.state.data?.pages.some((page) => page.rows.some((row) => isUnderWay(row.state))) ? 2000 : false,
  });

/** One file and how it was understood. */
export const importQuery = (importId: string) =>
  queryOptions({
    queryKey: ['imports', importId],
    queryFn: ({ signal }) => call(importsApi.show, { params: { importId }, signal }),
  });

/** A row of a sheet from which on rows are wanted. */
export interface Start {
  readonly sheet: number;
  readonly row: number;
}

/** The rows of one sheet from a row on, and back before it, page by page. A file that is read again is asked anew. */
export const rowsQuery = ({ id, version, state }: Import, start: Start, outcome: Outcome | null) =>
  infiniteQueryOptions({
    queryKey: ['imports', id, 'rows', { version, state, outcome, ...start }],
    queryFn: ({ pageParam, signal }) =>
      call(importsApi.rows, {
        params: { importId: id },
        query: {
          ...(outcome ? { outcome } : {}),
          ...(typeof pageParam === 'string' ? { cursor: pageParam } : pageParam),
        },
        signal,
      }),
    initialPageParam: start as Start | string,
    getNextPageParam: (page) => (page.rows.at(-1)?.sheet === start.sheet ? page.next : null),
    getPreviousPageParam: (_page, _pages, first) =>
      typeof first === 'string' || first.row <= 1
        ? null
        : { sheet: start.sheet, row: Math.max(1, first.row - ROWS_A_PAGE) },
    placeholderData: keepPreviousData,
  });

/** The rows of a sheet out of its pages, in order and each once: pages that reach back overlap where lines are blank. */
export function rowsOf(pages: readonly { readonly rows: readonly ImportRow[] }[], sheet: number): ImportRow[] {
  const rows: ImportRow[] = [];
  for (const row of pages.flatMap((page) => page.rows)) {
    if (row.sheet === sheet && row.row > (rows.at(-1)?.row ?? 0)) rows.push(row);
  }
  return rows;
}
