import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { Outcome } from '#shared/contracts/import-words.ts';
import { type ImportState, importsApi } from '#shared/contracts/imports.ts';
import { call } from '../../lib/api.ts';

const ASK_AGAIN_MS = 700;

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

/** One file and how it was understood; asked again while the server works on it. */
export const importQuery = (importId: string) =>
  queryOptions({
    queryKey: ['imports', importId],
    queryFn: ({ signal }) => call(importsApi.show, { params: { importId }, signal }),
    refetchInterval: (query) => (query.state.data && isUnderWay(query.state.data.state) ? ASK_AGAIN_MS : false),
  });

/** The rows of a file that is booked, page by page. */
export const rowsQuery = (importId: string, outcome: Outcome | null) =>
  infiniteQueryOptions({
    queryKey: ['imports', importId, 'rows', outcome],
    queryFn: ({ pageParam, signal }) =>
      call(importsApi.rows, {
        params: { importId },
        query: { ...(outcome ? { outcome } : {}), ...(pageParam ? { cursor: pageParam } : {}) },
        signal,
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
    placeholderData: keepPreviousData,
  });
