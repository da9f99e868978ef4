import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { rebuildsApi, type rebuildsQuerySchema } from '#shared/contracts/rebuilds.ts';
import { call } from '../../lib/api.ts';

export type RebuildFilters = z.output<typeof rebuildsQuerySchema>;

/** Rebuilds that match a filter, page by page; each page carries what all that match come to. */
export const rebuildsQuery = (filters: RebuildFilters) =>
  infiniteQueryOptions({
    queryKey: ['rebuilds', filters],
    queryFn: ({ pageParam, signal }) =>
      call(rebuildsApi.list, { query: { ...filters, ...(pageParam ? { cursor: pageParam } : {}) }, signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
    placeholderData: keepPreviousData,
  });

/** One rebuild with its plan, outcome, warnings and cautions. */
export const rebuildQuery = (rebuildId: string) =>
  queryOptions({
    queryKey: ['rebuild', rebuildId],
    queryFn: ({ signal }) => call(rebuildsApi.get, { params: { rebuildId }, signal }),
  });
