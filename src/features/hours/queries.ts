import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import { type HoursQuery, hoursApi } from '#shared/contracts/hours.ts';
import { call } from '../../lib/api.ts';

/** Hours that match a filter, page by page; the first page carries the sums. */
export const hoursQuery = (filters: HoursQuery) =>
  infiniteQueryOptions({
    queryKey: ['hours', filters],
    queryFn: ({ pageParam, signal }) =>
      call(hoursApi.list, { query: { ...filters, ...(pageParam ? { cursor: pageParam } : {}) }, signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
    placeholderData: keepPreviousData,
  });

/** Open rebuilds with their hours. */
export const boardQuery = () =>
  queryOptions({ queryKey: ['board'], queryFn: ({ signal }) => call(hoursApi.board, { signal }) });

/** The person's own latest hours. */
export const ownHoursQuery = () =>
  queryOptions({ queryKey: ['own-hours'], queryFn: ({ signal }) => call(hoursApi.mine, { signal }) });
