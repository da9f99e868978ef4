import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import { type LedgerQuery, ledgerApi } from '#shared/contracts/ledger.ts';
import { call } from '../../lib/api.ts';

/** Entries that match a filter, page by page; the first page carries the sums. */
export const entriesQuery = (filters: LedgerQuery) =>
  infiniteQueryOptions({
    queryKey: ['entries', filters],
    queryFn: ({ pageParam, signal }) =>
      call(ledgerApi.list, { query: { ...filters, ...(pageParam ? { cursor: pageParam } : {}) }, signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
    placeholderData: keepPreviousData,
  });

/** One entry with its source and the other shares of its bill. */
export const entryQuery = (entryId: string) =>
  queryOptions({
    queryKey: ['entry', entryId],
    queryFn: ({ signal }) => call(ledgerApi.get, { params: { entryId }, signal }),
  });
